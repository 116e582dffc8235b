import { QueryTypes, type Transaction } from 'sequelize';
import type { Pushed } from '#core/api/push.ts';
import type { Fault } from '#core/errors.ts';
import { displayUnits, printLimit, unitOfLimit } from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { stampOf } from '#core/record/stamp.ts';
import { inTransaction } from '../database.ts';
import type { Deps } from '../deps.ts';
import type { Access, Caller } from '../middleware/caller.ts';
import { tellOfLimits } from './limit-mail.ts';
import { contentOf, packContent } from './record-content.ts';
import { runColumns } from './run-columns.ts';
import { sha256 } from './secrets.ts';

export interface PushedRun {
  readonly record: RollUpRecord;
  readonly key: string;
  /** Already drawn and computed here, from an upload. */
  readonly drawing?: string;
  /** When it came, for a history that is made up. */
  readonly at?: Date;
}

type Answer = Pushed['runs'][number];

/**
 * Takes records in: each stamp's content once, each record from one origin as one run. What is new is in the history
 * when this returns, and is computed again soon; all of a request or nothing of it.
 */
export async function pushRuns(
  runs: readonly PushedRun[],
  caller: Caller,
  access: Access,
  deps: Deps,
): Promise<Answer[]> {
  const stampAt = (i: number): string => runs[i]!.record.stamp;
  const checked = runs.map((run) => ({ run, fault: faultOf(run.record) }));
  const made: string[] = [];
  const answers = await inTransaction(deps.sequelize, async (transaction) => {
    const all = checked.map(({ fault }): Answer | null => (fault ? refused(fault) : null));
    // In the order of stamps: two requests that bring the same records wait for one another, never in a circle.
    const order = checked.map((_, i) => i).sort((a, b) => (stampAt(a) < stampAt(b) ? -1 : 1));
    for (const i of order) all[i] ??= await pushRun(checked[i]!.run, caller, access, deps, made, transaction);
    return all.map((answer) => answer!);
  });
  for (const record of made) deps.recomputeSoon.add(record);
  return answers;
}

const refused = (fault: Fault): Answer => ({ status: 'refused', id: null, address: null, fault });

/** What makes a record unfit to be kept; null where nothing does. */
function faultOf(record: RollUpRecord): Fault | null {
  const [top] = record.inputs;
  if (!top)
    return {
      code: 'RECORD_WITHOUT_INPUT',
      message: 'expected the assembly file first among inputs, found none',
    };
  return stampFault(record, top.path) ?? textFault(record);
}

/** A stamp must be the hash of what the record says of itself. */
function stampFault(record: RollUpRecord, top: string): Fault | null {
  const { inputs, state, parameters, conventions } = record;
  const stamp = stampOf(inputs, top, state, parameters, conventions.coreVersion, sha256);
  if (stamp === record.stamp) return null;
  return {
    code: 'RECORD_STAMP',
    message: `expected the stamp ${stamp.slice(0, 12)} of these inputs, state and values, found ${record.stamp.slice(0, 12)}`,
    hint: 'send the record as `steelyard run` printed it',
  };
}

const NAME_BYTES_AT_MOST = 500;

/** Texts that the database cannot hold, and units that no page could show. */
function textFault(record: RollUpRecord): Fault | null {
  const hint = 'send the record as `steelyard run` printed it';
  const names = [record.assembly, record.state, record.provenance.branch ?? ''];
  if (names.some((name) => Buffer.byteLength(name) > NAME_BYTES_AT_MOST))
    return {
      code: 'RECORD_NAME_TOO_LONG',
      message: `expected names of assembly, state and branch of at most ${NAME_BYTES_AT_MOST} bytes`,
      hint: 'shorten the name',
    };
  if (JSON.stringify(record).includes('\\u0000'))
    return {
      code: 'RECORD_NUL',
      message: 'expected text without the character U+0000, found one with it',
      hint,
    };
  try {
    const units = displayUnits(record);
    for (const limit of record.limits) printLimit(limit, unitOfLimit(limit, units));
    return null;
  } catch (error) {
    return {
      code: 'RECORD_UNITS',
      message: `expected units that can be shown: ${(error as Error).message}`,
      hint,
    };
  }
}

/** @param made gets the record's id where it waits to be computed again */
async function pushRun(
  pushed: PushedRun,
  caller: Caller,
  { project }: Access,
  deps: Deps,
  made: string[],
  transaction: Transaction,
): Promise<Answer> {
  const { record } = pushed;
  const found = await insertRun(pushed, caller, project.id, deps, transaction);
  if (!found)
    return refused({
      code: 'RECORD_CONTRADICTS',
      message: `expected the figures that the server computes under stamp ${record.stamp.slice(0, 12)}, found others`,
      hint: 'one stamp is one record: compute it again with an unchanged steelyard and push that',
    });
  if (found.waits) made.push(found.record_id);
  const known = found.run_id ? null : await knownRun(found.record_id, pushed, project, deps, transaction);
  const id = found.run_id ?? known!.id;
  if (found.run_id || known?.moved) await tellOfLimits(id, record, project, deps, transaction);
  return {
    status: found.run_id ? 'created' : 'known',
    id,
    address: `${deps.config.PUBLIC_URL}/projects/${project.slug}/runs/${id}`,
    fault: null,
  };
}

