import { QueryTypes, type Transaction } from 'sequelize';
import type { Pushed } from '#core/api/push.ts';
import type { Fault } from '#core/errors.ts';
import { displayUnits, printLimit, unitOfLimit } from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { stampOf } from '#core/record/stamp.ts';
import { inTransaction } from '../database.ts';
import type { Deps } from '../deps.ts';
import { RECOMPUTE_QUEUE, sendJob } from '../jobs/queues.ts';
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
 * when this returns, with a job that computes it again; all of a request or nothing of it.
 */
export async function pushRuns(
  runs: readonly PushedRun[],
  caller: Caller,
  access: Access,
  deps: Deps,
): Promise<Answer[]> {
  const checked = runs.map((run) => ({ run, fault: faultOf(run.record) }));
  return inTransaction(deps.sequelize, async (transaction) => {
    const answers: Answer[] = [];
    for (const { run, fault } of checked)
      answers.push(fault ? refused(fault) : await pushRun(run, caller, access, deps, transaction));
    return answers;
  });
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

async function pushRun(
  { record, key, drawing, at }: PushedRun,
  caller: Caller,
  { project }: Access,
  deps: Deps,
  transaction: Transaction,
): Promise<Answer> {
  const { sequelize } = deps;
  const { content, contentSha256 } = packContent(contentOf(record));
  // One statement: what is there already is found, not written again, however many send it at once.
  const [stored] = await sequelize.query<{ id: string; content_sha256: string; made: boolean }>(
    `INSERT INTO records (project_id, stamp, content_sha256, content, drawing, recomputation, recomputed_at)
     VALUES ($1, $2, $3, $4, $5, $6, $7)
     ON CONFLICT (project_id, stamp) DO UPDATE SET stamp = EXCLUDED.stamp
     RETURNING id, content_sha256, (xmax = 0) AS made`,
    {
      bind: [
        project.id,
        record.stamp,
        contentSha256,
        content,
        drawing ?? null,
        drawing ? 'recomputed' : 'waiting',
        drawing ? new Date() : null,
      ],
      type: QueryTypes.SELECT,
      transaction,
    },
  );
  if (stored!.content_sha256 !== contentSha256)
    return refused({
      code: 'RECORD_CONTRADICTS',
      message: `expected the record that the server has under stamp ${record.stamp.slice(0, 12)}, found other figures`,
      hint: 'one stamp is one record: compute it again with an unchanged steelyard and push that',
    });
  const run = await insertRun(stored!.id, record, key, at, caller, project.id, deps, transaction);
  if (stored!.made && !drawing)
    await sendJob(deps.boss, RECOMPUTE_QUEUE, { record: stored!.id }, transaction);
  if (run.made) await tellOfLimits(run.id, record, project, deps, transaction);
  return {
    status: run.made ? 'created' : 'known',
    id: run.id,
    address: `${deps.config.PUBLIC_URL}/projects/${project.slug}/runs/${run.id}`,
    fault: null,
  };
}

async function insertRun(
  recordId: string,
  record: RollUpRecord,
  key: string,
  at: Date | undefined,
  { person, token }: Caller,
  projectId: number,
  { sequelize }: Deps,
  transaction: Transaction,
): Promise<{ id: string; made: boolean }> {
  const { provenance } = record;
  const columns = runColumns(record, new Date().toISOString().slice(0, 10));
  const bind = [
    projectId,
    recordId,
    provenance.commit ? `commit:${provenance.commit}` : `push:${key}`,
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
  const [made] = await sequelize.query<{ id: string }>(
    `WITH run AS (
       INSERT INTO runs (project_id, record_id, origin, assembly, state, branch, verdict, at, commit, tag, dirty, author,
         person_id, token_id, judged_on, mass, figures, nearest, outside, file_units, provenance)
       VALUES ($1, $2, $3, $4, $5, $6, $7, coalesce($8::timestamptz, clock_timestamp()), $9, $10, $11, $12, $13, $14,
         $15, $16, $17, $18, $19, $20::jsonb, $21::jsonb)
       ON CONFLICT (record_id, origin) DO NOTHING RETURNING id
     ), seen AS (
       INSERT INTO choices (project_id, kind, value)
       SELECT $1, kind, value FROM (VALUES ('assembly', $4), ('state', $5), ('branch', $6)) AS c (kind, value)
       WHERE value <> '' AND NOT EXISTS (
         SELECT 1 FROM choices o WHERE o.project_id = $1 AND o.kind = c.kind AND o.value = c.value)
       ON CONFLICT DO NOTHING
     )
     SELECT id FROM run`,
    { bind, type: QueryTypes.SELECT, transaction },
  );
  if (made) return { id: made.id, made: true };
  const [known] = await sequelize.query<{ id: string }>(
    'SELECT id FROM runs WHERE record_id = $1 AND origin = $2',
    {
      bind: [recordId, bind[2]],
      type: QueryTypes.SELECT,
      transaction,
    },
  );
  return { id: known!.id, made: false };
}
