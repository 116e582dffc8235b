import { sqlMigration } from './migration.ts';

const FILTERS = ['assembly', 'state', 'branch', 'verdict'];

/** Every set of filters, so that each page of a history of a million runs is one walk along an index. */
const sets = Array.from({ length: 2 ** FILTERS.length }, (_, bits) =>
  FILTERS.filter((__, i) => (bits >> i) & 1),
);
const nameOf = (set: readonly string[], order: string) => ['runs', 'by', order, ...set].join('_');

export const indexHistory = sqlMigration(
  '20261201090300-index-history',
  [
    ...sets.map((set) => `CREATE INDEX ${nameOf(set, 'at')} ON runs (${['project_id', ...set, 'at', 'id']})`),
    ...[[], ['assembly', 'state']].map(
      (set) => `CREATE INDEX ${nameOf(set, 'mass')} ON runs (${['project_id', ...set, 'mass', 'id']})`,
    ),
    "CREATE INDEX runs_released ON runs (project_id, assembly, state, at DESC, id DESC) WHERE release = 'released'",
  ].join(';\n'),
  [
    ...sets.map((set) => `DROP INDEX ${nameOf(set, 'at')}`),
    'DROP INDEX runs_by_mass',
    'DROP INDEX runs_by_mass_assembly_state',
    'DROP INDEX runs_released',
  ].join(';\n'),
);
