import { createPeople } from './20261201090000-create-people.ts';
import { createProjects } from './20261201090100-create-projects.ts';
import { createRecords } from './20261201090200-create-records.ts';
import { indexHistory } from './20261201090300-index-history.ts';
import { createReleases } from './20261201090400-create-releases.ts';
import { createAudit } from './20261201090500-create-audit.ts';
import { createMail } from './20261201090600-create-mail.ts';
import type { Migration } from './migration.ts';

/** In order. Named one by one, for a bundle has no folder to look through. */
export const migrations: readonly Migration[] = [
  createPeople,
  createProjects,
  createRecords,
  indexHistory,
  createReleases,
  createAudit,
  createMail,
];
