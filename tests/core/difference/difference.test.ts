import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  contributionsTo,
  type Difference,
  difference,
  groupedContributionsTo,
  groupOf,
  isAttributed,
} from '../../../core/difference/index.ts';
import type { Body } from '../../../core/inertia/body.ts';
import type { Vector3 } from '../../../core/linalg/vector3.ts';
import { buildLimit } from '../../helpers/build-record.ts';
import { anyTurn, anyTwoMachines, machine, type Piece, turned } from './random-machines.ts';

const at = (mass: number, centre: Vector3): Body => ({ mass, centre, secondMoments: [0, 0, 0, 0, 0, 0] });
const compare = (a: readonly Piece[], b: readonly Piece[]) => difference(machine(a), machine(b), 'predicted');
const quantity = (d: Difference, name: string) => d.quantities.find((q) => q.name === name)!;
const partOf = (d: Difference, path: string) => d.parts.find((p) => p.path === path)!;
const sumOf = (d: Difference, name: string) =>
  d.parts.reduce((total, part) => {
    const split = part.contributions[name];
    return total + (split ? split.mass + split.place + split.shapeAndTurn : 0);
  }, 0);

/** The size against which rounding is measured: what all parts, cut-outs too, weigh in the quantity. */
function sizeOf(pieces: readonly Piece[], name: string): number {
  const mass = pieces.reduce((total, { body }) => total + body.mass, 0);
  const reach = Math.max(...pieces.map(({ body }) => Math.max(...body.centre.map(Math.abs)))) + 1;
  if (name === 'mass') return mass;
  return name.startsWith('centre') ? reach : mass * reach * reach;
}

describe('difference: the sum of the parts', () => {
  it('is the change of every attributed quantity, without remainder', () => {
    fc.assert(
      fc.property(anyTwoMachines, ({ a, b }) => {
        const d = compare(a, b);
        // A cut-out that leaves nothing of its host but rounding leaves no centre either.
        fc.pre(d.principal !== null);
        const attributed = d.quantities.filter((q) => isAttributed(q.name));
        expect(attributed.length).toBeGreaterThanOrEqual(11);
        for (const { name, change, remainder } of attributed) {
          const scale = Math.max(sizeOf(a, name), sizeOf(b, name)) * netShare(a, b);
          expect(Math.abs(remainder!), name).toBeLessThan(1e-13 * scale);
          expect(Math.abs(sumOf(d, name) - change!), name).toBeLessThan(1e-13 * scale);
        }
      }),
      { numRuns: 500 },
    );
  });

  it('leaves to a part that did not change, or was only renamed, exactly nothing', () => {
    fc.assert(
      fc.property(anyTwoMachines, ({ a, b }) => {
        const d = compare(a, b);
        for (const part of d.parts) {
          const before = a.find((p) => p.path === (part.was ?? part.path));
          const after = b.find((p) => p.path === part.path);
          const same = before && after && JSON.stringify(before.body) === JSON.stringify(after.body);
          expect(part.status === 'unchanged' || part.status === 'renamed').toBe(Boolean(same));
          if (!same) continue;
          for (const { name } of d.quantities)
            for (const row of contributionsTo(d, name).filter((r) => r.path === part.path))
              expect([row.mass, row.place, row.shapeAndTurn, row.total]).toEqual([0, 0, 0, 0]);
        }
      }),
    );
  });

  it('changes every sign when the sides are swapped, to the last bit', () => {
    fc.assert(
      fc.property(anyTwoMachines, ({ a, b }) => {
        const there = compare(a, b);
        const back = compare(b, a);
        const pairs = there.quantities
          .filter((q) => !q.name.startsWith('principal'))
          .map((q) => [q.name, q.name] as const);
        for (const axis of there.principal!.axes) {
          const same = back.principal!.axes.find((x) => x.rank.a === axis.rank.b)!;
          expect(same.rank.b).toBe(axis.rank.a);
          pairs.push([axis.quantity, same.quantity]);
        }
        for (const [name, other] of pairs) {
          expect(quantity(back, other).change! + quantity(there, name).change!).toBe(0);
          for (const part of there.parts) {
            const p = part.contributions[name];
            const q = back.parts.find((x) => x.path === (part.was ?? part.path))!.contributions[other];
            if (!p || !q) continue;
            expect([p.mass + q.mass, p.place + q.place, p.shapeAndTurn + q.shapeAndTurn]).toEqual([0, 0, 0]);
          }
        }
      }),
    );
  });

  it('turns with the whole machine: splits of mass and of principal moments stay', () => {
    fc.assert(
      fc.property(anyTwoMachines, anyTurn, ({ a, b }, turn) => {
        const still = compare(a, b);
        // Near a degenerate pair the axes themselves are ill-conditioned, not the split.
        fc.pre(gapOf(still) > 1e-3 && clearMatch(still));
        const moved = compare(turned(a, turn), turned(b, turn));
        for (const axis of still.principal!.axes) {
          const same = moved.principal!.axes.find((x) => x.rank.a === axis.rank.a)!;
          expect(same.rank.b).toBe(axis.rank.b);
          const scale = Math.max(sizeOf(a, axis.quantity), sizeOf(b, axis.quantity)) * netShare(a, b);
          for (const part of still.parts) {
            const p = part.contributions[axis.quantity];
            // A kept part is turned by the same matrix in both, so it stays unchanged.
            const q = partOf(moved, part.path).contributions[same.quantity];
            for (const cause of ['mass', 'place', 'shapeAndTurn'] as const)
              expect(Math.abs((p?.[cause] ?? 0) - (q?.[cause] ?? 0))).toBeLessThan(1e-8 * scale);
          }
        }
      }),
    );
  });
});

