import { sum } from './sum.ts';
import type { Difference, PartChange, PartStatus, Split } from './types.ts';

/** One row of "who moved it": a part or a group, its three causes and their sum, in the quantity's unit. */
export interface Contribution extends Split {
  path: string;
  total: number;
  /** The parts that are summed here. */
  parts: string[];
  /** The part's, or that of all in the group where they agree; else `changed`. */
  status: PartStatus;
}

const NONE: Split = { mass: 0, place: 0, shapeAndTurn: 0 };

/**
 * Every part's contribution to the change of one quantity, largest first; of equals, as in the list of parts.
 *
 * @param quantity `mass`, `centre.x`, `inertia.xy`, `principal.x` …
 * @param options `onlyChanged` leaves out parts that did not change or were only renamed
 */
export function contributionsTo(
  difference: Difference,
  quantity: string,
  options: { onlyChanged?: boolean } = {},
): Contribution[] {
  return bySize(
    difference.parts
      .filter((part) => !options.onlyChanged || !(part.status === 'unchanged' || part.status === 'renamed'))
      .map((part) => oneRow(part, quantity)),
  );
}

/**
 * The same, summed over the parts under each top-level path: `boom` and `boom/access hole` are one row, and so are the
 * copies `servo[1]` and `servo[2]`.
 *
 * @param options `depth` how many levels of the path make a group (1); `onlyChanged` leaves out groups in which
 *   nothing changed
 */
export function groupedContributionsTo(
  difference: Difference,
  quantity: string,
  options: { depth?: number; onlyChanged?: boolean } = {},
): Contribution[] {
  const groups = new Map<string, Contribution[]>();
  for (const row of contributionsTo(difference, quantity)) {
    const key = groupOf(row.path, options.depth ?? 1);
    const members = groups.get(key);
    if (members) members.push(row);
    else groups.set(key, [row]);
  }
  const rows = [...groups].map(([path, members]): Contribution => {
    const add = (cause: keyof Split) => sum(members.map((row) => row[cause])) + 0;
    const split = { mass: add('mass'), place: add('place'), shapeAndTurn: add('shapeAndTurn') };
    const [first] = members;
    const status = members.every((row) => row.status === first!.status) ? first!.status : 'changed';
    return { path, ...split, total: totalOf(split), parts: members.flatMap((row) => row.parts), status };
  });
  const changed = (row: Contribution) => row.status !== 'unchanged' && row.status !== 'renamed';
  return bySize(options.onlyChanged ? rows.filter(changed) : rows);
}

/** The first levels of a path, copies of one part taken together. */
export const groupOf = (path: string, depth: number): string => {
  const levels = path.split('/').slice(0, depth);
  return levels.map((level) => level.replace(/\[\d+\]$/, '')).join('/');
};

function oneRow(part: PartChange, quantity: string): Contribution {
  const split = part.contributions[quantity] ?? NONE;
  return { path: part.path, ...split, total: totalOf(split), parts: [part.path], status: part.status };
}

const totalOf = ({ mass, place, shapeAndTurn }: Split): number => mass + place + shapeAndTurn + 0;

const bySize = (rows: Contribution[]): Contribution[] =>
  rows.sort((p, q) => Math.abs(q.total) - Math.abs(p.total));
