import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Body, inertiaAboutCentre } from '#core/inertia/body.ts';
import { merge, subtractBody } from '#core/inertia/merge.ts';
import { placeBody } from '#core/inertia/placement.ts';
import { turnAboutVector } from '#core/rollup/copies.ts';
import { leafBody } from '#core/rollup/leaf-body.ts';
import { anyParts, assemblyOf } from '../../helpers/arbitrary-assembly.ts';
import { expectBody } from '../../helpers/expect-body.ts';
import { recordOfText, rollUpText } from '../../helpers/roll-up-text.ts';

const RUNS = { numRuns: 60 };
const total = (parts: readonly string[], head = ''): Body => rollUpText(assemblyOf(parts, head)).total.basic;
/** Sizes of these assemblies: centres within a metre. */
const SIZE = 1;

const group = (parts: readonly string[], place: string) =>
  `${place}, parts: [ ${parts.map((part, i) => `{ name: q${i}, ${part} }`).join(', ')} ]`;

describe('a roll-up', () => {
  it('turns and moves with the whole', () => {
    const angle = fc.integer({ min: -1800, max: 1800 }).map((a) => a / 10);
    fc.assert(
      fc.property(anyParts, angle, (parts, degrees) => {
        const still = total(parts);
        const moved = total([
          group(parts, `at: [ 100, -50, 25 ], rotate: [ { axis: [ 1, 2, -1 ], angle: ${degrees} deg } ]`),
        ]);
        const turn = turnAboutVector([1, 2, -1], (degrees * Math.PI) / 180);
        expectBody(moved, placeBody({ turn, offset: [0.1, -0.05, 0.025] }, still), 1e-12, SIZE);
      }),
      RUNS,
    );
  });

  it('does not care about the order of parts, to rounding', () => {
    fc.assert(
      fc.property(anyParts, (parts) => {
        expectBody(total([...parts].reverse()), total(parts), 1e-12, SIZE);
      }),
      RUNS,
    );
  });

  it('adds: one assembly and another are both together, and taking one away leaves the other', () => {
    fc.assert(
      fc.property(anyParts, anyParts, (a, b) => {
        const both = total([...a, ...b]);
        expectBody(both, merge(total(a), total(b)), 1e-12, SIZE);
        const rest = subtractBody(both, total(b));
        const lost = both.mass / rest.mass;
        expect(Math.abs(rest.mass - total(a).mass)).toBeLessThanOrEqual(1e-14 * lost * rest.mass * 10);
      }),
      RUNS,
    );
  });

  it('comes to the same in other units', () => {
    fc.assert(
      fc.property(anyParts, (parts) => {
        const metres = rollUpText(
          `assembly: random\nunits: { length: m, mass: kg }\nparts:\n  - { name: all, include: small.yaml }\n`,
          { files: { 'small.yaml': assemblyOf(parts) } },
        ).total.basic;
        expect(metres).toEqual(total(parts));
      }),
      RUNS,
    );
  });

  it('is itself again when mirrored twice, and its products turn sign when mirrored once', () => {
    fc.assert(
      fc.property(anyParts, (parts) => {
        const still = total(parts);
        const once = total([group(parts, 'image: xz')]);
        const twice = total([group([group(parts, 'image: xz')], 'image: xz')]);
        expectBody(twice, still, 1e-13, SIZE);
        const j = inertiaAboutCentre(still);
        const size = Math.max(...j.map(Math.abs));
        inertiaAboutCentre(once).forEach((x, k) => {
          expect(Math.abs(x - (k === 3 || k === 5 ? -1 : 1) * j[k]!)).toBeLessThanOrEqual(1e-13 * size);
        });
      }),
      RUNS,
    );
  });

  it('is the sum of its leaves, cut-outs taken away', () => {
    fc.assert(
      fc.property(anyParts, (parts) => {
        const roll = rollUpText(assemblyOf(parts));
        const of = (sign: 1 | -1) =>
          roll.leaves.filter((l) => l.sign === sign).map((l) => leafBody(l, 'basic'));
        const cuts = of(-1);
        const material = of(1).reduce(merge);
        const net = cuts.length > 0 ? subtractBody(material, cuts.reduce(merge)) : material;
        expectBody(net, roll.total.basic, 1e-12, SIZE);
      }),
      RUNS,
    );
  });

  it('gives the same bytes twice, JSON that reads back equal, and no negative zero', () => {
    fc.assert(
      fc.property(anyParts, (parts) => {
        const yaml = assemblyOf(parts, 'growth: { estimated: 10 % }\n');
        const text = JSON.stringify(recordOfText(yaml));
        expect(JSON.stringify(recordOfText(yaml))).toBe(text);
        const record = recordOfText(yaml);
        expect(JSON.parse(text)).toEqual(record);
        const visit = (value: unknown): void => {
          if (typeof value === 'number') expect(Object.is(value, -0)).toBe(false);
          else if (value && typeof value === 'object') Object.values(value).forEach(visit);
        };
        visit(record);
      }),
      RUNS,
    );
  });

  it('predicts what it weighs where nothing grows', () => {
    fc.assert(
      fc.property(anyParts, (parts) => {
        const record = recordOfText(assemblyOf(parts));
        expect(record.predicted).toEqual(record.basic);
      }),
      RUNS,
    );
  });
});

describe('splitting a part in two', () => {
  it('changes nothing: a box, a tube along its axis, a cone into a frustum and a cone', () => {
    const size = fc.integer({ min: 10, max: 500 }).map((x) => x / 10);
    fc.assert(
      fc.property(size, size, size, fc.integer({ min: 1, max: 99 }), (x, y, z, percent) => {
        const t = percent / 100;
        const density = 'density: 2700 kg/m^3';
        const box = (length: number, at: number) =>
          `solid: { box: { size: [ ${length} mm, ${y}, ${z} ] } }, ${density}, at: [ ${at} mm, 0, 0 ]`;
        expectBody(
          total([box(x * t, (x * t) / 2), box(x * (1 - t), x * t + (x * (1 - t)) / 2)]),
          total([box(x, x / 2)]),
          1e-12,
          0.05,
        );
        const tube = (length: number, at: number) =>
          `solid: { tube: { diameter: ${y}, wall: ${y / 10}, length: ${length} mm } }, ${density}, at: [ 0, 0, ${at} mm ]`;
        expectBody(
          total([tube(x * t, (x * t) / 2), tube(x * (1 - t), x * t + (x * (1 - t)) / 2)]),
          total([tube(x, x / 2)]),
          1e-12,
          0.05,
        );
        const lower = `solid: { frustum: { diameter: ${y}, top_diameter: ${y * (1 - t)} mm, height: ${x * t} mm } }, ${density}`;
        const upper = `solid: { cone: { diameter: ${y * (1 - t)} mm, height: ${x * (1 - t)} mm } }, ${density}, at: [ 0, 0, ${x * t} mm ]`;
        expectBody(
          total([lower, upper]),
          total([`solid: { cone: { diameter: ${y}, height: ${x} } }, ${density}`]),
          1e-11,
          0.05,
        );
      }),
      RUNS,
    );
  });
});
