import { QueryTypes, type Sequelize } from 'sequelize';
import type { Comment as CommentAnswer, RunDetail, RunRow } from '#core/api/runs.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { isBroken } from '#core/record/waiver-state.ts';
import { type Access, type Caller, hasRole } from '../middleware/caller.ts';
import { Comment, Release, Run, StoredRecord, Token } from '../models/index.ts';
import { notFound } from '../problem.ts';
import { recordOf, unpackContent } from './record-content.ts';
import { presentRelease, reasonsAgainst } from './releases.ts';
import { findRunRow, findRunRows } from './run-rows.ts';

/** A run with its record, of a project. */
export interface WholeRun {
  readonly run: Run;
  readonly stored: StoredRecord;
  /** Inputs without their texts. */
  readonly record: RollUpRecord;
  /** By a machine's token, whoever made it. */
  readonly byMachine: boolean;
}

/** @throws ProblemError 404 */
export async function findRun(projectId: number, id: string): Promise<WholeRun> {
  const run = await Run.findOne({ where: { id, projectId } });
  const stored = run && (await StoredRecord.findByPk(run.recordId));
  if (!run || !stored) throw notFound(`the run ${id}`);
  const token = run.tokenId === null ? null : await Token.findByPk(run.tokenId);
  const record = recordOf(unpackContent(stored.content), run.provenance);
  return { run, stored, record, byMachine: token?.kind === 'machine' };
}

/** The latest released run of the same assembly and state that came before; null where there is none. */
export async function findBaseline(sequelize: Sequelize, run: Run): Promise<RunRow | null> {
  const picked = `SELECT * FROM runs WHERE project_id = $1 AND assembly = $2 AND state = $3 AND release = 'released'
    AND (at, id) < ($4, $5) ORDER BY at DESC, id DESC LIMIT 1`;
  const bind = [run.projectId, run.assembly, run.state, run.at, run.id];
  const [row] = await findRunRows(sequelize, picked, 'r.at DESC', bind);
  return row ?? null;
}

export async function describeRun(
  sequelize: Sequelize,
  whole: WholeRun,
  caller: Caller,
  access: Access,
): Promise<RunDetail> {
  const { run, stored, record } = whole;
  const [row, baseline, release, comments] = await Promise.all([
    findRunRow(sequelize, run.projectId, run.id),
    findBaseline(sequelize, run),
    Release.findOne({ where: { runId: run.id } }),
    Comment.findAll({ where: { runId: run.id }, include: 'person', order: ['id'] }),
  ]);
  const against = reasonsAgainst(whole, release, caller, access);
  return {
    run: row!,
    record,
    baseline,
    baselineLimits: baseline ? await limitValues(sequelize, baseline.id) : {},
    release: release && presentRelease(release),
    comments: comments.map((comment) => presentComment(comment, caller)),
    hasDrawing: stored.drawing !== null,
    may: {
      comment: may(
        hasRole(access.role, 'engineer') && !caller.token ? null : 'An engineer or above comments.',
      ),
      ask: may(against.ask),
      check: may(against.check),
      release: may(against.release),
      withdraw: may(against.withdraw),
    },
    needsReason: record.limits.some((limit) => isBroken(limit, new Date().toISOString().slice(0, 10))),
  };
}

const may = (why: string | null) => ({ allowed: why === null, why });

export const presentComment = (comment: Comment, caller: Caller): CommentAnswer => ({
  id: comment.id,
  by: comment.person!.name,
  at: comment.createdAt.toISOString(),
  text: comment.text,
  mine: comment.personId === caller.person.id && !caller.token,
});

async function limitValues(sequelize: Sequelize, runId: string): Promise<Record<string, number>> {
  const [row] = await sequelize.query<{ content: Buffer }>(
    'SELECT c.content FROM runs r JOIN records c ON c.id = r.record_id WHERE r.id = $1',
    { bind: [runId], type: QueryTypes.SELECT },
  );
  const { limits } = unpackContent(row!.content);
  return Object.fromEntries(limits.flatMap(({ name, value }) => (value === null ? [] : [[name, value]])));
}