/** How much cut-outs magnify rounding: material over what is left of it. */
function netShare(a: readonly Piece[], b: readonly Piece[]): number {
  const share = (pieces: readonly Piece[]) => {
    const material = pieces.reduce((t, p) => t + (p.cut ? 0 : p.body.mass), 0);
    return material / (material - pieces.reduce((t, p) => t + (p.cut ? p.body.mass : 0), 0));
  };
  return Math.max(share(a), share(b)) ** 2;
}

const gapOf = (d: Difference) =>
  Math.min(
    ...(['a', 'b'] as const).map((side) => {
      const m = d.principal!.axes.map((x) => x.moment[side]).sort((p, q) => p - q);
      return Math.min(m[1]! - m[0]!, m[2]! - m[1]!) / m[2]!;
    }),
  );

/** Each axis turned well under 45°, where the one assignment cannot be in doubt. */
const clearMatch = (d: Difference) => d.principal!.axes.every((x) => x.turned !== null && x.turned < 0.7);

describe('difference: worked by hand', () => {
  // A: 1 kg at x = 0 and 1 kg at x = 2. Mass 2, centre 1, about it Jyy = Jzz = 1·1² + 1·1² = 2.
  // B: the second moved to x = 4. Centre 2, Jyy = 1·2² + 1·2² = 8.
  const a = [
    { path: 'near', body: at(1, [0, 0, 0]) },
    { path: 'far', body: at(1, [2, 0, 0]) },
  ];
  const moved = [a[0]!, { path: 'far', body: at(1, [4, 0, 0]) }];
  // C: the second 3 kg instead of moved. Mass 4, centre 3·2/4 = 1.5, Jyy = 1·1.5² + 3·0.5² = 3.
  const heavier = [a[0]!, { path: 'far', body: at(3, [2, 0, 0]) }];

  it('gives all of a move to the part that moved, as place', () => {
    const d = compare(a, moved);
    expect(quantity(d, 'mass').change).toBe(0);
    // (ΔS − c̄ Δm) / m̄ = (4 − 2 − 0) / 2 = 1.
    expect(partOf(d, 'far').contributions['centre.x']).toEqual({ mass: 0, place: 1, shapeAndTurn: 0 });
    // h = 1.5: far is 0.5 away in A and 2.5 in B, 6.25 − 0.25 = 6; near is 1.5 away in both and gives nothing.
    expect(partOf(d, 'far').contributions['inertia.yy']).toEqual({ mass: 0, place: 6, shapeAndTurn: 0 });
    expect(partOf(d, 'near')).toMatchObject({ status: 'unchanged', contributions: {} });
    expect(quantity(d, 'inertia.yy')).toMatchObject({ a: 2, b: 8, change: 6, ofA: 3, remainder: 0 });
    expect(partOf(d, 'far')).toMatchObject({ status: 'moved', differs: { mass: false, place: true } });
  });

  it('gives all of a growth to the part that grew, as mass', () => {
    const d = compare(a, heavier);
    // m̄ = 3, c̄ = (1 + 1.5)/2 = 1.25: (3·2 − 1·2 − 1.25·2) / 3 = 1.5 / 3 = 0.5.
    expect(partOf(d, 'far').contributions['centre.x']).toEqual({ mass: 0.5, place: 0, shapeAndTurn: 0 });
    // h = 1.25, d = 0.5: Δm (0.75² − 0.25²) = 2·(0.5625 − 0.0625) = 1.
    expect(partOf(d, 'far').contributions['inertia.yy']).toEqual({ mass: 1, place: 0, shapeAndTurn: 0 });
    expect(quantity(d, 'inertia.yy')).toMatchObject({ a: 2, b: 3, change: 1, remainder: 0 });
    expect(partOf(d, 'far').status).toBe('changed');
  });

  it('gives a body that only turned to shape and turn', () => {
    // A rod of Q = diag(3, 0, 0) turned to y: Jyy 3 → 0, Jxx 0 → 3; the other part is where it was.
    const rod = (secondMoments: Body['secondMoments']): Body => ({
      mass: 1,
      centre: [0, 0, 1],
      secondMoments,
    });
    const other = { path: 'other', body: at(1, [0, 0, -1]) };
    const d = compare(
      [{ path: 'rod', body: rod([3, 0, 0, 0, 0, 0]) }, other],
      [{ path: 'rod', body: rod([0, 3, 0, 0, 0, 0]) }, other],
    );
    expect(partOf(d, 'rod').contributions['inertia.xx']).toEqual({ mass: 0, place: 0, shapeAndTurn: 3 });
    expect(partOf(d, 'rod').contributions['inertia.yy']).toEqual({ mass: 0, place: 0, shapeAndTurn: -3 });
    expect(partOf(d, 'rod').contributions['inertia.zz']).toEqual({ mass: 0, place: 0, shapeAndTurn: 0 });
  });

  it('gives a part that is on one side only to mass alone, with the opposite sign when it goes', () => {
    const d = compare(a, [...a, { path: 'new', body: at(2, [1, 3, 0]) }]);
    const added = partOf(d, 'new');
    expect(added.status).toBe('added');
    // m̄ = 3, c̄ = (0 + 1.5)/2: 2·(3 − 0.75)/3 = 1.5.
    expect(added.contributions['centre.y']).toEqual({ mass: 1.5, place: 0, shapeAndTurn: 0 });
    const gone = partOf(compare([...a, { path: 'new', body: at(2, [1, 3, 0]) }], a), 'new');
    expect(gone).toMatchObject({ status: 'removed', contributions: { 'centre.y': { mass: -1.5 } } });
  });

  it('takes a cut-out as a part of negative mass', () => {
    const plate = { path: 'plate', body: at(4, [0, 0, 0]) };
    const hole = (x: number) => ({ path: 'plate/hole', body: at(1, [x, 0, 0]), cut: true });
    // Centre −1·x / 3: from −1/3 to −2/3.
    const d = compare([plate, hole(1)], [plate, hole(2)]);
    expect(partOf(d, 'plate/hole').contributions['centre.x']!.place).toBeCloseTo(-1 / 3, 15);
    expect(partOf(d, 'plate').status).toBe('unchanged');
  });
});

