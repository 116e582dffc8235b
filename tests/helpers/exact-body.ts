import type { Body } from '../../core/inertia/body.ts';
import type { Symmetric3 } from '../../core/linalg/symmetric3.ts';
import type { Vector3 } from '../../core/linalg/vector3.ts';
import { type Exact, exact, PI, type Rational, sineCosine } from './rational.ts';

/**
 * Mass, first and second moments about the origin in exact fractions. Here the shift to the centroid cancels nothing,
 * so the oracle needs none of the care of the code it judges.
 */
export interface RawMoments {
  m: Rational;
  s: Rational[];
  /** xx, yy, zz, xy, xz, yz */
  q: Rational[];
}

export const ZERO_RAW = (): RawMoments => ({
  m: exact(0),
  s: [0, 0, 0].map(exact),
  q: [0, 0, 0, 0, 0, 0].map(exact),
});

export const combine = (a: RawMoments, b: RawMoments, k = 1): RawMoments => ({
  m: a.m.plus(b.m.times(k)),
  s: a.s.map((v, i) => v.plus(b.s[i]!.times(k))),
  q: a.q.map((v, i) => v.plus(b.q[i]!.times(k))),
});

/** Central form, rounded to doubles at the very end. */
export function toBody({ m, s, q }: RawMoments): Body {
  const pairs = [
    [0, 0],
    [1, 1],
    [2, 2],
    [0, 1],
    [0, 2],
    [1, 2],
  ] as const;
  const central = pairs.map(([i, j], k) => q[k]!.minus(s[i]!.times(s[j]!).over(m)).toNumber());
  return {
    mass: m.toNumber(),
    centre: s.map((v) => v.over(m).toNumber()) as unknown as Vector3,
    secondMoments: central as unknown as Symmetric3,
  };
}

/** A polynomial's coefficients from the constant up. */
export type Polynomial = readonly Exact[];

export function multiply(a: Polynomial, b: Polynomial): Rational[] {
  const out = Array.from({ length: a.length + b.length - 1 }, () => exact(0));
  for (let i = 0; i < a.length; i++)
    for (let j = 0; j < b.length; j++) out[i + j] = out[i + j]!.plus(exact(a[i]!).times(b[j]!));
  return out;
}

/** ∫ p(t) dt between two limits, exactly. */
export function integrate(p: Polynomial, from: Exact, to: Exact): Rational {
  const at = (t: Exact) => {
    let sum = exact(0);
    for (let i = p.length - 1; i >= 0; i--) sum = sum.plus(exact(p[i]!).over(i + 1)).times(t);
    return sum;
  };
  return at(to).minus(at(from));
}

/**
 * A pile of elliptical disks along z: at height z half axes a·k and b·k with k² a polynomial in z. A round body has a = b = 1 and its
 * radius squared for k².
 */
export function disks(square: Polynomial, from: Exact, to: Exact, a: Exact = 1, b: Exact = 1): RawMoments {
  const area = (p: Polynomial) => integrate(p, from, to).times(PI).times(a).times(b);
  const fourth = area(multiply(square, square)).over(4);
  const zero = exact(0);
  return {
    m: area(square),
    s: [zero, zero, area(multiply(square, [0, 1]))],
    q: [
      fourth.times(a).times(a),
      fourth.times(b).times(b),
      area(multiply(square, [0, 0, 1])),
      zero,
      zero,
      zero,
    ],
  };
}

/** A thin round surface: at height z radius² is a polynomial and the slant area per height and turn, ρ dℓ/dz, another. */
export function hoops(square: Polynomial, slant: Polynomial, from: Exact, to: Exact): RawMoments {
  const area = (p: Polynomial) => integrate(multiply(slant, p), from, to).times(PI).times(2);
  const half = area(square).over(2);
  const zero = exact(0);
  return { m: area([1]), s: [zero, zero, area([0, 1])], q: [half, half, area([0, 0, 1]), zero, zero, zero] };
}

/**
 * ∫∫ u^i v^j over a polygon by its boundary alone: ∮ u^(i+1)/(i+1) v^j dv, each side a polynomial in its own parameter.
 * Positive for counter-clockwise outlines.
 */
export function polygonMoment(points: readonly (readonly [Exact, Exact])[], i: number, j: number): Rational {
  let sum = exact(0);
  for (let k = 0; k < points.length; k++) {
    const [u, v] = points[k]!;
    const [u2, v2] = points[(k + 1) % points.length]!;
    const rise = exact(v2).minus(v);
    let p: Rational[] = [rise];
    for (let n = 0; n <= i; n++) p = multiply(p, [u, exact(u2).minus(u)]);
    for (let n = 0; n < j; n++) p = multiply(p, [v, rise]);
    sum = sum.plus(integrate(p, 0, 1));
  }
  return sum.over(i + 1);
}

/** A section's moments ∫ ρ^i z^j dA, swept about z from +x through an angle. */
export function sweep(section: (i: number, j: number) => Rational, angle: Exact): RawMoments {
  const { sine, cosine } = sineCosine(angle);
  const a = exact(angle);
  const bulge = sine.times(cosine).over(2);
  const third = section(3, 0);
  return {
    m: a.times(section(1, 0)),
    s: [sine.times(section(2, 0)), exact(1).minus(cosine).times(section(2, 0)), a.times(section(1, 1))],
    q: [
      third.times(a.over(2).plus(bulge)),
      third.times(a.over(2).minus(bulge)),
      a.times(section(1, 2)),
      third.times(sine).times(sine).over(2),
      sine.times(section(2, 1)),
      exact(1).minus(cosine).times(section(2, 1)),
    ],
  };
}

/** Signed tetrahedra from the origin over triangles of exact corners, by the integral of each monomial over a simplex. */
export function tetrahedra(triangles: readonly (readonly (readonly Exact[])[])[]): RawMoments {
  let total = ZERO_RAW();
  for (const corners of triangles) {
    const [a, b, c] = corners.map((corner) => corner.map(exact)) as [Rational[], Rational[], Rational[]];
    const minor = (i: number, j: number) => b[i]!.times(c[j]!).minus(b[j]!.times(c[i]!));
    const six = a[0]!
      .times(minor(1, 2))
      .plus(a[1]!.times(minor(2, 0)))
      .plus(a[2]!.times(minor(0, 1)));
    const sum = [0, 1, 2].map((i) => a[i]!.plus(b[i]!).plus(c[i]!));
    const product = (i: number, j: number) =>
      [a, b, c]
        .reduce((all, p) => all.plus(p[i]!.times(p[j]!)), sum[i]!.times(sum[j]!))
        .times(six)
        .over(120);
    total = combine(total, {
      m: six.over(6),
      s: sum.map((v) => v.times(six).over(24)),
      q: [product(0, 0), product(1, 1), product(2, 2), product(0, 1), product(0, 2), product(1, 2)],
    });
  }
  return total;
}
