import type { RollUpRecord } from '#core/record/record.ts';
import { isBroken } from '#core/record/waiver-state.ts';

/** What the history shows of a record, and what a trend is drawn from. */
export interface RunColumns {
  readonly assembly: string;
  readonly state: string;
  readonly verdict: 'within' | 'outside' | 'unlimited';
  readonly outside: string[];
  readonly judgedOn: 'basic' | 'predicted';
  readonly mass: number;
  readonly figures: number[];
  readonly nearest: string[] | null;
  readonly fileUnits: { length: string; mass: string; inertia: string };
}

/** A limit that is waived on `today` does not make a run's verdict. */
export function runColumns(record: Omit<RollUpRecord, 'provenance'>, today: string): RunColumns {
  const judgedOn = record.conventions.growth ? 'predicted' : 'basic';
  const { mass, centre, inertia, principal } = record[judgedOn];
  const tensor = inertia?.aboutCentre;
  const outside = record.limits.filter((limit) => isBroken(limit, today)).map((limit) => limit.name);
  const { length, mass: massUnit, inertia: inertiaUnit } = record.conventions.fileUnits;
  return {
    assembly: record.assembly,
    state: record.state,
    verdict: record.limits.length === 0 ? 'unlimited' : outside.length > 0 ? 'outside' : 'within',
    outside,
    judgedOn,
    mass,
    figures:
      centre && tensor && principal
        ? [mass, ...centre, tensor[0][0]!, tensor[1][1]!, tensor[2][2]!, ...principal.moments]
        : [mass],
    nearest: principal?.nearest ?? null,
    fileUnits: { length, mass: massUnit, inertia: inertiaUnit },
  };
}
