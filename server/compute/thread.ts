import { setPriority } from 'node:os';
import { recompute } from './recompute.ts';
import { rollUpUpload } from './roll-up-upload.ts';
import type { RecomputeResult, Task, UploadResult } from './tasks.ts';

// Answers to people and pushes come first: on Linux this is of the calling thread alone.
try {
  setPriority(10);
} catch {
  // Where that is not allowed, all threads are alike.
}

/** The entry of a thread: one task in, one answer out; what goes wrong with an input is part of the answer. */
export default function run(task: Task): RecomputeResult | UploadResult {
  return task.kind === 'recompute' ? recompute(task) : rollUpUpload(task);
}
