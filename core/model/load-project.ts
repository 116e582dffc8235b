import { readDocument } from '../document/index.ts';
import { type Project, readProject } from './read-project.ts';
import type { ProjectSource } from './source.ts';

/**
 * Reads an assembly and what it includes.
 *
 * @param path of the top file, as `source.readText` takes it
 * @throws InputError with every fault of the file in which reading stopped
 */
export const loadProject = (path: string, source: ProjectSource): Project =>
  readProject(readDocument, path, source);
