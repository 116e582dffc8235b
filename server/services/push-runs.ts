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
  const checked = runs.map((run) => ({ run, fault: faultOf(run.record) }));
  const made: string[] = [];
  const answers = await inTransaction(deps.sequelize, async (transaction) => {
    const all: Answer[] = [];
    for (const { run, fault } of checked)
      all.push(fault ? refused(fault) : await pushRun(run, caller, access, deps, made, transaction));
    return all;
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

/** @param made gets the record's id where its content is new and not yet computed here */
async function pushRun(
  pushed: PushedRun,
  caller: Caller,
  { project }: Access,
  deps: Deps,
  made: string[],
  transaction: Transaction,
): Promise<Answer> {
  const { record, drawing } = pushed;
  const found = await insertRun(pushed, caller, project.id, deps, transaction);
  if (found.contradicts)
    return refused({
      code: 'RECORD_CONTRADICTS',
      message: `expected the record that the server has under stamp ${record.stamp.slice(0, 12)}, found other figures`,
      hint: 'one stamp is one record: compute it again with an unchanged steelyard and push that',
    });
  if (found.new_record && drawing === undefined) made.push(found.record_id);
  if (found.run_id) await tellOfLimits(found.run_id, record, project, deps, transaction);
  const id = found.run_id ?? (await knownRun(found.record_id, originOf(pushed), deps, transaction));
  return {
    status: found.run_id ? 'created' : 'known',
    id,
    address: `${deps.config.PUBLIC_URL}/projects/${project.slug}/runs/${id}`,
    fault: null,
  };
}

const originOf = ({ record, key }: PushedRun): string =>
  record.provenance.commit ? `commit:${record.provenance.commit}` : `push:${key}`;

interface Inserted {
  readonly record_id: string;
  readonly new_record: boolean;
  readonly contradicts: boolean;
  /** Null where the run was there already, or the record contradicts. */
  readonly run_id: string | null;
}

/** One statement: what is there already is found, not written again, however many send it at once. */
async function insertRun(
  pushed: PushedRun,
  { person, token }: Caller,
  projectId: number,
  { sequelize }: Deps,
  transaction: Transaction,
): Promise<Inserted> {
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
  return found!;
}

const INSERT_RUN = `
  WITH record AS (
    INSERT INTO records (project_id, stamp, content_sha256, content, drawing, recomputation, recomputed_at)
    VALUES ($1, $2, $3, $4, $5::text, CASE WHEN $5::text IS NULL THEN 'waiting' ELSE 'recomputed' END,
      CASE WHEN $5::text IS NULL THEN NULL ELSE now() END)
    ON CONFLICT (project_id, stamp) DO UPDATE SET stamp = EXCLUDED.stamp
    RETURNING id, (xmax = 0) AS new, content_sha256 <> $3 AS contradicts
  ), run AS (
    INSERT INTO runs (project_id, record_id, origin, assembly, state, branch, verdict, at, commit, tag, dirty, author,
      person_id, token_id, judged_on, mass, figures, nearest, outside, file_units, provenance)
    SELECT $1, id, $6, $7, $8, $9, $10, coalesce($11::timestamptz, clock_timestamp()), $12, $13, $14::boolean, $15,
      $16::int, $17::int, $18, $19::float8, $20::float8[], $21::text[], $22::text[], $23::jsonb, $24::jsonb
    FROM record WHERE NOT contradicts
    ON CONFLICT (record_id, origin) DO NOTHING RETURNING id
  ), seen AS (
    INSERT INTO choices (project_id, kind, value)
    SELECT $1, kind, value FROM run, (VALUES ('assembly', $7), ('state', $8), ('branch', $9)) AS c (kind, value)
    WHERE value <> '' AND NOT EXISTS (
      SELECT 1 FROM choices o WHERE o.project_id = $1 AND o.kind = c.kind AND o.value = c.value)
    ON CONFLICT DO NOTHING
  )
  SELECT record.id AS record_id, record.new AS new_record, record.contradicts, run.id AS run_id
  FROM record LEFT JOIN run ON true`;

async function knownRun(
  recordId: string,
  origin: string,
  { sequelize }: Deps,
  transaction: Transaction,
): Promise<string> {
  const [known] = await sequelize.query<{ id: string }>(
    'SELECT id FROM runs WHERE record_id = $1 AND origin = $2',
    { bind: [recordId, origin], type: QueryTypes.SELECT, transaction },
  );
  return known!.id;
}
