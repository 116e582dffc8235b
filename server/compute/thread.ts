import { recompute } from './recompute.ts';
import { rollUpUpload } from './roll-up-upload.ts';
import type { RecomputeResult, Task, UploadResult } from './tasks.ts';

/** The entry of a thread: one task in, one answer out; what goes wrong with an input is part of the answer. */
export default function run(task: Task): RecomputeResult | UploadResult {
  return task.kind === 'recompute' ? recompute(task) : rollUpUpload(task);
}
