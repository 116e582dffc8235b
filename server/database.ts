import pg from 'pg';
import { type QueryInterface, Sequelize } from 'sequelize';
import { Umzug } from 'umzug';
import { migrations } from '#migrations/index.ts';
import { mapModels } from './models/index.ts';

/** Opens the database and binds the models to it. */
export function openDatabase(url: string, connections = 12): Sequelize {
  const sequelize = new Sequelize(url, {
    dialect: 'postgres',
    dialectModule: pg,
    logging: false,
    pool: { max: connections, min: 0, idle: 10_000, acquire: 30_000 },
    dialectOptions: { application_name: 'steelyard', keepAlive: true },
  });
  mapModels(sequelize);
  return sequelize;
}

/** The steps of the schema against a database; umzug notes what was done in `schema_migrations`. */
export function createMigrator(sequelize: Sequelize): Umzug<QueryInterface> {
  const queryInterface = sequelize.getQueryInterface();
  return new Umzug<QueryInterface>({
    migrations: migrations.map(({ name, up, down }) => ({
      name,
      up: ({ context }) => up(context),
      down: ({ context }) => down(context),
    })),
    context: queryInterface,
    storage: {
      executed: async () => (await notes(sequelize)).map((row) => row.name),
      logMigration: async ({ name }) => {
        await sequelize.query('INSERT INTO schema_migrations (name) VALUES ($1)', { bind: [name] });
      },
      unlogMigration: async ({ name }) => {
        await sequelize.query('DELETE FROM schema_migrations WHERE name = $1', { bind: [name] });
      },
    },
    logger: undefined,
  });
}

async function notes(sequelize: Sequelize): Promise<{ name: string }[]> {
  await sequelize.query(
    'CREATE TABLE IF NOT EXISTS schema_migrations (name text PRIMARY KEY, at timestamptz NOT NULL DEFAULT now())',
  );
  const [rows] = await sequelize.query('SELECT name FROM schema_migrations ORDER BY name');
  return rows as { name: string }[];
}

/** The database is of a newer version than this program. */
export class NewerSchema extends Error {}

/**
 * Brings the schema up to this program's; one process at a time.
 *
 * @returns the names of the steps done
 * @throws NewerSchema where the database has steps that this program does not know
 */
export async function migrate(sequelize: Sequelize, url: string): Promise<string[]> {
  // A lock of its own connection: two servers that start at once take turns.
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await client.query('SELECT pg_advisory_lock(47804780)');
    const known = new Set(migrations.map((m) => m.name));
    const unknown = (await notes(sequelize)).filter((row) => !known.has(row.name));
    if (unknown.length > 0)
      throw new NewerSchema(
        `expected a database of this version or an older one, found that it has ${unknown.map((u) => u.name).join(', ')}, which a newer Steelyard made; start that one, or restore a backup of before`,
      );
    return (await createMigrator(sequelize).up()).map((m) => m.name);
  } finally {
    await client.end();
  }
}

/** One transaction around some work; rolled back when it throws. A written type, for lint sees a promise by it. */
export function inTransaction<T>(
  sequelize: Sequelize,
  work: (transaction: import('sequelize').Transaction) => Promise<T>,
): Promise<T> {
  return sequelize.transaction(work);
}
