import { posix } from 'node:path';
import { InputError } from '#core/errors.ts';
import type { BytesInput, ProjectSource, TextInput } from '#core/model/source.ts';
import { decodeText } from '#core/yaml/index.ts';
import { sha256 } from '../services/secrets.ts';

/** Files of a project by path, as they were stored or uploaded. */
export class MemorySource implements ProjectSource {
  private readonly files: ReadonlyMap<string, Uint8Array>;

  constructor(files: ReadonlyMap<string, Uint8Array>) {
    this.files = files;
  }

  resolve(from: string, named: string): string {
    const path = posix.normalize(posix.join(posix.dirname(from), named));
    if (posix.isAbsolute(named) || path === '..' || path.startsWith('../'))
      throw fault(
        'FILE_OUTSIDE_PROJECT',
        `expected a file inside the project folder, found ${named}`,
        'move it there',
      );
    if (!this.files.has(path)) throw missing(path);
    return path;
  }

  readText(path: string): TextInput {
    const text = decodeText(this.get(path), path).replace(/\r\n?/g, '\n');
    return { text, sha256: sha256(text) };
  }

  readBytes(path: string): BytesInput {
    const bytes = this.get(path);
    return { bytes, sha256: sha256(bytes) };
  }

  private get(path: string): Uint8Array {
    const bytes = this.files.get(path);
    if (!bytes) throw missing(path);
    return bytes;
  }
}

const missing = (path: string) =>
  fault('FILE_MISSING', `expected a file, found none at ${path}`, 'send it with the others');

const fault = (code: string, message: string, hint: string) => new InputError([{ code, message, hint }]);
