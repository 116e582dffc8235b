import { readFileSync } from 'node:fs';
import { execa } from 'execa';
import { describe, expect, it } from 'vitest';
import { difference } from '#core/difference/index.ts';
import { displayUnits, readFigure } from '#core/figures/index.ts';
import { attributionOf } from '#web/components/compare/attribution-rows.ts';
import { barPieces, scaleBars } from '#web/components/compare/bar-scale.ts';
import { changeRows, signed, totalsRows } from '#web/components/compare/change-rows.ts';
import { attributed, chosenQuantity, readCompareView } from '#web/components/compare/compare-view.ts';
import { patchLines } from '#web/components/compare/patch-lines.ts';
import { quantityWords } from '#web/components/compare/quantity-words.ts';

const roll = async (...options: string[]) => {
  const { stdout } = await execa('node', [
    'dist/cli/steelyard.js',
    'run',
    'examples/survey-drone/drone.yaml',
    '-s',
    'flight',
    '--format',
    'json',
    ...options,
  ]);
  return JSON.parse(stdout)[0];
};
const a = await roll();
const b = await roll('--set', 'camera=371 g', '--set', 'boom=733 mm', '--set', 'battery_x=151 mm');
const d = difference(a, b, 'predicted');
const units = displayUnits(b);
const read = (text: string) => readFigure(text.replace('+', ''));

describe('A, B and the change', () => {
  it('print so that a reader who subtracts finds the same', () => {
    for (const row of totalsRows(d, units)) {
      const decimals = row.a.split('.')[1]?.length ?? 0;
      expect((read(row.b) - read(row.a)).toFixed(decimals)).toBe(read(row.change).toFixed(decimals));
    }
  });
  it('share scale and decimals within a kind', () => {
    const centre = totalsRows(d, units).filter((row) => row.name.startsWith('centre'));
    expect(new Set(centre.map((row) => row.unit)).size).toBe(1);
    expect(new Set(centre.map((row) => row.a.split('.')[1]?.length)).size).toBe(1);
  });
  it('have no change where a side has no value', () => {
    const [row] = changeRows([{ name: 'centre.x', unit: 'm', a: null, b: 0.01, ofA: null }], units);
    expect(row).toMatchObject({ a: '—', change: '—' });
  });
});

describe('who moved it', () => {
  it.each(attributed(d).map((q) => q.name))(
    '%s: every printed column adds up, the last to the change',
    (name) => {
      const quantity = d.quantities.find((q) => q.name === name)!;
      for (const by of ['part', 'group'] as const) {
        const { rows, totals, unit } = attributionOf(d, quantity, units, { by, show: 'all' });
        for (const key of ['mass', 'place', 'shapeAndTurn', 'total'] as const) {
          const sum = rows.reduce((s, row) => s + read(row.figures[key]), 0);
          const decimals = totals[key].split('.')[1]?.length ?? 0;
          expect(Math.abs(sum - read(totals[key]))).toBeLessThan(0.4 * 10 ** -decimals);
        }
        expect(unit).not.toBe('');
      }
    },
  );
  it('comes to the same figure as the difference says', () => {
    const mass = d.quantities.find((q) => q.name === 'mass')!;
    const { totals } = attributionOf(d, mass, units, { by: 'part', show: 'changed' });
    expect(read(totals.total)).toBeCloseTo(mass.change! / units.mass.factor, 1);
  });
  it('draws every bar on the picture, falls to the left of zero and rises to its right', () => {
    const splits = [
      { mass: 3, place: -1, shapeAndTurn: 0 },
      { mass: -2, place: -2, shapeAndTurn: 0.5 },
    ];
    const bars = scaleBars(splits, 600, 60);
    for (const split of splits) {
      const { pieces, left, right } = barPieces(split, bars);
      expect(left).toBeGreaterThanOrEqual(59);
      expect(right).toBeLessThanOrEqual(541);
      for (const piece of pieces)
        if (split[piece.cause] > 0) expect(piece.x).toBeGreaterThanOrEqual(bars.zero);
        else expect(piece.x + piece.width).toBeLessThanOrEqual(bars.zero + 1e-9);
    }
  });
});

it('shows mass first where it moved and what the address asks for where it can', () => {
  expect(chosenQuantity(d, null)!.name).toBe('mass');
  expect(chosenQuantity(d, 'principal.x')!.name).toBe('principal.x');
  expect(chosenQuantity(d, 'gyration.x')!.name).toBe('mass');
  expect(readCompareView(new URLSearchParams('a=baseline&b=7&on=x&show=all'))).toEqual({
    a: 'baseline',
    b: '7',
    on: undefined,
    quantity: null,
    show: 'all',
    by: 'part',
  });
});

it('names quantities in words', () => {
  expect(quantityWords('inertia.xz')).toBe('Ixz about the centre');
  expect(quantityWords('principal.x+y')).toBe('sum of the principal moments near x and y');
});

it('writes a plus before what grew and nothing before a zero', () => {
  expect([signed('1.20'), signed('−1.20'), signed('0.00')]).toEqual(['+1.20', '−1.20', '0.00']);
});

it('reads a unified difference by its signs and counts both sides', () => {
  const patch = readFileSync(new URL('./fixtures/boom.patch', import.meta.url), 'utf8');
  expect(patchLines(patch)).toEqual([
    { kind: 'head', text: 'from line 9 in A, 9 in B', a: null, b: null },
    { kind: 'same', text: 'parameters:', a: 9, b: 9 },
    { kind: 'removed', text: '  boom: 400 mm', a: 10, b: null },
    { kind: 'added', text: '  boom: 420 mm', a: null, b: 10 },
    { kind: 'added', text: '  -- not a sign', a: null, b: 11 },
    { kind: 'same', text: '', a: 11, b: 12 },
    { kind: 'head', text: 'no line break at the end of the file', a: null, b: null },
  ]);
});
