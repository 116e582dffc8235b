import { join } from 'node:path';
import { ConfigError, readConfig } from './config.ts';
import { NewerSchema } from './database.ts';
import { seedDemo } from './demo/seed.ts';
import { localDatabase, localFolder, localSecret } from './local.ts';
import { PostgresError } from './postgres/programs.ts';
import { projectRoot } from './project-root.ts';
import { PortTaken, type Running, startServer } from './running.ts';
import { DEMO_PASSWORD, DEMO_SIGN_INS } from './services/demo-sign-ins.ts';
import { stopOnSignal } from './stop-on-signal.ts';
import { surviveDatabase } from './survive-database.ts';

// npm start: a server on this machine with the demo in it. The database is found or made, and stopped at the end.
const tell = (line: string): void => {
  process.stderr.write(`steelyard: ${line}\n`);
};

/** What is started is stopped, in the other order, whenever the stop comes. */
const stops: (() => Promise<void>)[] = [];
let stopping = false;
const stopAll = async () => {
  stopping = true;
  tell('stopping');
  for (const stop of [...stops].reverse()) await stop().catch(() => {});
};
stopOnSignal(stopAll);

try {
  const port = process.env.PORT || '4780';
  tell('starting PostgreSQL');
  const starting = localDatabase(tell);
  // Noted before it runs: a stop that comes meanwhile waits for it and ends it.
  stops.push(async () => (await starting).stop());
  const cluster = await starting;
  const config = readConfig({
    LOG_LEVEL: 'warn',
    DEMO: 'yes',
    MAIL_FOLDER: join(localFolder(), 'mail'),
    ...process.env,
    DATABASE_URL: cluster.url,
    PUBLIC_URL: process.env.PUBLIC_URL || `http://127.0.0.1:${port}`,
    SECRET: process.env.SECRET || localSecret(),
    PORT: port,
  });
  tell('bringing the schema up');
  const running: Running = await startServer(config, join(projectRoot(), 'dist', 'web'));
  stops.push(() => running.stop());
  surviveDatabase(running.deps.log);
  await seedDemo(running.deps, tell);
  process.stdout.write(`
Steelyard is at ${config.PUBLIC_URL}

  sign in as            password            ${''}
${DEMO_SIGN_INS.map(({ email, role }) => `  ${email.padEnd(22)}${DEMO_PASSWORD.padEnd(20)}${role}`).join('\n')}

The API is described at ${config.PUBLIC_URL}/api/openapi.json
On the command line, without a server:
  npx steelyard check examples/survey-drone/drone.yaml
  npx steelyard diff examples/survey-drone/drone.yaml examples/survey-drone/drone-heavy-payload.yaml
Ctrl-C stops everything that this command started; the data stays.
`);
} catch (error) {
  // Told to stop, it ends as told; what breaks on the way is no news.
  if (stopping) await new Promise(() => {});
  const expected = [ConfigError, PostgresError, NewerSchema, PortTaken].some((kind) => error instanceof kind);
  const { message, stack } = error as Error;
  tell(expected ? message : `it did not start: ${process.env.STEELYARD_DEBUG ? stack : message}`);
  for (const stop of [...stops].reverse()) await stop().catch(() => {});
  process.exit(1);
}
