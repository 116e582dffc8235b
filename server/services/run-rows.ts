import { QueryTypes, type Sequelize } from 'sequelize';
import type { RunRow } from '#core/api/runs.ts';

/** A run as the list of columns that its row is presented from. */
interface Found {
  id: string;
  stamp: string;
  assembly: string;
  state: string;
  commit: string | null;
  branch: string;
  tag: string | null;
  dirty: boolean;
  author: string | null;
  pushed_by: string;
  at: Date;
  computed_at: string;
  judged_on: 'basic' | 'predicted';
  mass: number;
  figures: number[];
  nearest: string[] | null;
  file_units: RunRow['fileUnits'];
  verdict: RunRow['verdict'];
  outside: string[];
  recomputation: RunRow['recomputation']['status'];
  recomputation_detail: string | null;
  release: RunRow['release'];
}

const COLUMNS = `
  r.id, c.stamp, r.assembly, r.state, r.commit, r.branch, r.tag, r.dirty, r.author,
  CASE WHEN t.kind = 'machine' THEN t.label ELSE p.name END AS pushed_by,
  r.at, r.provenance->>'at' AS computed_at, r.judged_on, r.mass, r.figures, r.nearest, r.file_units, r.verdict,
  r.outside, c.recomputation, c.recomputation_detail, r.release`;

const JOINS = `
  JOIN records c ON c.id = r.record_id
  JOIN people p ON p.id = r.person_id
  LEFT JOIN tokens t ON t.id = r.token_id`;

/**
 * Rows of runs.
 *
 * @param picked SQL that gives `runs` rows in order, bounded; only then are other tables joined to them
 * @param order of the answer, on `r`
 */
export async function findRunRows(
  sequelize: Sequelize,
  picked: string,
  order: string,
  bind: readonly unknown[],
): Promise<RunRow[]> {
  const found = await sequelize.query<Found>(
    `SELECT ${COLUMNS} FROM (${picked}) r ${JOINS} ORDER BY ${order}`,
    { bind: [...bind], type: QueryTypes.SELECT },
  );
  return found.map(present);
}

/** One run of a project; null where there is none. */
export async function findRunRow(
  sequelize: Sequelize,
  projectId: number,
  id: string,
): Promise<RunRow | null> {
  const picked = 'SELECT * FROM runs WHERE project_id = $1 AND id = $2';
  const [row] = await findRunRows(sequelize, picked, 'r.id', [projectId, id]);
  return row ?? null;
}

const present = (row: Found): RunRow => ({
  id: String(row.id),
  stamp: row.stamp,
  assembly: row.assembly,
  state: row.state,
  commit: row.commit,
  branch: row.branch || null,
  tag: row.tag,
  dirty: row.dirty,
  author: row.author,
  pushedBy: row.pushed_by,
  at: row.at.toISOString(),
  computedAt: row.computed_at,
  on: row.judged_on,
  mass: row.mass,
  centre: row.figures.length > 1 ? row.figures.slice(1, 4) : null,
  moments: row.figures.length > 1 ? row.figures.slice(7, 10) : null,
  nearest: row.nearest,
  fileUnits: row.file_units,
  verdict: row.verdict,
  outside: row.outside,
  recomputation: { status: row.recomputation, detail: row.recomputation_detail },
  release: row.release,
});
