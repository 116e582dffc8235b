import { determinant } from '../linalg/matrix3.ts';
import type { Matrix3 } from '../linalg/symmetric3.ts';
import type { Vector3 } from '../linalg/vector3.ts';

/**
 * One way to lay axes upon axes: signed permutations. A tensor sees no difference between a turn R and −R, so each
 * reading carries both, the turn and its mirror twin; only the centre tells them apart.
 */
export interface AxisReading {
  /** Proper: b's vector v in a's axes is R v. */
  readonly turn: Matrix3;
  /** −R. */
  readonly mirror: Matrix3;
  readonly turnWords: string;
  readonly mirrorWords: string;
  /** None, axes that keep their names (two signs flipped), or axes that swap names. */
  readonly kind: 'none' | 'signs' | 'permutation';
}

const NAMES = ['x', 'y', 'z'] as const;
const PLANES: Record<number, string> = { 0: 'yz', 1: 'xz', 2: 'xy' };

export const AXIS_READINGS: readonly AxisReading[] = (() => {
  const readings: AxisReading[] = [];
  const permutations = [
    [0, 1, 2],
    [1, 2, 0],
    [2, 0, 1],
    [1, 0, 2],
    [0, 2, 1],
    [2, 1, 0],
  ];
  for (const permutation of permutations)
    for (let signs = 0; signs < 8; signs++) {
      const row = (r: number): Vector3 => {
        const v: [number, number, number] = [0, 0, 0];
        v[permutation[r]!] = signs & (1 << r) ? -1 : 1;
        return v;
      };
      const turn: Matrix3 = [row(0), row(1), row(2)];
      if (determinant(turn) < 0) continue;
      const mirror = turn.map((r) => r.map((x) => 0 - x)) as unknown as Matrix3;
      const straight = permutation.every((p, i) => p === i);
      const kept = [0, 1, 2].filter((k) => turn[k]![k] === 1);
      readings.push({
        turn,
        mirror,
        kind: straight ? (kept.length === 3 ? 'none' : 'signs') : 'permutation',
        turnWords:
          straight && kept.length === 1
            ? `turned half about ${NAMES[kept[0]!]}`
            : `in axes renamed, ${arrows(turn)}`,
        mirrorWords:
          straight && kept.length === 1
            ? `mirrored in the ${PLANES[kept[0]!]} plane`
            : straight
              ? 'mirrored through the origin'
              : `in axes renamed and mirrored, ${arrows(mirror)}`,
      });
    }
  return readings;
})();

/** `x → y, y → −z, z → x`: where a's axes come from in b's. */
function arrows(matrix: Matrix3): string {
  return NAMES.map((name, r) => {
    const k = matrix[r]!.findIndex((x) => x !== 0);
    return `${matrix[r]![k]! < 0 ? '−' : ''}${NAMES[k]} as ${name}`;
  }).join(', ');
}
