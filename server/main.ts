import { join } from 'node:path';
import { ConfigError, readConfig } from './config.ts';
import { NewerSchema } from './database.ts';
import { projectRoot } from './project-root.ts';
import { PortTaken, startServer } from './running.ts';
import { stopOnSignal } from './stop-on-signal.ts';
import { surviveDatabase } from './survive-database.ts';

// The server for production: everything from the environment, nothing seeded, nothing installed.
try {
  const running = await startServer(readConfig(process.env), join(projectRoot(), 'dist', 'web'));
  running.deps.log.info({ address: running.address }, 'listening');
  surviveDatabase(running.deps.log);
  stopOnSignal(() => running.stop());
} catch (error) {
  const expected = error instanceof ConfigError || error instanceof NewerSchema || error instanceof PortTaken;
  process.stderr.write(`${expected ? error.message : `steelyard: ${(error as Error).message}`}\n`);
  process.exit(1);
}
