import type PgBoss from 'pg-boss';
import type { Logger } from 'pino';
import { RECOMPUTE_QUEUE } from './queues.ts';

const GATHER_MS = 50;

/** Puts records into the queue of recomputation, many at once. */
export interface RecomputeSoon {
  add(record: string): void;
  /** What was added is in the queue when this returns. */
  flush(): Promise<void>;
}

/**
 * Gathers what is pushed within a moment into one insertion. Nothing hangs on it: a record says itself that it waits,
 * and `recoverJobs` queues again what a process that died had only gathered.
 */
export function recomputeSoon(boss: PgBoss, log: Logger): RecomputeSoon {
  let gathered: string[] = [];
  let timer: NodeJS.Timeout | null = null;
  const flush = async () => {
    timer = null;
    const records = gathered;
    gathered = [];
    if (records.length === 0) return;
    try {
      await boss.insert(records.map((record) => ({ name: RECOMPUTE_QUEUE, data: { record } })));
    } catch (err) {
      log.warn({ err: { message: (err as Error).message } }, 'recomputation is queued later');
    }
  };
  return {
    add: (record) => {
      gathered.push(record);
      if (timer === null) timer = setTimeout(() => void flush(), GATHER_MS);
    },
    flush,
  };
}
