import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { renderRun } from '../../../cli/output/run-report.ts';
import { textWidth } from '../../../cli/output/text-width.ts';
import { isPossible, readFigure } from '../../../core/figures/index.ts';
import { anyRecord, buildRecord } from '../../helpers/build-record.ts';

const today = '2026-12-01';
const lines = (text: string) => text.split('\n');
const section = (text: string, head: string) => {
  const all = lines(text);
  const from = all.findIndex((line) => line.startsWith(head));
  expect(from, `a section ${head}`).toBeGreaterThanOrEqual(0);
  const to = all.findIndex((line, i) => i > from && line === '');
  return all.slice(from, to);
};

const heron = () =>
  buildRecord({
    limits: [
      {
        name: 'take-off mass',
        id: 'MP-003',
        value: 0.2371096,
        max: 0.25,
        values: { basic: 0.23042, predicted: 0.2371096 },
      },
      {
        name: 'balance',
        quantity: 'centre.x',
        unit: 'm',
        shown: { unit: 'mm', factor: 0.001 },
        value: -0.069309,
        min: -0.075,
        max: -0.06,
      },
      {
        name: 'Izz / Iyy',
        quantity: 'inertia.zz / inertia.yy',
        unit: '1',
        shown: { unit: '1', factor: 1 },
        value: 1.0147,
        min: 1.02,
        max: 1.06,
        heaviest: [{ path: 'tailplane', at: { file: 'tailplane.yaml', line: 12 }, value: 0.6 }],
      },
    ],
    overrides: [
      {
        path: 'tailplane',
        reason: 'weighed after paint',
        at: { file: 'heron.yaml', line: 71 },
        from: 0.0204,
        to: 0.0214,
      },
    ],
  });

