import type { Split } from '#core/difference/index.ts';
import { CAUSES } from './attribution-rows.ts';

/** One piece of a bar, in pixels from the left of the picture. */
export interface BarPiece {
  readonly cause: keyof Split;
  readonly x: number;
  readonly width: number;
}

export interface Bars {
  readonly zero: number;
  /** Pixels of one unit of the values. */
  readonly scale: number;
}

/**
 * Where zero stands and how long a unit is, so that every bar fits: what pushes up is stacked to the right of zero, what
 * pushes down to its left.
 *
 * @param room pixels kept at both ends for the printed sums
 */
export function scaleBars(splits: readonly Split[], width: number, room: number): Bars {
  const side = (split: Split, sign: 1 | -1) =>
    CAUSES.reduce((sum, cause) => sum + Math.max(0, sign * split[cause]), 0);
  const right = Math.max(0, ...splits.map((s) => side(s, 1)));
  const left = Math.max(0, ...splits.map((s) => side(s, -1)));
  const span = right + left || 1;
  const rooms = room * ((right > 0 ? 1 : 0) + (left > 0 ? 1 : 0) || 1);
  const scale = Math.max(1, width - rooms) / span;
  return { zero: (left > 0 ? room : 0) + left * scale, scale };
}

/** The pieces of one bar in the order of causes, and where its ends are. */
export function barPieces(
  split: Split,
  { zero, scale }: Bars,
): { pieces: BarPiece[]; left: number; right: number } {
  let right = zero;
  let left = zero;
  const pieces: BarPiece[] = [];
  for (const cause of CAUSES) {
    const width = Math.abs(split[cause]) * scale;
    if (width === 0) continue;
    if (split[cause] < 0) left -= width;
    pieces.push({ cause, x: split[cause] < 0 ? left : right, width });
    if (split[cause] > 0) right += width;
  }
  return { pieces, left, right };
}
