import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { Piscina } from 'piscina';
import { projectRoot } from '../project-root.ts';
import type { RecomputeResult, RecomputeTask, UploadResult, UploadTask } from './tasks.ts';

/** A task took more time or memory than it may, or its thread died of it. */
export class TaskFailed extends Error {}

export interface Computer {
  /** @throws TaskFailed */
  recompute(task: RecomputeTask): Promise<RecomputeResult>;
  /** @throws TaskFailed */
  rollUp(task: UploadTask): Promise<UploadResult>;
  close(): Promise<void>;
}

export interface Bounds {
  readonly threads: number;
  readonly seconds: number;
  readonly megabytes: number;
}

/** Threads that run the core: a task beyond its bounds ends its thread, never the server. */
export function createComputer({ threads, seconds, megabytes }: Bounds): Computer {
  const pool = new Piscina({
    filename: threadFile(),
    minThreads: 0,
    maxThreads: Math.max(1, threads),
    idleTimeout: 60_000,
    resourceLimits: { maxOldGenerationSizeMb: megabytes, maxYoungGenerationSizeMb: 64, stackSizeMb: 4 },
  });
  // A thread that dies outside a task is replaced; within one, the task's promise tells.
  pool.on('error', () => {});
  const run = async (task: RecomputeTask | UploadTask) => {
    const signal = AbortSignal.timeout(seconds * 1000);
    try {
      return await pool.run(task, { signal });
    } catch (error) {
      if (signal.aborted) throw new TaskFailed(`it takes more than ${seconds} s here`);
      if ((error as { code?: string }).code === 'ERR_WORKER_OUT_OF_MEMORY')
        throw new TaskFailed(`it takes more than ${megabytes} MB of memory here`);
      throw error;
    }
  };
  return { recompute: run, rollUp: run, close: () => pool.destroy() };
}

/** Threads load the built file, also where the server runs from source. */
function threadFile(): string {
  const file = join(projectRoot(), 'dist', 'server', 'thread.js');
  if (!existsSync(file)) throw new Error(`expected ${file}, found none: npm run build`);
  return file;
}
