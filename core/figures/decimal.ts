/** What stands where there is no figure. */
export const NO_FIGURE = '—';

/** Decimal exponent of |x|: 237.11 → 2. Zero and what is not finite have 0. */
export function decimalExponent(x: number): number {
  if (x === 0 || !Number.isFinite(x)) return 0;
  const text = Math.abs(x).toExponential();
  return Number(text.slice(text.indexOf('e') + 1));
}

/** Significant digits of the largest figure of a column, where the caller asks for none. */
export const DIGITS = 5;

const DECIMALS_AT_MOST = 30;

/** The one number of decimals with which a column shows its largest figure to `digits` significant digits. */
export function decimalsFor(values: readonly number[], digits = DIGITS): number {
  const largest = Math.max(0, ...values.filter(Number.isFinite).map(Math.abs));
  const exponent = decimalExponent(largest);
  // What is smaller than any body prints as zero, not as a row of noughts.
  if (exponent < -DECIMALS_AT_MOST) return digits - 1;
  return Math.min(DECIMALS_AT_MOST, Math.max(0, digits - 1 - exponent));
}

/** A figure as an integer count of units of its last printed digit. |x| below 1e21. */
export const toLastDigits = (x: number, decimals: number): bigint =>
  BigInt(x.toFixed(decimals).replace('.', ''));

/** A count of units of the last digit as text: (−6931n, 2) → `−69.31`. */
export function fromLastDigits(units: bigint, decimals: number): string {
  const digits = (units < 0n ? -units : units).toString().padStart(decimals + 1, '0');
  const cut = digits.length - decimals;
  const text = decimals === 0 ? digits : `${digits.slice(0, cut)}.${digits.slice(cut)}`;
  return units < 0n ? `−${text}` : text;
}

/** True minus for the hyphen of a number's text; no sign on a printed zero. */
export const withTrueMinus = (text: string): string =>
  (/^-0(\.0*)?$/.test(text) ? text.slice(1) : text).replaceAll('-', '−');

/** A figure with fixed decimals, a true minus and no negative zero; with an exponent from 1e15 on. */
export function formatFixed(x: number | null | undefined, decimals: number): string {
  if (x === null || x === undefined || !Number.isFinite(x)) return NO_FIGURE;
  return withTrueMinus(Math.abs(x) < 1e15 ? x.toFixed(decimals) : x.toExponential(DIGITS - 1));
}

/** A figure to `digits` significant digits, plain where it is short enough, with an exponent where it is not. */
export function formatSignificant(x: number | null | undefined, digits = DIGITS): string {
  if (x === null || x === undefined || !Number.isFinite(x)) return NO_FIGURE;
  const exponent = decimalExponent(x);
  if (exponent < -5 || exponent > 8) return withTrueMinus(x.toExponential(digits - 1));
  return withTrueMinus(x.toFixed(Math.max(0, digits - 1 - exponent)));
}

/** The shortest text that is the figure to twelve digits: a limit as its author would write it. */
export function formatShort(x: number): string {
  return withTrueMinus(String(Number(x.toPrecision(12))).replace('e+', 'e'));
}

/** The number that a printed figure says. */
export const readFigure = (text: string): number => Number(text.replaceAll('−', '-'));

/** A share as percent with one decimal; what is there but smaller says so. */
export function formatPercent(share: number | null, decimals = 1): string {
  if (share === null || !Number.isFinite(share)) return NO_FIGURE;
  const percent = 100 * share;
  if (Math.abs(percent) >= 1e5) return withTrueMinus(percent.toExponential(1));
  const text = formatFixed(percent, decimals);
  if (percent !== 0 && readFigure(text) === 0) return `under ${(0.1 ** decimals).toFixed(decimals)}`;
  return text;
}
