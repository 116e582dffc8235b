import { InputError } from '../errors.ts';
import { findPart } from '../model/part-paths.ts';
import { targetAt } from '../rollup/limits.ts';
import type { RollUp } from '../rollup/roll-up.ts';
import { totalsOf } from './build-record.ts';
import type { Conventions, RollUpRecord, Totals } from './record.ts';

/** One part's, group's or set of copies' own ten numbers, in body axes; what `run --of PATH --format json` prints. */
export interface PartSelection {
  schema: 'steelyard-part/1';
  /** Of the record they are taken from. */
  stamp: string;
  assembly: string;
  state: string;
  path: string;
  conventions: Conventions;
  basic: Totals;
  predicted: Totals;
}

/**
 * Picks a part or group out of a roll-up.
 *
 * @throws InputError MODEL_UNKNOWN_PART, PART_WITHOUT_MASS
 */
export function selectPart(roll: RollUp, record: RollUpRecord, path: string): PartSelection {
  const target = targetAt(path, roll);
  if (!target) throw new InputError([unknownPart(roll, path)]);
  const { basic, predicted } = target.bodies;
  if (!basic || !predicted)
    throw new InputError([
      {
        code: 'PART_WITHOUT_MASS',
        message: `expected a part with mass, found that '${path}' weighs nothing in state '${roll.state}'`,
        hint: 'there is no centre or tensor without mass',
      },
    ]);
  return {
    schema: 'steelyard-part/1',
    stamp: record.stamp,
    assembly: record.assembly,
    state: record.state,
    path,
    conventions: record.conventions,
    basic: totalsOf(basic),
    predicted: totalsOf(predicted),
  };
}

function unknownPart(roll: RollUp, path: string) {
  const found = findPart(roll.project.root.parts, path);
  if ('part' in found)
    return {
      code: 'MODEL_UNKNOWN_PART',
      message: `expected a part of state '${roll.state}', found '${path}', which this state leaves out or has no copy of`,
      hint: 'choose another state with --state, or another copy',
    };
  return {
    code: 'MODEL_UNKNOWN_PART',
    message: `expected the path of a part, found '${path}', in which '${found.unknown}' is not one`,
    hint: found.nearest
      ? `did you mean '${found.nearest}'?`
      : 'paths join names with /, such as boom/access hole',
  };
}
