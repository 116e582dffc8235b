import type { LimitResult } from './record.ts';

/** A waiver counts to the end of its day, and only where its limit is broken. */
export function waiverState(
  limit: Pick<LimitResult, 'verdict' | 'waiver'>,
  today: string,
): 'none' | 'in effect' | 'expired' {
  if (limit.verdict !== 'outside' || limit.waiver === null) return 'none';
  return today <= limit.waiver.until ? 'in effect' : 'expired';
}

/** Outside and not waived today: what makes `check` exit with 1. */
export const isBroken = (limit: Pick<LimitResult, 'verdict' | 'waiver'>, today: string): boolean =>
  limit.verdict === 'outside' && waiverState(limit, today) !== 'in effect';