/** A tree with changes is no commit, though it stands on one: what is pushed when they are committed is another run. */
const originOf = ({ record, key }: PushedRun): string =>
  record.provenance.commit
    ? `commit:${record.provenance.commit}${record.provenance.dirty ? ':dirty' : ''}`
    : `push:${key}`;

interface Inserted {
  readonly record_id: string;
  /** Waits to be computed again: it is new, or could not be before and may be now that its inputs came. */
  readonly waits: boolean;
  /** Null where the run was there already. */
  readonly run_id: string | null;
}

/**
 * One statement: what is there already is found, not written again, however many send it at once.
 *
 * @returns null where the server has computed other figures under this stamp
 */
async function insertRun(
  pushed: PushedRun,
  { person, token }: Caller,
  projectId: number,
  { sequelize }: Deps,
  transaction: Transaction,
): Promise<Inserted | null> {
  const { record, drawing, at } = pushed;
  const { provenance } = record;
  const { content, contentSha256 } = packContent(contentOf(record));
  const columns = runColumns(record, new Date().toISOString().slice(0, 10));
  const bind = [
    projectId,
    record.stamp,
    contentSha256,
    content,
    drawing ?? null,
    originOf(pushed),
    columns.assembly,
    columns.state,
    provenance.branch ?? '',
    columns.verdict,
    at ?? null,
    provenance.commit ?? null,
    provenance.tag ?? null,
    provenance.dirty ?? false,
    provenance.author ?? null,
    person.id,
    token?.id ?? null,
    columns.judgedOn,
    columns.mass,
    columns.figures,
    columns.nearest,
    columns.outside,
    JSON.stringify(columns.fileUnits),
    JSON.stringify(provenance),
  ];
  const [found] = await sequelize.query<Inserted>(INSERT_RUN, { bind, type: QueryTypes.SELECT, transaction });
  return found ?? null;
}

const INSERT_RUN = `
  WITH record AS (
    INSERT INTO records (project_id, stamp, content_sha256, content, drawing, recomputation, recomputed_at)
    SELECT $1::int, $2, $3, $4::bytea, $5::text, CASE WHEN $5::text IS NULL THEN 'waiting' ELSE 'recomputed' END,
      CASE WHEN $5::text IS NULL THEN NULL ELSE now() END
    WHERE NOT EXISTS (
      SELECT 1 FROM records o
      WHERE o.project_id = $1 AND o.stamp = $2 AND o.content_sha256 <> $3 AND o.recomputation = 'recomputed')
    ON CONFLICT (project_id, stamp, content_sha256) DO UPDATE SET recomputation =
      CASE WHEN records.recomputation = 'not recomputable' THEN 'waiting' ELSE records.recomputation END
    RETURNING id, recomputation = 'waiting' AS waits
  ), run AS (
    INSERT INTO runs (project_id, record_id, origin, assembly, state, branch, verdict, at, commit, tag, dirty, author,
      person_id, token_id, judged_on, mass, figures, nearest, outside, file_units, provenance)
    SELECT $1, id, $6, $7, $8, $9, $10, coalesce($11::timestamptz, clock_timestamp()), $12, $13, $14::boolean, $15,
      $16::int, $17::int, $18, $19::float8, $20::float8[], $21::text[], $22::text[], $23::jsonb, $24::jsonb
    FROM record
    ON CONFLICT (record_id, origin) DO NOTHING RETURNING id
  ), seen AS (
    INSERT INTO choices (project_id, kind, value)
    SELECT $1, kind, value FROM run, (VALUES ('assembly', $7), ('state', $8), ('branch', $9)) AS c (kind, value)
    WHERE value <> '' AND NOT EXISTS (
      SELECT 1 FROM choices o WHERE o.project_id = $1 AND o.kind = c.kind AND o.value = c.value)
    ON CONFLICT DO NOTHING
  )
  SELECT record.id AS record_id, record.waits, run.id AS run_id
  FROM record LEFT JOIN run ON true`;

/**
 * The run that was there. One that came from a branch of its own and is now on a watched one belongs to the watched one:
 * a branch that was merged as it was.
 */
async function knownRun(
  recordId: string,
  pushed: PushedRun,
  { watchedBranches }: Access['project'],
  { sequelize }: Deps,
  transaction: Transaction,
): Promise<{ id: string; moved: boolean }> {
  const [known] = await sequelize.query<{ id: string; branch: string }>(
    'SELECT id, branch FROM runs WHERE record_id = $1 AND origin = $2',
    { bind: [recordId, originOf(pushed)], type: QueryTypes.SELECT, transaction },
  );
  const { id, branch } = known!;
  const { provenance } = pushed.record;
  const moved = watchedBranches.includes(provenance.branch ?? '') && !watchedBranches.includes(branch);
  if (moved)
    await sequelize.query(
      `WITH seen AS (
         INSERT INTO choices (project_id, kind, value) SELECT project_id, 'branch', $2 FROM runs WHERE id = $1
         ON CONFLICT DO NOTHING)
       UPDATE runs SET branch = $2, provenance = $3::jsonb WHERE id = $1`,
      { bind: [id, provenance.branch, JSON.stringify(provenance)], transaction },
    );
  return { id, moved };
}