describe('renderRun', () => {
  it('keeps every line of every record within its width, in Unicode and in ASCII', () => {
    fc.assert(
      fc.property(
        anyRecord,
        fc.constantFrom(60, 80, 100, 132),
        fc.boolean(),
        fc.constantFrom('file', 'si', 'in,lb,rad'),
        (record, width, unicode, units) => {
          const frame = Object.keys(record.frames)[0]!;
          const text = renderRun(record, { today, width, unicode, units, frame, parts: 5 });
          for (const line of lines(text)) expect(textWidth(line), line).toBeLessThanOrEqual(width);
          if (!unicode) expect(text).toMatch(/^[\n\x20-\x7e]*$/);
        },
      ),
      { numRuns: 300 },
    );
  });

  it('lets no control character of a name reach the terminal', () => {
    fc.assert(
      fc.property(anyRecord, (record) => {
        expect(renderRun(record, { today })).not.toMatch(/(?!\n)[\p{Cc}\p{Cf}\p{Cs}]/u);
      }),
      { numRuns: 150 },
    );
  });

  it('colours without moving anything', () => {
    const plain = renderRun(heron(), { today });
    const coloured = renderRun(heron(), { today, colour: true });
    expect(coloured).not.toBe(plain);
    // biome-ignore lint/suspicious/noControlCharactersInRegex: the colours are what is taken away.
    expect(coloured.replace(/\x1b\[\d+m/g, '')).toBe(plain);
  });

  it('prints tensors that are possible and, in every parts table, columns that add up', () => {
    fc.assert(
      fc.property(anyRecord, (record) => {
        record.parts.forEach((p, i) => {
          p.path = `part ${i}`;
          p.maturity = null;
          p.at = { file: 'a.yaml', line: i };
        });
        const text = renderRun(record, { today, parts: 4 });
        const matrices = lines(text)
          .filter((line) => /^[┌│└] /.test(line))
          .map((line) =>
            line
              .split(/[┌┐│└┘]/)
              .filter((t) => t.trim() !== '')
              .map((t) => t.trim().split(/\s+/)),
          );
        for (let i = 0; i + 2 < matrices.length; i += 3)
          for (let block = 0; block < matrices[i]!.length; block++) {
            const rows = [0, 1, 2].map((k) =>
              matrices[i + k]![block]!.map((t) => BigInt(t.replace('−', '-').replace('.', ''))),
            );
            if (!text.includes('no body has this tensor'))
              expect(
                isPossible([
                  rows[0]![0]!,
                  rows[1]![1]!,
                  rows[2]![2]!,
                  rows[0]![1]!,
                  rows[0]![2]!,
                  rows[1]![2]!,
                ]),
              ).toBe(true);
          }
        const parts = section(text, 'Parts').filter((line) => /^(part \d|\d+ others?|total)/.test(line));
        const figures = parts.map((line) =>
          line
            .replace(/^(part \d+|\d+ others?|total)/, '')
            .replace(/a\.yaml.*/, '')
            .trim()
            .split(/\s+/)
            .map(readFigure),
        );
        const total = figures.pop()!;
        total.forEach((sum, k) => {
          const column = figures.reduce((s, row) => s + row[k]!, 0);
          if (!text.includes('differs from the total'))
            expect(Math.abs(column - sum)).toBeLessThan(1e-9 * Math.max(1, Math.abs(sum)));
        });
      }),
      { numRuns: 200 },
    );
  });

  it('draws the beams: stops, fulcrum, poise and a poise off the span beyond its label', () => {
    const beams = section(renderRun(heron(), { today }), 'Limits').filter((line) => /[├┤]/.test(line));
    expect(beams).toEqual([
      'take-off mass  g    237.11  ─────────────────△─────────▼───────┤ 250   ○ within',
      'balance        mm  −69.309     −75 ├──────────▼──△─────────────┤ −60   ○ within',
      'Izz / Iyy           1.0147  ▼ 1.02 ├─────────────△─────────────┤ 1.06  ✕ outside',
    ]);
  });

  it('draws the same beams in ASCII', () => {
    const beams = section(renderRun(heron(), { today, unicode: false }), 'Limits').filter((line) =>
      line.includes('|'),
    );
    expect(beams[2]).toBe('Izz / Iyy           1.0147  v 1.02 |-------------^-------------| 1.06  x outside');
  });

  it('stands a one-sided beam on the value of the baseline', () => {
    const [mass] = section(
      renderRun(heron(), { today, baseline: { 'take-off mass': 0.2 } }),
      'Limits',
    ).filter((line) => line.includes('250'));
    expect(mass!.indexOf('△')).toBeLessThan(mass!.indexOf('▼') - 15);
  });

  it('names what weighs most under a broken limit, with file and line', () => {
    expect(renderRun(heron(), { today })).toContain('weighs most: tailplane, 0.6000, tailplane.yaml:12');
  });

  it('prints a waiver first while it counts, and as expired from the day after', () => {
    const record = heron();
    record.limits[2]!.waiver = { until: '2026-12-01', by: 'M. Okafor', reason: 'first flights' };
    const valid = renderRun(record, { today });
    expect(valid.indexOf('Waivers in effect')).toBeLessThan(valid.indexOf('Totals'));
    expect(valid).toContain('3 limits: 2 within, 1 outside and waived');
    const expired = renderRun(record, { today: '2026-12-02' });
    expect(expired).not.toContain('Waivers in effect');
    expect(expired.replace(/\s+/g, ' ')).toContain('waiver expired 2026-12-01 by M. Okafor: first flights');
    expect(expired).toContain('3 limits: 2 within, 1 outside');
  });

  it('says the sign of the products and turns them with it', () => {
    const negative = section(renderRun(heron(), { today }), 'Inertia tensor');
    const positive = section(renderRun(heron(), { today, products: 'positive' }), 'Inertia tensor');
    expect(positive.join('\n')).toContain('products positive');
    const first = (rows: string[]) =>
      rows
        .find((row) => row.startsWith('┌'))!
        .match(/[−\d.]+/g)!
        .map(readFigure);
    const [a, b] = [first(negative), first(positive)];
    expect(b[0]).toBe(a[0]);
    expect(b[1]).toBe(-a[1]!);
    expect(b[2]).toBe(-a[2]!);
  });

  it('shows about another point, which about the centre is the centre tensor again', () => {
    const record = heron();
    const at = record.predicted.centre as [number, number, number];
    const text = renderRun(record, { today, about: { name: 'the pivot', point: at } });
    const block = section(text, 'Inertia tensor');
    const [left, right] = block.find((row) => row.startsWith('│'))!.split(/\s{6,}/);
    expect(block[2]).toMatch(/^about the pivot +about the centre of mass$/);
    expect(left!.trim()).toBe(right!.trim());
  });

  it('says so where no mass, frame or git is', () => {
    const record = buildRecord({
      conventions: { ...buildRecord().conventions, frame: null },
      provenance: { tool: 'steelyard 0.1.0', at: '' },
    });
    for (const side of ['basic', 'predicted'] as const)
      record[side] = { mass: 0, centre: null, inertia: null, principal: null, gyration: null };
    const text = renderRun(record, { today });
    expect(text).toContain('not in git');
    expect(text).toContain('names no frame');
    expect(text).toContain('no mass remains');
    expect(text).not.toContain('NaN');
  });

  it('says which axes are free to turn', () => {
    const disc = [0, 1, 2, 3].map((k) => ({
      mass: 1,
      at: [
        [1, 0, 0],
        [-1, 0, 0],
        [0, 1, 0],
        [0, -1, 0],
      ][k] as [number, number, number],
    }));
    expect(renderRun(buildRecord({ parts: [{ path: 'disc', particles: disc }] }), { today })).toContain(
      'the moments near x and y are one',
    );
  });

  it('opens with whose figures these are, in which axes, sign and units', () => {
    expect(lines(renderRun(heron(), { today })).slice(0, 5)).toEqual([
      'Heron tail boom, flight',
      '4e1c09b on main · stamp 9f2c81aa03d1 · steelyard 0.1.0',
      'body axes x forward, y left, z up; origin at wing spar at centreline',
      'products negative, I_xy = −∫xy dm · units mm, g, g·mm², °',
      '3 limits: 2 within, 1 outside',
    ]);
  });
});
