import { createHash, randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { type Cluster, startCluster } from './postgres/cluster.ts';
import { isRoot } from './postgres/programs.ts';
import { projectRoot } from './project-root.ts';

/** Where a server started by `npm start` keeps what is its own: mail, its secret, and its PostgreSQL. */
export const localFolder = (): string => process.env.STEELYARD_FOLDER || join(projectRoot(), '.steelyard');

/**
 * The folder of the local PostgreSQL. Root's checkouts are often where the account `postgres` cannot go, and PostgreSQL
 * does not run as root: then it lies in that account's own folder.
 */
export function clusterFolder(): string {
  if (!isRoot()) return join(localFolder(), 'postgres');
  const name = createHash('sha256').update(localFolder()).digest('hex').slice(0, 12);
  return `/var/lib/postgresql/steelyard-${name}`;
}

/** The database of a local server: the one named by DATABASE_URL, else one of the project's own. */
export async function localDatabase(tell: (line: string) => void): Promise<Cluster> {
  const given = process.env.DATABASE_URL;
  if (given) return { url: given, found: true, stop: async () => {} };
  return startCluster({ folder: clusterFolder(), durable: true, tell });
}

/** Made at the first start and kept, so that people stay signed in. */
export function localSecret(): string {
  const file = join(localFolder(), 'secret');
  if (!existsSync(file)) {
    mkdirSync(localFolder(), { recursive: true, mode: 0o700 });
    writeFileSync(file, randomBytes(32).toString('hex'), { mode: 0o600 });
  }
  return readFileSync(file, 'utf8').trim();
}
