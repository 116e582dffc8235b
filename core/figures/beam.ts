/** The picture of one limit, as places on a line in the units of the value; every face draws it from this. */
export interface Beam {
  /** Ends of the arm: the stops, or the one stop and where the arm is drawn back to. */
  readonly low: number;
  readonly high: number;
  readonly lowStop: boolean;
  readonly highStop: boolean;
  readonly fulcrum: number;
  readonly poise: number | null;
  /** To which side the poise is off the allowed span and the beam tips. */
  readonly tips: 'low' | 'high' | null;
}

/**
 * Two-sided, the fulcrum is at the middle of the span. One-sided, the arm is drawn back from its stop by twice the
 * distance to the value or a quarter of the limit, whichever is more, and the fulcrum is at the baseline's value
 * where there is one on the arm, else at the middle.
 */
export function beamOf(limit: {
  value: number | null;
  min: number | null;
  max: number | null;
  baseline?: number | null;
}): Beam {
  const { value, min, max } = limit;
  const lowStop = min !== null;
  const highStop = max !== null;
  const stop = max ?? min ?? 0;
  const reach = Math.max(value === null ? 0 : 2 * Math.abs(stop - value), Math.abs(stop) / 4) || 1;
  const low = min ?? stop - reach;
  const high = max ?? stop + reach;
  const middle = low + (high - low) / 2;
  const baseline = limit.baseline ?? null;
  const onArm = baseline !== null && baseline >= low && baseline <= high;
  const fulcrum = (lowStop && highStop) || !onArm ? middle : baseline;
  const tips =
    value === null ? null : lowStop && value < low ? 'low' : highStop && value > high ? 'high' : null;
  return { low, high, lowStop, highStop, fulcrum, poise: value, tips };
}
