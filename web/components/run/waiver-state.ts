import type { LimitResult } from '#core/record/record.ts';

/**
 * A waiver counts to the end of its day, and only where its limit is broken.
 *
 * @param today YYYY-MM-DD
 */
export function waiverState(
  { verdict, waiver }: Pick<LimitResult, 'verdict' | 'waiver'>,
  today: string,
): 'none' | 'in effect' | 'expired' {
  if (verdict !== 'outside' || waiver === null) return 'none';
  return today <= waiver.until ? 'in effect' : 'expired';
}

export const todayText = (): string => new Date().toISOString().slice(0, 10);
