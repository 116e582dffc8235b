import type PgBoss from 'pg-boss';
import type { Transaction } from 'sequelize';

export const RECOMPUTE_QUEUE = 'recompute';
export const MAIL_QUEUE = 'mail';

export interface RecomputeJob {
  readonly record: string;
}
export interface MailJob {
  readonly mail: string;
}
type Jobs = { [MAIL_QUEUE]: MailJob };

/** The driver's own connection of a Sequelize transaction. */
interface WithConnection {
  connection: { query(text: string, values: unknown[]): Promise<{ rows: unknown[] }> };
}

/** Puts a job into the queue within a transaction: it is there if, and only if, what it follows from is. */
export async function sendJob<Q extends keyof Jobs>(
  boss: PgBoss,
  queue: Q,
  data: Jobs[Q],
  transaction: Transaction,
): Promise<void> {
  const { connection } = transaction as unknown as WithConnection;
  await boss.send(queue, data as object, {
    db: { executeSql: (text: string, values: unknown[]) => connection.query(text, values) as never },
  });
}

/** Makes the queues: a job is tried again with growing waits, and nothing is lost when a worker dies. */
export async function createQueues(boss: PgBoss): Promise<void> {
  await boss.createQueue(RECOMPUTE_QUEUE, {
    name: RECOMPUTE_QUEUE,
    retryLimit: 5,
    retryDelay: 2,
    retryBackoff: true,
    expireInSeconds: 7200,
  });
  await boss.createQueue(MAIL_QUEUE, {
    name: MAIL_QUEUE,
    retryLimit: 12,
    retryDelay: 5,
    retryBackoff: true,
    expireInSeconds: 300,
  });
}
