import type { RollUpRecord } from '#core/record/record.ts';
import type { RollUp } from '#core/rollup/roll-up.ts';
export function drawRoll(_roll: RollUp, _record: RollUpRecord): string {
  return '';
}
