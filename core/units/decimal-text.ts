/** Decimal digits with an optional exponent and no sign, as expressions and files write numbers. */
export const DECIMAL = /^(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/;

/** Past any exponent that a text of digits can bring back into the range of doubles. */
const HUGE = 1e9;

/**
 * The double nearest to (the decimal number written in `text`) × 10^exponent: the exponent is added in the text, so the
 * engine's reader rounds once. `shiftDecimal('1.2', -3)` is 0.0012.
 *
 * @param text a decimal number, with or without a sign and an exponent
 * @param exponent a whole number
 */
export function shiftDecimal(text: string, exponent: number): number {
  if (exponent === 0) return Number(text);
  const mark = exponentMark(text);
  if (mark < 0) return Number(`${text}e${exponent}`);
  const written = Math.max(-HUGE, Math.min(HUGE, Number(text.slice(mark + 1))));
  return Number(`${text.slice(0, mark)}e${written + exponent}`);
}

/** The number written in an unsigned decimal text as mantissa × 10^exponent, without rounding. */
export function decimalParts(text: string): { mantissa: bigint; exponent: number } {
  const mark = exponentMark(text);
  const digits = mark < 0 ? text : text.slice(0, mark);
  const exponent = mark < 0 ? 0 : Number(text.slice(mark + 1));
  const point = digits.indexOf('.');
  if (point < 0) return { mantissa: BigInt(digits), exponent };
  const places = digits.length - point - 1;
  return { mantissa: BigInt(digits.slice(0, point) + digits.slice(point + 1)), exponent: exponent - places };
}

function exponentMark(text: string): number {
  const lower = text.indexOf('e');
  return lower < 0 ? text.indexOf('E') : lower;
}

/**
 * The shortest decimal that reads back as `value`, its point moved: `shiftedText(0.0012, 3)` is "1.2". Large and small
 * ones have an exponent, as JavaScript writes them.
 */
export function shiftedText(value: number, exponent: number): string {
  const { mantissa, exponent: written } = decimalParts(String(Math.abs(value)));
  const digits = String(mantissa).replace(/0+$/, '');
  if (digits === '') return '0';
  const sign = value < 0 ? '-' : '';
  /** Where the point stands, counted from the first digit. */
  const point = String(mantissa).length + written + exponent;
  if (point > 21 || point < -5) {
    const rest = digits.slice(1);
    return `${sign}${digits[0]}${rest === '' ? '' : `.${rest}`}e${point - 1}`;
  }
  if (point <= 0) return `${sign}0.${'0'.repeat(-point)}${digits}`;
  if (point >= digits.length) return sign + digits.padEnd(point, '0');
  return `${sign}${digits.slice(0, point)}.${digits.slice(point)}`;
}