/** Six equal masses in pairs on the axes at the given distances: principal moments 2(b² + c²) and so on, no products. */
const jack = (x: number, y: number, z: number): Piece[] =>
  ([x, y, z] as const).flatMap((distance, k) =>
    [1, -1].map((sign) => ({
      path: `${'xyz'[k]}${sign > 0 ? '+' : '-'}`,
      body: at(1, [0, 1, 2].map((i) => (i === k ? sign * distance : 0)) as unknown as Vector3),
    })),
  );

describe('difference: principal moments', () => {
  it('follows an axis through a swap of ranks and calls it a swap', () => {
    // A: Jxx = 2(4 + 1) = 10, Jyy = 2(9 + 1) = 20, Jzz = 2(9 + 4) = 26. B, y out to 4: 34, 20, 50.
    const d = compare(jack(3, 2, 1), jack(3, 4, 1));
    const [first, second, third] = d.principal!.axes;
    expect(d.principal!.ranksSwapped).toBe(true);
    expect([first!.quantity, first!.rank, first!.swapped]).toEqual(['principal.x', { a: 0, b: 1 }, true]);
    expect([second!.quantity, second!.rank, second!.swapped]).toEqual(['principal.y', { a: 1, b: 0 }, true]);
    expect([third!.quantity, third!.swapped, third!.turned]).toEqual(['principal.z', false, 0]);
    expect(quantity(d, 'principal.x')).toMatchObject({ a: 10, b: 34, change: 24, remainder: 0 });
    expect(quantity(d, 'principal.y').change).toBe(0);
    expect(partOf(d, 'y+').contributions['principal.x']).toEqual({ mass: 0, place: 12, shapeAndTurn: 0 });
  });

  it('says how far an axis turned', () => {
    const angle = 1e-6;
    const [c, s] = [Math.cos(angle), Math.sin(angle)];
    const b = turned(jack(3, 2, 1), [
      [c, -s, 0],
      [s, c, 0],
      [0, 0, 1],
    ]);
    const axes = compare(jack(3, 2, 1), b).principal!.axes;
    expect(axes[0]!.turned).toBeCloseTo(angle, 14);
    expect(axes[1]!.turned).toBeCloseTo(angle, 14);
    expect(axes[2]!.turned).toBe(0);
  });

  it('attributes the sum of the two moments where a plane is free', () => {
    // A: Jyy = Jzz = 2(9 + 1) = 20, Jxx = 4. B, y out to 2: Jxx = 10, Jyy = 20, Jzz = 26.
    const d = compare(jack(3, 1, 1), jack(3, 2, 1));
    expect(d.principal!.axes.map((x) => [x.quantity, x.free])).toEqual([
      ['principal.x', false],
      ['principal.y+z', true],
      ['principal.y+z', true],
    ]);
    expect(quantity(d, 'principal.y+z')).toMatchObject({ a: 40, b: 46, change: 6 });
    expect(sumOf(d, 'principal.y+z')).toBeCloseTo(6, 13);
  });

  it('splits a free plane alike whichever axes stand for it', () => {
    fc.assert(
      fc.property(anyTurn, (turn) => {
        const still = compare(jack(3, 1, 1), jack(3, 2, 1));
        const moved = compare(turned(jack(3, 1, 1), turn), turned(jack(3, 2, 1), turn));
        const pair = moved.principal!.axes.find((x) => x.free)!.quantity;
        expect(moved.principal!.axes.map((x) => x.free)).toEqual([false, true, true]);
        for (const part of still.parts) {
          const p = part.contributions['principal.y+z'];
          const q = partOf(moved, part.path).contributions[pair];
          expect(q?.place ?? 0).toBeCloseTo(p?.place ?? 0, 11);
        }
      }),
    );
  });

  it('attributes the trace where every axis is free', () => {
    const d = compare(jack(1, 1, 1), jack(3, 2, 1));
    // 3 · 4 = 12 against 10 + 20 + 26 = 56.
    expect(quantity(d, 'principal.x+y+z')).toMatchObject({ a: 12, b: 56, change: 44, remainder: 0 });
  });
});

