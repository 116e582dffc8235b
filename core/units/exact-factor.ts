/** A conversion factor without rounding: numerator / denominator × π^piPower. */
export interface ExactFactor {
  readonly numerator: bigint;
  readonly denominator: bigint;
  readonly piPower: number;
}

/** π to 64 places (OEIS A000796), as a whole number over 10^64. */
const PI_DIGITS = 31415926535897932384626433832795028841971693993751058209749445923n;
const PI_PLACES = 64n;

/** mantissa × 10^exponent as an exact factor. */
export function decimalFactor(mantissa: bigint, exponent = 0): ExactFactor {
  const power = 10n ** BigInt(Math.abs(exponent));
  return exponent < 0 ? reduced(mantissa, power, 0) : reduced(mantissa * power, 1n, 0);
}

/** a · b^power. */
export function productFactor(a: ExactFactor, b: ExactFactor, power = 1): ExactFactor {
  const times = BigInt(Math.abs(power));
  const top = (power < 0 ? b.denominator : b.numerator) ** times;
  const bottom = (power < 0 ? b.numerator : b.denominator) ** times;
  return reduced(a.numerator * top, a.denominator * bottom, a.piPower + b.piPower * power);
}

export const piFactor: ExactFactor = { numerator: 1n, denominator: 1n, piPower: 1 };

/** The power of ten that the factor is, or undefined when it is none. */
export function powerOfTen(factor: ExactFactor): number | undefined {
  if (factor.piPower !== 0) return undefined;
  if (factor.denominator === 1n && isPowerOfTen(factor.numerator)) return String(factor.numerator).length - 1;
  if (factor.numerator === 1n && isPowerOfTen(factor.denominator))
    return 1 - String(factor.denominator).length;
  return undefined;
}

const isPowerOfTen = (n: bigint): boolean => /^10*$/.test(String(n));

/** The double nearest to mantissa × 10^exponent × factor (ties to even). */
export function nearestProduct(mantissa: bigint, exponent: number, factor: ExactFactor): number {
  let top = mantissa * factor.numerator;
  let bottom = factor.denominator;
  const turns = BigInt(Math.abs(factor.piPower));
  if (factor.piPower >= 0) {
    top *= PI_DIGITS ** turns;
    bottom *= 10n ** (PI_PLACES * turns);
  } else {
    top *= 10n ** (PI_PLACES * turns);
    bottom *= PI_DIGITS ** turns;
  }
  if (exponent >= 0) top *= 10n ** BigInt(exponent);
  else bottom *= 10n ** BigInt(-exponent);
  return nearestQuotient(top, bottom);
}

/**
 * The double nearest to top / bottom (ties to even) for top ≥ 0 and bottom > 0. A quotient of 55 or 56 bits, its last
 * bit set when anything was cut off, rounds once in `Number`; below the smallest normal number it rounds twice.
 */
export function nearestQuotient(top: bigint, bottom: bigint): number {
  if (top === 0n) return 0;
  const shift = bitLength(bottom) - bitLength(top) + 55;
  const above = shift > 0 ? top << BigInt(shift) : top;
  const below = shift < 0 ? bottom << BigInt(-shift) : bottom;
  const quotient = above / below;
  const sticky = quotient * below === above ? 0n : 1n;
  return timesPowerOfTwo(Number(quotient | sticky), -shift);
}

const bitLength = (n: bigint): number => n.toString(2).length;

const TWO_TO_512 = Number(1n << 512n);

/** x · 2^power by multiplications that are exact while the result is a normal number. */
function timesPowerOfTwo(x: number, power: number): number {
  let result = x;
  let left = power;
  for (; left > 512; left -= 512) result *= TWO_TO_512;
  for (; left < -512; left += 512) result /= TWO_TO_512;
  return left >= 0 ? result * Number(1n << BigInt(left)) : result / Number(1n << BigInt(-left));
}

function reduced(numerator: bigint, denominator: bigint, piPower: number): ExactFactor {
  let a = numerator;
  let b = denominator;
  while (b !== 0n) [a, b] = [b, a % b];
  return { numerator: numerator / a, denominator: denominator / a, piPower };
}
