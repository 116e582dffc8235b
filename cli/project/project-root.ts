import { existsSync, realpathSync } from 'node:fs';
import { dirname, join, relative, resolve, sep } from 'node:path';

/** The project folder of a top file: the git root around it, else the file's own folder; symbolic links resolved. */
export function projectRoot(file: string): string {
  const folder = realpathSync(dirname(resolve(file)));
  for (let at = folder; ; at = dirname(at)) {
    if (existsSync(join(at, '.git'))) return at;
    if (dirname(at) === at) return folder;
  }
}

/** A file's path inside the project, with `/` on every system. */
export const projectPath = (root: string, file: string): string => relative(root, file).split(sep).join('/');
