import generalPower from '@stdlib/math-base-special-pow';

/**
 * base ^ exponent with the same bits on every engine. Exponents 1, 2, 3, −1 and ½ are done by multiplication,
 * division and square root, which round once or twice; so `x^2` equals `x * x` to the last bit.
 *
 * @returns NaN for a negative base under a broken exponent, Infinity for 0 under a negative one
 */
export function pow(base: number, exponent: number): number {
  switch (exponent) {
    case 2:
      return base * base;
    case 1:
      return base;
    case 3:
      return base * base * base;
    case -1:
      return 1 / base;
    case 0.5:
      return Math.sqrt(base);
    default:
      return generalPower(base, exponent);
  }
}
