import type { Server } from 'node:http';
import PgBoss from 'pg-boss';
import { pino } from 'pino';
import { createApp } from './app.ts';
import { createComputer } from './compute/computer.ts';
import type { Config } from './config.ts';
import { migrate, openDatabase } from './database.ts';
import type { Deps } from './deps.ts';
import { createQueues, MAIL_QUEUE, type MailJob, RECOMPUTE_QUEUE, type RecomputeJob } from './jobs/queues.ts';
import { recomputeJob } from './jobs/recompute.ts';
import { recomputeSoon } from './jobs/recompute-soon.ts';
import { recoverJobs } from './jobs/recover.ts';
import { sendMailJob } from './jobs/send-mail.ts';
import { plainError } from './log-error.ts';
import { openTransport } from './mail/transport.ts';

export interface Running {
  readonly deps: Deps;
  readonly server: Server | null;
  /** Where it listens; '' where it does not. */
  readonly address: string;
  /** Finishes the requests and jobs that it has begun, gives the others back, and closes. */
  stop(): Promise<void>;
}

/** Seconds after which what nobody works on is taken up again. */
const RECOVER_AFTER = 120;

/** The port is taken. */
export class PortTaken extends Error {}

/**
 * Opens the database, brings its schema up, starts the jobs and, where pages or an API are wanted, listens.
 *
 * @param pages the folder of the built dashboard; null for the API alone
 * @throws PortTaken, NewerSchema, or what the database says
 */
export async function startServer(config: Config, pages: string | null): Promise<Running> {
  const log = pino({ level: config.LOG_LEVEL, redact: ['req.headers'], serializers: { err: plainError } });
  const sequelize = openDatabase(config.DATABASE_URL, config.DATABASE_CONNECTIONS);
  await migrate(sequelize, config.DATABASE_URL);
  const boss = new PgBoss({
    connectionString: config.DATABASE_URL,
    max: 4,
    application_name: 'steelyard-jobs',
    archiveCompletedAfterSeconds: 3600,
  });
  boss.on('error', (err) => log.warn({ err: { message: err.message } }, 'queue'));
  await boss.start();
  await createQueues(boss);
  const computer = createComputer({
    threads: config.WORKERS,
    seconds: config.RECOMPUTE_SECONDS,
    megabytes: config.RECOMPUTE_MEGABYTES,
  });
  const soon = recomputeSoon(boss, log);
  const deps: Deps = { config, sequelize, boss, recomputeSoon: soon, computer, log };
  const transport = openTransport(config);
  for (let i = 0; i < config.WORKERS; i++)
    await boss.work<RecomputeJob>(RECOMPUTE_QUEUE, { batchSize: 60, pollingIntervalSeconds: 0.5 }, (jobs) =>
      eachOnItsOwn(boss, RECOMPUTE_QUEUE, jobs, (data) => recomputeJob(data, computer, log)),
    );
  await boss.work<MailJob>(MAIL_QUEUE, { batchSize: 5, pollingIntervalSeconds: 1 }, (jobs) =>
    eachOnItsOwn(boss, MAIL_QUEUE, jobs, (data) => sendMailJob(data, transport)),
  );
  await recoverJobs(sequelize, boss, 0);
  const recovery = setInterval(() => {
    recoverJobs(sequelize, boss, RECOVER_AFTER).catch((err) => log.warn({ err }, 'recovery'));
  }, 60_000);
  const close = async () => {
    clearInterval(recovery);
    await soon.flush();
    await boss.stop({ graceful: true, wait: true, timeout: 20_000 }).catch(() => {});
    await computer.close();
    transport.close();
    await sequelize.close();
  };
  try {
    const server = await listen(createApp(deps, pages), config);
    const { port } = server.address() as { port: number };
    return {
      deps,
      server,
      address: `http://${config.HOST.includes(':') ? `[${config.HOST}]` : config.HOST}:${port}`,
      stop: async () => {
        await closeServer(server);
        await close();
      },
    };
  } catch (error) {
    await close();
    throw error;
  }
}

/** Of a batch, what fails goes back alone; the rest is done. */
async function eachOnItsOwn<T>(
  boss: PgBoss,
  queue: string,
  jobs: readonly PgBoss.Job<T>[],
  work: (data: T) => Promise<void>,
): Promise<void> {
  const failed: { id: string; error: unknown }[] = [];
  for (const job of jobs) {
    try {
      await work(job.data);
    } catch (error) {
      failed.push({ id: job.id, error });
    }
  }
  if (failed.length === 0) return;
  if (failed.length === jobs.length) throw failed[0]!.error;
  const bad = new Set(failed.map((f) => f.id));
  await boss.complete(
    queue,
    jobs.filter((j) => !bad.has(j.id)).map((j) => j.id),
  );
  for (const { id, error } of failed) await boss.fail(queue, id, { message: String(error) });
}

function listen(app: ReturnType<typeof createApp>, config: Config): Promise<Server> {
  return new Promise((resolve, reject) => {
    const server = app.listen(config.PORT, config.HOST);
    server.once('listening', () => resolve(server));
    server.once('error', (error: NodeJS.ErrnoException) =>
      reject(
        error.code === 'EADDRINUSE'
          ? new PortTaken(
              `port ${config.PORT} of ${config.HOST} is taken; choose another: PORT=${config.PORT + 1}`,
            )
          : error,
      ),
    );
    server.requestTimeout = 300_000;
    server.headersTimeout = 20_000;
  });
}

/** No new connections; open requests finish, idle connections close. */
function closeServer(server: Server): Promise<void> {
  return new Promise((resolve) => {
    server.close(() => resolve());
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), 15_000).unref();
  });
}
