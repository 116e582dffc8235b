/**
 * Exact fractions of big integers, for oracles: a double goes in as the fraction it is, and comes out rounded once.
 * Irrational numbers (π, sine, cosine, square roots) are fractions right to about 90 digits.
 */
export class Rational {
  readonly n: bigint;
  readonly d: bigint;
  constructor(n: bigint, d = 1n) {
    const sign = d < 0n ? -1n : 1n;
    const common = gcd(n < 0n ? -n : n, d < 0n ? -d : d) || 1n;
    this.n = (sign * n) / common;
    this.d = (sign * d) / common;
  }
  plus(o: Exact): Rational {
    const b = exact(o);
    return new Rational(this.n * b.d + b.n * this.d, this.d * b.d);
  }
  minus(o: Exact): Rational {
    return this.plus(exact(o).times(-1));
  }
  times(o: Exact): Rational {
    const b = exact(o);
    return new Rational(this.n * b.n, this.d * b.d);
  }
  over(o: Exact): Rational {
    const b = exact(o);
    return new Rational(this.n * b.d, this.d * b.n);
  }
  abs(): Rational {
    return new Rational(this.n < 0n ? -this.n : this.n, this.d);
  }
  /** Rounded to 2⁻³²⁰ of a unit, so that long sums of irrational numbers stay small. */
  trimmed(): Rational {
    return new Rational((this.n << BITS) / this.d, 1n << BITS);
  }
  /** Nearest double but for a last-place tie: 64 bits of the quotient, rounded by the conversion. */
  toNumber(): number {
    if (this.n === 0n) return 0;
    const size = this.n < 0n ? -this.n : this.n;
    const shift = BigInt(this.d.toString(2).length - size.toString(2).length + 80);
    const quotient = shift >= 0n ? (size << shift) / this.d : size / (this.d << -shift);
    const value = Number(quotient) * 2 ** -Number(shift);
    return this.n < 0n ? -value : value;
  }
}

export type Exact = Rational | number;
const BITS = 320n;

const gcd = (a: bigint, b: bigint): bigint => {
  let [x, y] = [a, b];
  while (y) [x, y] = [y, x % y];
  return x;
};

/** A double as the fraction it is. */
export function exact(value: Exact): Rational {
  if (value instanceof Rational) return value;
  if (Number.isInteger(value) && Math.abs(value) < 2 ** 53) return new Rational(BigInt(value));
  let scaled = value;
  let power = 0;
  while (!Number.isInteger(scaled)) {
    scaled *= 2;
    power++;
  }
  return new Rational(BigInt(scaled), 1n << BigInt(power));
}

/** π by J. Machin's formula of 1706, 16 atan(1/5) − 4 atan(1/239). */
export const PI: Rational = (() => {
  const one = 1n << 400n;
  const arctan = (inverse: bigint) => {
    let term = one / inverse;
    let sum = term;
    for (let k = 3n; term !== 0n; k += 2n) {
      term = -term / (inverse * inverse);
      sum += term / k;
    }
    return sum;
  };
  return new Rational(16n * arctan(5n) - 4n * arctan(239n), one).trimmed();
})();

/** Sine and cosine by their series. @param angle [rad], at most a few turns */
export function sineCosine(angle: Exact): { sine: Rational; cosine: Rational } {
  const x = exact(angle);
  let term = new Rational(1n);
  let sine = new Rational(0n);
  let cosine = new Rational(0n);
  for (let k = 0; k < 120; k++) {
    const signed = k % 4 < 2 ? term : term.times(-1);
    if (k % 2) sine = sine.plus(signed);
    else cosine = cosine.plus(signed);
    term = term
      .times(x)
      .over(k + 1)
      .trimmed();
  }
  return { sine: sine.trimmed(), cosine: cosine.trimmed() };
}

/** Square root by Newton's method on integers. */
export function squareRoot(value: Exact): Rational {
  const target = (exact(value).n << (2n * BITS)) / exact(value).d;
  let root = 1n << BigInt(Math.ceil(target.toString(2).length / 2) + 1);
  for (;;) {
    const next = (root + target / root) >> 1n;
    if (next >= root) return new Rational(root, 1n << BITS);
    root = next;
  }
}
