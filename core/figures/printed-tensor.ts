import { secondMomentsFromInertia as secondMomentsOf } from '../inertia/body.ts';
import { eigenSymmetric3 } from '../linalg/eigen-symmetric3.ts';
import type { Symmetric3 } from '../linalg/symmetric3.ts';
import { DIGITS, decimalsFor, fromLastDigits, toLastDigits } from './decimal.ts';

/** A tensor rounded so that its printed digits are still a tensor that a body can have. */
export interface PrintedTensor {
  /** xx, yy, zz, xy, xz, yz in units of the last digit; the tensor's own elements, products negative. */
  readonly units: readonly bigint[];
  readonly decimals: number;
  /** What was done to keep it possible, for the reader; null where plain rounding did. */
  readonly note: string | null;
}

type Six = readonly [bigint, bigint, bigint, bigint, bigint, bigint];

const MORE_DIGITS_AT_MOST = 6;

/**
 * Rounds a tensor about any one point to one number of decimals. Where plain rounding leaves digits that no body can
 * have (½ tr J 1 − J not positive semidefinite: of a flat plate, often), the least change of one in the last digits
 * mends it, the largest moment first; where none does, digits are added.
 *
 * @param tensor in the printed unit, products negative; of a cut-out all signs are turned
 */
export function printTensor(tensor: Symmetric3, digits = DIGITS): PrintedTensor {
  const negative = tensor[0] + tensor[1] + tensor[2] < 0;
  const upright = (negative ? tensor.map((x) => 0 - x) : tensor) as unknown as Symmetric3;
  const printed = printUpright(upright, digits);
  return negative ? { ...printed, units: printed.units.map((x) => -x) } : printed;
}

function printUpright(tensor: Symmetric3, digits: number): PrintedTensor {
  const first = decimalsFor(tensor, digits);
  const plain = (decimals: number) => tensor.map((x) => toLastDigits(x, decimals)) as unknown as Six;
  if (isPossible(plain(first))) return { units: plain(first), decimals: first, note: null };
  if (!isPossibleUnrounded(tensor))
    return { units: plain(first), decimals: first, note: 'no body has this tensor' };
  for (let decimals = first; decimals <= first + MORE_DIGITS_AT_MOST; decimals++) {
    const rounded = plain(decimals);
    if (isPossible(rounded)) return { units: rounded, decimals, note: NOTE_DIGITS };
    const mended = leastChange(tensor, rounded, decimals);
    if (mended)
      return {
        units: mended,
        decimals,
        note: decimals === first ? NOTE_CHANGE : `${NOTE_DIGITS}; ${NOTE_CHANGE}`,
      };
  }
  // Rounding moves an eigenvalue of tr J 1 − 2 J by less than four units: larger moments always end it.
  const decimals = first + MORE_DIGITS_AT_MOST;
  let units = plain(decimals);
  while (!isPossible(units))
    units = [units[0] + 1n, units[1] + 1n, units[2] + 1n, units[3], units[4], units[5]];
  return { units, decimals, note: `${NOTE_DIGITS}; ${NOTE_CHANGE}` };
}

const NOTE_CHANGE = 'last digits changed by one so that the printed tensor stays possible';
const NOTE_DIGITS = 'digits added so that the printed tensor stays possible';

/** Whether tr J 1 − 2 J, in whole numbers, is positive semidefinite: no principal minor is negative. */
export function isPossible(j: readonly bigint[]): boolean {
  const [xx, yy, zz, xy, xz, yz] = j as Six;
  const a = yy + zz - xx;
  const b = xx + zz - yy;
  const c = xx + yy - zz;
  const [f, g, h] = [-2n * xy, -2n * xz, -2n * yz];
  if (a < 0n || b < 0n || c < 0n) return false;
  if (a * b < f * f || a * c < g * g || b * c < h * h) return false;
  return a * b * c + 2n * f * g * h - a * h * h - b * g * g - c * f * f >= 0n;
}

const UNROUNDED = 1e-9;

function isPossibleUnrounded(tensor: Symmetric3): boolean {
  const q = secondMomentsOf(tensor);
  return eigenSymmetric3(q).values[0] >= -UNROUNDED * (q[0] + q[1] + q[2]);
}

/** The mending that changes fewest elements, the largest moment rather than others, then nearest to the true figures. */
function leastChange(tensor: Symmetric3, rounded: Six, decimals: number): Six | undefined {
  const ten = Number(`1e${decimals}`);
  const error = tensor.map((x, k) => Number(rounded[k]!) - x * ten);
  const largest = [0, 1, 2].reduce((best, k) => (tensor[k]! > tensor[best]! ? k : best), 0);
  let best: { units: Six; changes: number; away: number } | undefined;
  for (const steps of STEPS) {
    const changes = steps.reduce((n, s, k) => n + (s === 0 ? 0 : k === largest ? 0.9 : 1), 0);
    const away = steps.reduce((sum, s, k) => sum + Math.abs(error[k]! + s), 0);
    if (best && (changes > best.changes || (changes === best.changes && away >= best.away))) continue;
    // One in the last digit from the true figure at most, but for noise.
    if (steps.some((s, k) => s !== 0 && Math.abs(error[k]! + s) > 1.000001)) continue;
    const units = rounded.map((u, k) => u + BigInt(steps[k]!)) as unknown as Six;
    if (isPossible(units)) best = { units, changes, away };
  }
  return best?.units;
}

/** All 3⁶ changes by −1, 0 or 1. */
const STEPS: readonly (readonly number[])[] = Array.from({ length: 729 }, (_, n) =>
  [1, 3, 9, 27, 81, 243].map((power) => (Math.floor(n / power) % 3) - 1),
);

/** How the products of inertia are printed: the tensor's own elements, or +∫ x y dm. */
export type ProductsSign = 'negative' | 'positive';

/** The nine printed figures as rows. */
export function tensorRows(tensor: PrintedTensor, products: ProductsSign): [string[], string[], string[]] {
  const sign = products === 'positive' ? -1n : 1n;
  const at = (k: number) =>
    fromLastDigits(k > 2 ? sign * tensor.units[k]! : tensor.units[k]!, tensor.decimals);
  return [
    [at(0), at(3), at(4)],
    [at(3), at(1), at(5)],
    [at(4), at(5), at(2)],
  ];
}

/** Principal moments as printed: still such that no one is more than the other two together. */
export function printMoments(
  moments: readonly number[],
  digits = DIGITS,
): { texts: string[]; decimals: number; note: string | null } {
  const tensor = printTensor([moments[0]!, moments[1]!, moments[2]!, 0, 0, 0], digits);
  const note = tensor.note?.replace('the printed tensor stays', 'the printed moments stay') ?? null;
  return {
    texts: tensor.units.slice(0, 3).map((u) => fromLastDigits(u, tensor.decimals)),
    decimals: tensor.decimals,
    note,
  };
}
