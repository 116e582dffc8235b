import { InputError } from '#core/errors.ts';
import { displayUnits } from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import type { About } from '../output/run-report.ts';

/** `--about` as it was asked for: a point still in the unit of each file, and as it was written. */
export type AskedAbout = 'both' | 'centre' | 'origin' | readonly [string, string, string];

/** A point farther off than this says nothing of a machine, and its square is more than a double carries. */
const FARTHEST = 1e30;

/** @throws InputError CALL_ABOUT */
export function aboutOf(text: string): AskedAbout {
  if (text === 'both' || text === 'centre' || text === 'origin') return text;
  const items = text.split(',').map((item) => item.trim());
  const [x, y, z] = items;
  const isNumber = (item: string) => item !== '' && Math.abs(Number(item)) <= FARTHEST;
  if (items.length === 3 && items.every(isNumber)) return [x!, y!, z!];
  throw new InputError([
    {
      code: 'CALL_ABOUT',
      message: `expected centre, origin or a point x,y,z, found '${text}'`,
      hint: "a point is in the file's unit of length, for instance --about 120,0,-30",
    },
  ]);
}

/** The point in body axes, in the unit of length of the record's file. */
export function aboutIn(asked: AskedAbout, record: RollUpRecord): About {
  if (typeof asked === 'string') return asked;
  const unit = displayUnits(record).length;
  const [x, y, z] = asked.map((item) => Number(item) * unit.factor) as [number, number, number];
  return { name: `[${asked.join(', ')}] ${unit.text}`, point: [x, y, z] };
}
