import { readRightDocument, WrongShape } from '../document/read-right-document.ts';
import { type Project, readProject } from './read-project.ts';
import type { ProjectSource } from './source.ts';

/**
 * Reads an assembly as `loadProject` does, and loads what explains a wrong shape only where there is one: a start that
 * a user waits for at every call.
 *
 * @throws InputError with every fault of the file in which reading stopped
 */
export async function openProject(path: string, source: ProjectSource): Promise<Project> {
  try {
    return readProject(readRightDocument, path, source);
  } catch (error) {
    if (!(error instanceof WrongShape)) throw error;
    const { loadProject } = await import('./load-project.ts');
    return loadProject(path, source);
  }
}
