/** Triangles summed in plain arithmetic before a block's total joins the compensated sum. */
export const BLOCK = 256;

/** Adds `value` to sums[i], keeping what the addition dropped in lost[i] (Neumaier, ZAMM 54, 1974). */
export function addCompensated(sums: Float64Array, lost: Float64Array, i: number, value: number): void {
  const before = sums[i]!;
  const after = before + value;
  lost[i]! += Math.abs(before) >= Math.abs(value) ? before - after + value : value - after + before;
  sums[i] = after;
}
