import { type Computer, TaskFailed } from '../compute/computer.ts';
import type { RecomputeResult } from '../compute/tasks.ts';
import { Input, StoredRecord } from '../models/index.ts';
import { unpackContent } from '../services/record-content.ts';
import type { RecomputeJob } from './queues.ts';

/** Computes a record again and notes what came of it. Doing it twice changes nothing. */
export async function recomputeJob({ record: id }: RecomputeJob, computer: Computer): Promise<void> {
  const record = await StoredRecord.findByPk(id);
  if (!record) return;
  const wanted = unpackContent(record.content).inputs;
  const found = await Input.findAll({
    where: { projectId: record.projectId, sha256: wanted.map((input) => input.sha256) },
  });
  const byHash = new Map(found.map((input) => [input.sha256, input.content]));
  const inputs = wanted.flatMap(({ path, sha256 }) => {
    const content = byHash.get(sha256);
    return content ? [{ path, content }] : [];
  });
  let result: RecomputeResult;
  try {
    result = await computer.recompute({ kind: 'recompute', content: record.content, inputs });
  } catch (error) {
    if (!(error instanceof TaskFailed)) throw error;
    result = { status: 'not recomputable', detail: error.message, drawing: null };
  }
  await record.update({
    recomputation: result.status,
    recomputationDetail: result.detail,
    recomputedAt: new Date(),
    drawing: result.drawing ?? record.drawing,
  });
}
