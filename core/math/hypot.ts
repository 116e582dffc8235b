/** Squares of numbers between these neither overflow nor lose digits to the subnormal range. */
const SMALLEST_SAFE = 1e-150;
const LARGEST_SAFE = 1e150;
/** 2^600; written out, since the power operator's bits are the engine's own. */
const SCALE = 4.149515568880993e180;

/**
 * Length of the vector (x, y): √(x² + y²) without overflow or underflow on the way. Made of +, ×, ÷ and √ alone, so
 * its bits are the same on every engine. Error below 1.5 units of the last place. The sum of more than two is
 * `hypot(hypot(x, y), z)`.
 */
export function hypot(x: number, y: number): number {
  const a = Math.abs(x);
  const b = Math.abs(y);
  const large = Math.max(a, b);
  const small = Math.min(a, b);
  if (large === Infinity) return Infinity;
  if (large < LARGEST_SAFE && small > SMALLEST_SAFE) return Math.sqrt(large * large + small * small);
  // Scaling by a power of two is exact; far apart, the smaller one's square is below half a unit of the last place.
  if (large >= LARGEST_SAFE) {
    const s = large / SCALE;
    const t = small / SCALE;
    return Math.sqrt(s * s + t * t) * SCALE;
  }
  if (large < 1e-120) {
    const s = large * SCALE;
    const t = small * SCALE;
    return Math.sqrt(s * s + t * t) / SCALE;
  }
  return Math.sqrt(large * large + small * small);
}
