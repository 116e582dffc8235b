import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { printAddingColumn, readFigure } from '../../../core/figures/index.ts';

const units = (text: string) => BigInt(text.replace('−', '-').replace('.', ''));

describe('printAddingColumn', () => {
  it('adds up in printed digits, no figure a whole unit of its last digit from the truth', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -1000, max: 1000, noNaN: true }), { minLength: 1, maxLength: 40 }),
        fc.integer({ min: 0, max: 4 }),
        (values, decimals) => {
          const total = values.reduce((a, b) => a + b, 0);
          const column = printAddingColumn(values, total, decimals);
          expect(column.note).toBeNull();
          expect(column.figures.map(units).reduce((a, b) => a + b, 0n)).toBe(units(column.total));
          column.figures.forEach((text, i) => {
            expect(Math.abs(readFigure(text) - values[i]!)).toBeLessThan(10 ** -decimals * 1.0001);
          });
        },
      ),
    );
  });

  it('gives the last unit to the largest remainder', () => {
    expect(printAddingColumn([1 / 3, 1 / 3, 1 / 3 + 0.001], 1.001, 1).figures).toEqual(['0.3', '0.3', '0.4']);
  });

  it('says by how much a column differs that is not its total', () => {
    const column = printAddingColumn([1, 2], 3.3, 1);
    expect(column.figures).toEqual(['1.0', '2.0']);
    expect(column.note).toBe('figures are rounded; the column differs from the total by 3 in the last digit');
  });

  it('prints no negative zero', () => {
    expect(printAddingColumn([-0.001, 0.001], 0, 1).figures).toEqual(['0.0', '0.0']);
  });
});
