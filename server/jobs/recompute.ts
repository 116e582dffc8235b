import type { Logger } from 'pino';
import { type Computer, TaskFailed } from '../compute/computer.ts';
import type { RecomputeResult } from '../compute/tasks.ts';
import { Input, StoredRecord } from '../models/index.ts';
import { isDatabaseAway } from '../services/database-away.ts';
import { unpackContent } from '../services/record-content.ts';
import type { RecomputeJob } from './queues.ts';

/** Unpacked inputs of one record: they lie outside the bounds of a thread. */
const INPUT_BYTES = 512 * 2 ** 20;

/** Computes a record again and notes what came of it. Doing it twice changes nothing. */
export async function recomputeJob(
  { record: id }: RecomputeJob,
  computer: Computer,
  log: Logger,
): Promise<void> {
  const record = await StoredRecord.findByPk(id);
  if (record?.recomputation !== 'waiting') return;
  const result = await recomputed(record, computer).catch((error: unknown): RecomputeResult => {
    // Tried again by the queue; anything else would fail for ever.
    if (isDatabaseAway(error)) throw error;
    if (!(error instanceof TaskFailed)) log.error({ err: error, record: id }, 'recomputation failed');
    const detail =
      error instanceof TaskFailed ? error.message : 'the computation failed here; the log says why';
    return { status: 'not recomputable', detail, drawing: null };
  });
  await record.update({
    recomputation: result.status,
    recomputationDetail: result.detail,
    recomputedAt: new Date(),
    drawing: result.drawing ?? record.drawing,
  });
}

async function recomputed(record: StoredRecord, computer: Computer): Promise<RecomputeResult> {
  const wanted = unpackContent(record.content).inputs;
  const where = { projectId: record.projectId, sha256: wanted.map((input) => input.sha256) };
  const sizes = await Input.findAll({ where, attributes: ['size'] });
  const bytes = sizes.reduce((sum, { size }) => sum + Number(size), 0);
  if (bytes > INPUT_BYTES)
    throw new TaskFailed(`its inputs are ${Math.round(bytes / 2 ** 20)} MB; at most 512 MB are read`);
  const found = await Input.findAll({ where });
  const place = new Map(found.map((input, i) => [input.sha256, i]));
  return computer.recompute({
    kind: 'recompute',
    content: record.content,
    contents: found.map((input) => input.content),
    inputs: wanted.flatMap(({ path, sha256 }) => {
      const content = place.get(sha256);
      return content === undefined ? [] : [{ path, content }];
    }),
  });
}