describe('difference: what else moved', () => {
  const only = [{ path: 'only', body: at(1, [1, 0, 0]) }];

  it('matches renamed parts of equal content in order, and no part twice', () => {
    const twin = at(1, [0, 0, 0]);
    const d = compare(
      [
        { path: 'p', body: twin },
        { path: 'q', body: twin },
      ],
      [
        { path: 'r', body: twin },
        { path: 's', body: twin },
        { path: 't', body: twin },
      ],
    );
    expect(d.parts.map((p) => [p.was, p.path, p.status])).toEqual([
      ['p', 'r', 'renamed'],
      ['q', 's', 'renamed'],
      [null, 't', 'added'],
    ]);
  });

  it('does not take a part of another kind for a renamed one', () => {
    const d = compare(
      [{ path: 'p', kind: 'box', body: at(1, [0, 0, 0]) }],
      [{ path: 'q', kind: 'ball', body: at(1, [0, 0, 0]) }],
    );
    expect(d.parts.map((p) => p.status)).toEqual(['removed', 'added']);
  });

  it('attributes mass alone where one side has no centre', () => {
    const d = compare([], only);
    expect(quantity(d, 'centre.x')).toMatchObject({ a: null, b: 1, change: null, remainder: null });
    expect(d.principal).toBeNull();
    expect(partOf(d, 'only').contributions).toEqual({ mass: { mass: 1, place: 0, shapeAndTurn: 0 } });
    expect(quantity(d, 'mass').remainder).toBe(0);
  });

  it('lists parameters, files and limits that changed', () => {
    const a = machine(only, {
      parameters: { boom: { value: 0.4, unit: 'm' }, wall: { value: 0.001, unit: 'm' } },
      inputs: [
        { path: 'a.yaml', sha256: '1' },
        { path: 'b.yaml', sha256: '2' },
      ],
      limits: [
        buildLimit({ id: 'M1', value: 0.2, max: 0.25 }),
        buildLimit({ name: 'gone', value: 1, max: 2 }),
      ],
    });
    const b = machine(only, {
      parameters: { boom: { value: 0.5, unit: 'm' }, wall: { value: 0.001, unit: 'm' } },
      inputs: [
        { path: 'a.yaml', sha256: '3' },
        { path: 'c.yaml', sha256: '2' },
      ],
      limits: [buildLimit({ id: 'M1', name: 'mass, new name', value: 0.5, max: 0.25 })],
    });
    const d = difference(a, b, 'basic');
    expect(d.parameters.map((p) => [p.name, p.a?.value, p.b?.value])).toEqual([['boom', 0.4, 0.5]]);
    expect(d.parameters[0]!.change).toBeCloseTo(0.1, 15);
    expect(d.inputs.map((i) => [i.path, i.change])).toEqual([
      ['a.yaml', 'changed'],
      ['b.yaml', 'removed'],
      ['c.yaml', 'added'],
    ]);
    expect(d.limits.map((l) => [l.name, l.verdict])).toEqual([
      ['mass, new name', 'now outside'],
      ['gone', 'removed'],
    ]);
    expect(d.limits[0]!.valueChange).toBeCloseTo(0.3, 15);
    expect(d.limits[0]!.marginChange).toBeCloseTo(-0.3, 15);
  });

  it('flags conventions that differ, and says nothing where they agree', () => {
    const a = machine(only);
    expect(difference(a, a, 'basic').conventions).toEqual([]);
    const b = machine(only);
    b.conventions = { ...b.conventions, coreVersion: '9.9.9', frame: { ...b.conventions.frame!, z: 'down' } };
    expect(difference(a, b, 'basic').conventions.map((c) => [c.what, c.bearing])).toEqual([
      ['frame.z', 'figures'],
      ['coreVersion', 'figures'],
    ]);
  });

  it('survives JSON unchanged', () => {
    const d = compare(jack(3, 2, 1), jack(3, 4, 1));
    expect(JSON.parse(JSON.stringify(d))).toEqual(d);
  });
});

