import type { LimitResult } from '../record/record.ts';
import {
  DIGITS,
  decimalExponent,
  formatPercent,
  formatShort,
  formatSignificant,
  fromLastDigits,
  NO_FIGURE,
  readFigure,
  withTrueMinus,
} from './decimal.ts';
import type { DisplayUnit } from './display-units.ts';

/** A limit's figures as text, in one unit, never rounded across a stop. */
export interface PrintedLimit {
  readonly unit: string;
  readonly value: string;
  readonly min: string | null;
  readonly max: string | null;
  /** Distance to the nearest stop without sign; null where there is no value. */
  readonly margin: string | null;
  /** `margin 12.89 g (5.2 % of the limit)`, `short by 0.0053`, `over by 3.1 g`, `no value`. */
  readonly words: string;
}

type Judged = Pick<LimitResult, 'value' | 'min' | 'max' | 'margin' | 'marginOfLimit' | 'verdict' | 'nearest'>;

/** Seventeen significant digits tell any two doubles apart. */
const DIGITS_AT_MOST = 17;

/**
 * Prints a limit. A value outside never reads as equal to the stop it passed, nor a value within as outside: digits
 * are added until it shows, and where even all digits are one, `>` or `<` stands before the value.
 */
export function printLimit(limit: Judged, unit: DisplayUnit, digits = DIGITS): PrintedLimit {
  const stop = (x: number | null) => (x === null ? null : formatShort(x / unit.factor));
  const min = stop(limit.min);
  const max = stop(limit.max);
  if (limit.value === null)
    return { unit: unit.text, value: NO_FIGURE, min, max, margin: null, words: 'no value' };
  const value = printValue(limit, limit.value / unit.factor, min, max, digits);
  const nearest = limit.nearest === 'min' ? min : max;
  const margin = printMargin(Math.abs(limit.margin ?? 0) / unit.factor, value, nearest, digits);
  return { unit: unit.text, value, min, max, margin, words: words(limit, margin, unit.text) };
}

function printValue(
  limit: Judged,
  value: number,
  min: string | null,
  max: string | null,
  digits: number,
): string {
  const low = min === null ? null : readFigure(min);
  const high = max === null ? null : readFigure(max);
  const above = limit.max !== null && limit.value! > limit.max;
  const below = limit.min !== null && limit.value! < limit.min;
  const largest = Math.max(Math.abs(value), Math.abs(low ?? 0), Math.abs(high ?? 0));
  let text = '';
  for (let d = digits; d <= DIGITS_AT_MOST; d++) {
    text = alike(value, largest, d);
    const read = readFigure(text);
    if (above ? read > high! : below ? read < low! : staysWithin(limit, read, low, high, d)) return text;
  }
  return above ? `>${max}` : below ? `<${min}` : text;
}

/** Within, a value may read as equal to a stop only where it is, as far as twelve digits go. */
function staysWithin(
  limit: Judged,
  read: number,
  low: number | null,
  high: number | null,
  digits: number,
): boolean {
  if ((high !== null && read > high) || (low !== null && read < low)) return digits >= DIGITS_AT_MOST;
  const touches = (high !== null && read === high) || (low !== null && read === low);
  return !touches || limit.margin === 0 || digits >= 12;
}

/** With the decimals that the largest figure of the line needs; with an exponent where that would be long. */
function alike(value: number, largest: number, digits: number): string {
  const exponent = decimalExponent(largest);
  if (exponent < -5 || exponent > 8 || decimalExponent(value) > 14)
    return withTrueMinus(value.toExponential(digits - 1));
  return withTrueMinus(value.toFixed(Math.max(0, digits - 1 - exponent)));
}

const decimalsOf = (text: string) => text.split('.')[1]?.length ?? 0;

/** From the printed figures where that is exact, so that stop and value give the margin that is printed. */
function printMargin(margin: number, value: string, stop: string | null, digits: number): string {
  if (stop === null) return formatSignificant(margin, digits);
  const plain = /^[−\d.]+$/;
  const decimals = decimalsOf(value);
  if (!plain.test(value) || !plain.test(stop) || decimalsOf(stop) > decimals)
    return formatSignificant(margin, Math.min(digits, 3));
  const difference = toUnits(value, decimals) - toUnits(stop, decimals);
  return fromLastDigits(difference < 0n ? -difference : difference, decimals);
}

function toUnits(text: string, decimals: number): bigint {
  const [whole = '0', fraction = ''] = text.replace('−', '-').split('.');
  return BigInt(whole + fraction.padEnd(decimals, '0'));
}

function words(limit: Judged, margin: string, unit: string): string {
  const amount = `${margin}${unit === '' ? '' : ` ${unit}`}`;
  const share =
    limit.marginOfLimit === null ? '' : ` (${formatPercent(Math.abs(limit.marginOfLimit))} % of the limit)`;
  if (limit.verdict === 'within') return `margin ${amount}${share}`;
  return `${limit.nearest === 'min' ? 'short' : 'over'} by ${amount}${share}`;
}
