import { execFileSync } from 'node:child_process';
import { posix } from 'node:path';
import { InputError } from '#core/errors.ts';
import type { BytesInput, ProjectSource, TextInput } from '#core/model/source.ts';
import { decodeUtf8, sha256 } from './disk-source.ts';

/** A project as one git revision has it, read from git's objects: the work tree is not touched. */
export class GitSource implements ProjectSource {
  readonly root: string;
  readonly revision: string;

  constructor(root: string, revision: string) {
    this.root = root;
    this.revision = revision;
  }

  resolve(from: string, named: string): string {
    const path = posix.normalize(posix.join(posix.dirname(from), named));
    if (posix.isAbsolute(named) || path === '..' || path.startsWith('../'))
      throw new InputError([
        {
          code: 'FILE_OUTSIDE_PROJECT',
          message: `expected a file inside the repository, found ${named}, which leads out of it`,
          hint: 'write the path relative to the file that names it',
        },
      ]);
    return path;
  }

  readText(path: string): TextInput {
    const text = decodeUtf8(this.show(path), path);
    return { text, sha256: sha256(text) };
  }

  readBytes(path: string): BytesInput {
    const bytes = this.show(path);
    return { bytes, sha256: sha256(bytes) };
  }

  private show(path: string): Buffer {
    try {
      return execFileSync('git', ['-C', this.root, 'cat-file', 'blob', `${this.revision}:${path}`], {
        maxBuffer: 2 ** 30,
        stdio: ['ignore', 'pipe', 'ignore'],
      });
    } catch {
      throw new InputError([
        {
          code: 'FILE_MISSING',
          message: `expected ${path} in revision ${this.revision}, found none`,
          hint: 'check the path, which is relative to the root of the repository, and that the revision is fetched',
        },
      ]);
    }
  }
}
