import type { Sequelize } from 'sequelize';
import type * as z from 'zod';
import type { listRunsQuerySchema, RunPage, runFilterSchema } from '#core/api/runs.ts';
import { badRequest } from '../problem.ts';
import { findRunRows } from './run-rows.ts';

type ListQuery = z.output<typeof listRunsQuerySchema>;
type Filter = z.output<typeof runFilterSchema>;

/** By which column a sort goes, which way, and how its values stand in a cursor. */
const SORTS = {
  newest: { column: 'at', descending: true, cast: 'timestamptz' },
  oldest: { column: 'at', descending: false, cast: 'timestamptz' },
  heaviest: { column: 'mass', descending: true, cast: 'float8' },
  lightest: { column: 'mass', descending: false, cast: 'float8' },
} as const;

/** Conditions of a filter, and what is bound in them. */
export function conditionsOf(filter: Filter, projectId: number): { where: string[]; bind: unknown[] } {
  const where = ['project_id = $1'];
  const bind: unknown[] = [projectId];
  for (const key of ['assembly', 'state', 'branch', 'verdict'] as const) {
    if (filter[key] === undefined) continue;
    bind.push(filter[key]);
    where.push(`${key} = $${bind.length}`);
  }
  if (filter.since !== undefined) {
    bind.push(`${filter.since}T00:00:00Z`);
    where.push(`at >= $${bind.length}::timestamptz`);
  }
  return { where, bind };
}

/** One page of a project's history: keyset-paged, so that the last page of a million runs costs what the first does. */
export async function listRuns(sequelize: Sequelize, projectId: number, query: ListQuery): Promise<RunPage> {
  const { column, descending, cast } = SORTS[query.sort];
  const { where, bind } = conditionsOf(query, projectId);
  if (query.cursor !== undefined) {
    const [value, id] = readCursor(query.cursor, query.sort);
    bind.push(value, id);
    where.push(
      `(${column}, id) ${descending ? '<' : '>'} ($${bind.length - 1}::${cast}, $${bind.length}::bigint)`,
    );
  }
  const way = descending ? 'DESC' : 'ASC';
  const picked = `SELECT * FROM runs WHERE ${where.join(' AND ')} ORDER BY ${column} ${way}, id ${way} LIMIT ${query.limit + 1}`;
  const found = await findRunRows(sequelize, picked, `r.${column} ${way}, r.id ${way}`, bind);
  const rows = found.slice(0, query.limit);
  const last = rows.at(-1);
  const next = found.length > query.limit && last ? cursorOf(query.sort, last) : null;
  return { rows, next };
}

const cursorOf = (sort: ListQuery['sort'], row: { at: string; mass: number; id: string }): string =>
  Buffer.from(JSON.stringify([sort, SORTS[sort].column === 'at' ? row.at : row.mass, row.id])).toString(
    'base64url',
  );

function readCursor(cursor: string, sort: ListQuery['sort']): [string | number, string] {
  try {
    const [of, value, id] = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    const isValue = SORTS[sort].column === 'at' ? !Number.isNaN(Date.parse(value)) : Number.isFinite(value);
    if (of === sort && isValue && /^\d{1,18}$/.test(id)) return [value, id];
  } catch {
    // Falls through to the one answer for every wrong cursor.
  }
  throw badRequest(
    'CURSOR',
    "expected the last answer's `next` with the same sort, found another",
    'begin from the start',
  );
}