describe('contributions', () => {
  const pieces = (k: number): Piece[] => [
    { path: 'boom', body: at(1, [0, 0, 0]) },
    { path: 'boom/hole', body: at(0.25, [0, 0, 0]), cut: true },
    { path: 'servo[1]', body: at(1 + k, [1, 0, 0]) },
    { path: 'servo[2]', body: at(1 + 2 * k, [-1, 0, 0]) },
    { path: 'fin', body: at(1 - 2 * k, [0, 1, 0]) },
  ];
  const d = compare(pieces(0), pieces(0.25));

  it('come largest first, whatever their sign', () => {
    expect(contributionsTo(d, 'mass', { onlyChanged: true }).map((r) => [r.path, r.total])).toEqual([
      ['servo[2]', 0.5],
      ['fin', -0.5],
      ['servo[1]', 0.25],
    ]);
    expect(contributionsTo(d, 'mass')).toHaveLength(5);
  });

  it('sum over the top level, copies together, to the same change', () => {
    const groups = groupedContributionsTo(d, 'mass');
    expect(groups.map((r) => [r.path, r.total, r.status])).toEqual([
      ['servo', 0.75, 'changed'],
      ['fin', -0.5, 'changed'],
      ['boom', 0, 'unchanged'],
    ]);
    expect(groupedContributionsTo(d, 'mass', { onlyChanged: true })).toHaveLength(2);
  });

  it('group by as many levels as asked', () => {
    expect(groupOf('wing/rib[3]/hole', 1)).toBe('wing');
    expect(groupOf('wing/rib[3]/hole', 2)).toBe('wing/rib');
  });
});
