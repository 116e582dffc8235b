import type { Logger } from 'pino';
import { isDatabaseAway } from './services/database-away.ts';

/**
 * Keeps the process alive when the queue's own work fails because the database is away: it asks again by itself.
 * Anything else that nobody awaited is a bug, and ends the process as it should.
 */
export function surviveDatabase(log: Logger): void {
  process.on('unhandledRejection', (error) => {
    if (!isDatabaseAway(error)) throw error;
    log.warn({ err: { message: (error as Error).message } }, 'the database is away');
  });
}
