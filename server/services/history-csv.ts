import type { RunRow } from '#core/api/runs.ts';
import { csvCell } from '#core/record/csv-cell.ts';

const HEAD = [
  'run',
  'assembly',
  'state',
  'branch',
  'commit',
  'stamp',
  'on',
  'units',
  'axes',
  'mass_kg',
  'centre_x_m',
  'centre_y_m',
  'centre_z_m',
  'principal_1_kg_m2',
  'principal_2_kg_m2',
  'principal_3_kg_m2',
  'principal_about',
  'nearest',
  'verdict',
  'outside',
  'recomputation',
  'release',
  'pushed_by',
  'at',
];

const NONE = [null, null, null];

/** A page of the history as CSV: SI units, the conventions in every row, where no tool can lose them. */
export const historyCsv = (rows: readonly RunRow[]): string =>
  [HEAD, ...rows.map(cellsOf)].map((cells) => `${cells.map(csvCell).join(',')}\n`).join('');

const cellsOf = (r: RunRow) => [
  r.id,
  r.assembly,
  r.state,
  r.branch,
  r.commit,
  r.stamp,
  r.on,
  'SI',
  'body',
  r.mass,
  ...(r.centre ?? NONE),
  ...(r.moments ?? NONE),
  'centre',
  r.nearest?.join(' ') ?? null,
  r.verdict,
  r.outside.join('; '),
  r.recomputation.status,
  r.release,
  r.pushedBy,
  r.at,
];
