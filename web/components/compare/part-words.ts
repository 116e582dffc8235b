import type { Contribution, Difference, PartChange } from '#core/difference/index.ts';
import { type DisplayUnits, formatSignificant } from '#core/figures/index.ts';

/** What happened to a part or a group, in a few words: `added`, `11.3 g heavier, moved 22.0 mm`. */
export function happenedTo(row: Contribution, difference: Difference, units: DisplayUnits): string {
  const parts = difference.parts.filter((p) => row.parts.includes(p.path));
  if (parts.length !== 1) return groupWords(parts);
  return partWords(parts[0]!, units);
}

function groupWords(parts: readonly PartChange[]): string {
  const moved = parts.filter((p) => p.status !== 'unchanged' && p.status !== 'renamed').length;
  return moved === parts.length ? `${parts.length} parts` : `${moved} of ${parts.length} parts`;
}

function partWords({ status, was, a, b, differs }: PartChange, units: DisplayUnits): string {
  const renamed = was === null ? '' : `was ${was}`;
  if (status === 'added' || status === 'removed' || status === 'unchanged') return status;
  if (!a || !b) return renamed;
  const grams = b.mass - a.mass;
  const step = Math.sqrt(a.centre.reduce((sum, x, k) => sum + (b.centre[k]! - x) ** 2, 0));
  const say = (x: number, unit: DisplayUnits['mass']) =>
    `${formatSignificant(x / unit.factor, 3)} ${unit.text}`;
  return [
    renamed,
    differs.mass ? `${say(Math.abs(grams), units.mass)} ${grams > 0 ? 'heavier' : 'lighter'}` : '',
    differs.place ? `centre moved ${say(step, units.length)}` : '',
    differs.shapeAndTurn ? 'shape or turn' : '',
  ]
    .filter(Boolean)
    .join(', ');
}
