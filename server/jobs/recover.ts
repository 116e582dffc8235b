import type PgBoss from 'pg-boss';
import { QueryTypes, type Sequelize } from 'sequelize';
import { MAIL_QUEUE, RECOMPUTE_QUEUE } from './queues.ts';

const AT_ONCE = 2000;

/**
 * Puts back what a worker had taken when it died: records that wait for their computation and letters that wait to be
 * sent, without a job in the queue. Doing one twice changes nothing, so a job that another process still works on may
 * come again.
 *
 * @param olderThan seconds since the record or the letter was made
 */
export async function recoverJobs(sequelize: Sequelize, boss: PgBoss, olderThan: number): Promise<void> {
  const orphans = (queue: string, key: string, table: string, waiting: string) =>
    sequelize.query<{ id: string }>(
      `SELECT t.id FROM ${table} t
       WHERE ${waiting} AND t.created_at < now() - make_interval(secs => $2) AND NOT EXISTS (
         SELECT 1 FROM pgboss.job j
         WHERE j.name = $1 AND j.state IN ('created', 'retry') AND j.data->>'${key}' = t.id::text)
       ORDER BY t.id LIMIT ${AT_ONCE}`,
      { bind: [queue, olderThan], type: QueryTypes.SELECT },
    );
  for (const { id } of await orphans(RECOMPUTE_QUEUE, 'record', 'records', "t.recomputation = 'waiting'"))
    await boss.send(RECOMPUTE_QUEUE, { record: id });
  for (const { id } of await orphans(
    MAIL_QUEUE,
    'mail',
    'mails',
    "t.sent_at IS NULL AND t.created_at > now() - interval '3 days'",
  ))
    await boss.send(MAIL_QUEUE, { mail: id });
}
