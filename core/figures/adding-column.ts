import { fromLastDigits, toLastDigits } from './decimal.ts';

/** A column of figures above its total, rounded to one number of decimals. */
export interface AddingColumn {
  readonly figures: string[];
  readonly total: string;
  /** Where the printed column does not come to its printed total: a sentence that says by how much. */
  readonly note: string | null;
}

/**
 * Rounds a column so that its printed figures add up to the printed total: those with the largest remainders go to
 * the other neighbour. No figure is a whole unit of its last digit from its true value.
 *
 * @param values all in the printed unit; together they are the total, or the note says that they are not
 */
export function printAddingColumn(values: readonly number[], total: number, decimals: number): AddingColumn {
  const ten = Number(`1e${decimals}`);
  const units = values.map((x) => toLastDigits(x, decimals));
  const sum = toLastDigits(total, decimals);
  const remainder = values.map((x, i) => x * ten - Number(units[i]));
  const missing = Number(units.reduce((rest, u) => rest - u, sum));
  const step = missing > 0 ? 1 : -1;
  const movable = remainder
    .map((r, i) => ({ i, r: r * step }))
    .filter(({ r }) => r > 0)
    .sort((a, b) => b.r - a.r || a.i - b.i)
    .slice(0, Math.abs(missing));
  const adds = movable.length === Math.abs(missing);
  if (adds) for (const { i } of movable) units[i] = units[i]! + BigInt(step);
  return {
    figures: units.map((u) => fromLastDigits(u, decimals)),
    total: fromLastDigits(sum, decimals),
    note: adds
      ? null
      : `figures are rounded; the column differs from the total by ${Math.abs(missing)} in the last digit`,
  };
}
