import type { Symmetric3 } from './symmetric3.ts';
import { cross, type Vector3 } from './vector3.ts';

/** Eigenvalues ascending; row i is the unit eigenvector of value i. Right-handed, signs canonical. */
export interface Eigen3 {
  readonly values: Vector3;
  readonly vectors: readonly [Vector3, Vector3, Vector3];
}

const SWEEPS_AT_MOST = 60;

/**
 * Eigenvalues and vectors of a symmetric 3×3 matrix by cyclic Jacobi rotations (Golub & Van Loan, Matrix
 * Computations, section 8.5; Demmel & Veselić 1992 for the accuracy of small values). Only + − × ÷ √, so the
 * same bits on every engine.
 *
 * Vectors 1 and 2 have their largest component positive (the first of equals), vector 3 is their cross product.
 */
export function eigenSymmetric3(matrix: Symmetric3): Eigen3 {
  const a = [
    [matrix[0], matrix[3], matrix[4]],
    [matrix[3], matrix[1], matrix[5]],
    [matrix[4], matrix[5], matrix[2]],
  ] as number[][];
  const v = [
    [1, 0, 0],
    [0, 1, 0],
    [0, 0, 1],
  ];
  for (let sweep = 0; sweep < SWEEPS_AT_MOST; sweep++) {
    let turned = false;
    for (const [p, q] of PAIRS) turned = rotate(a, v, p, q) || turned;
    if (!turned) break;
  }
  const order = [0, 1, 2].sort((i, j) => a[i]![i]! - a[j]![j]! || i - j);
  const column = (k: number): Vector3 => [v[0]![k]!, v[1]![k]!, v[2]![k]!];
  const first = largestPositive(unit(column(order[0]!)));
  const second = largestPositive(unit(column(order[1]!)));
  return {
    values: [a[order[0]!]![order[0]!]!, a[order[1]!]![order[1]!]!, a[order[2]!]![order[2]!]!],
    vectors: [first, second, unit(cross(first, second)).map((x) => x + 0) as unknown as Vector3],
  };
}

const PAIRS = [
  [0, 1],
  [0, 2],
  [1, 2],
] as const;

/** One Jacobi rotation that makes a[p][q] zero; false when it is already negligible beside its diagonal. */
function rotate(a: number[][], v: number[][], p: number, q: number): boolean {
  const off = a[p]![q]!;
  if (off === 0) return false;
  const x = a[p]![p]!;
  const y = a[q]![q]!;
  const small = Math.abs(off);
  if (Math.abs(x) + small === Math.abs(x) && Math.abs(y) + small === Math.abs(y)) {
    a[p]![q] = a[q]![p] = 0;
    return false;
  }
  const theta = (y - x) / (2 * off);
  const t = (theta < 0 ? -1 : 1) / (Math.abs(theta) + Math.sqrt(theta * theta + 1));
  const c = 1 / Math.sqrt(t * t + 1);
  const s = t * c;
  const tau = s / (1 + c);
  a[p]![p] = x - t * off;
  a[q]![q] = y + t * off;
  a[p]![q] = a[q]![p] = 0;
  const r = 3 - p - q;
  const g = a[r]![p]!;
  const h = a[r]![q]!;
  a[r]![p] = a[p]![r] = g - s * (h + tau * g);
  a[r]![q] = a[q]![r] = h + s * (g - tau * h);
  for (const row of v) {
    const e = row[p]!;
    const f = row[q]!;
    row[p] = e - s * (f + tau * e);
    row[q] = f + s * (e - tau * f);
  }
  return true;
}

function unit(x: Vector3): Vector3 {
  const n = Math.sqrt(x[0] * x[0] + x[1] * x[1] + x[2] * x[2]);
  return [x[0] / n, x[1] / n, x[2] / n];
}

function largestPositive(x: Vector3): Vector3 {
  let k = 0;
  for (let i = 1; i < 3; i++) if (Math.abs(x[i]!) > Math.abs(x[k]!)) k = i;
  return x[k]! < 0 ? [0 - x[0], 0 - x[1], 0 - x[2]] : [x[0] + 0, x[1] + 0, x[2] + 0];
}
