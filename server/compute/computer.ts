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

/**
 * Threads that run the core: a task beyond its bounds ends its thread, never the server. Recomputations come no more at
 * once than there are threads; uploads take turns in a thread of their own, so that neither waits for the other, and
 * time counts from when a task has its thread.
 */
export function createComputer({ threads, seconds, megabytes }: Bounds): Computer {
  const pool = (most: number) => {
    const made = new Piscina({
      filename: threadFile(),
      minThreads: 0,
      maxThreads: most,
      idleTimeout: 60_000,
      resourceLimits: { maxOldGenerationSizeMb: megabytes, maxYoungGenerationSizeMb: 64, stackSizeMb: 4 },
    });
    // A thread that dies outside a task is replaced; within one, the task's promise tells.
    made.on('error', () => {});
    return made;
  };
  const [recomputing, uploading] = [pool(Math.max(1, threads)), pool(1)];
  const run = async (on: Piscina, task: RecomputeTask | UploadTask) => {
    const signal = AbortSignal.timeout(seconds * 1000);
    try {
      return await on.run(task, { signal });
    } catch (error) {
      if (signal.aborted) throw new TaskFailed(`it takes more than ${seconds} s here`);
      if ((error as { code?: string }).code === 'ERR_WORKER_OUT_OF_MEMORY')
        throw new TaskFailed(`it takes more than ${megabytes} MB of memory here`);
      throw error;
    }
  };
  let last: Promise<unknown> = Promise.resolve();
  return {
    recompute: (task) => run(recomputing, task),
    rollUp: (task) => {
      const mine = last.then(() => run(uploading, task));
      last = mine.catch(() => {});
      return mine;
    },
    close: async () => {
      await Promise.all([recomputing.destroy(), uploading.destroy()]);
    },
  };
}

/** Threads load the built file, also where the server runs from source. */
function threadFile(): string {
  const file = join(projectRoot(), 'dist', 'server', 'thread.js');
  if (!existsSync(file)) throw new Error(`expected ${file}, found none: npm run build`);
  return file;
}
