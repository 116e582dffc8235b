import type PgBoss from 'pg-boss';
import type { Logger } from 'pino';
import type { Sequelize } from 'sequelize';
import type { Computer } from './compute/computer.ts';
import type { Config } from './config.ts';
import type { RecomputeSoon } from './jobs/recompute-soon.ts';

/** What services and routes are given. */
export interface Deps {
  readonly config: Config;
  readonly sequelize: Sequelize;
  /** The durable queue in the same database. */
  readonly boss: PgBoss;
  /** Queues the recomputation of what was just pushed. */
  readonly recomputeSoon: RecomputeSoon;
  /** Runs the core in threads with bounds of time and memory. */
  readonly computer: Computer;
  readonly log: Logger;
}
