import { createHash } from 'node:crypto';
import { posix } from 'node:path';
import { InputError } from '#core/errors.ts';
import type { BytesInput, ProjectSource, TextInput } from '#core/model/source.ts';

const sha256 = (data: string | Uint8Array) => createHash('sha256').update(data).digest('hex');

/** A project whose files are in memory: text or, for meshes, bytes by path. */
export class MemorySource implements ProjectSource {
  readonly files: ReadonlyMap<string, string | Uint8Array>;

  constructor(files: ReadonlyMap<string, string | Uint8Array>) {
    this.files = files;
  }

  resolve(from: string, named: string): string {
    const path = posix.normalize(posix.join(posix.dirname(from), named));
    if (path.startsWith('../') || posix.isAbsolute(named)) throw fault('FILE_OUTSIDE_PROJECT', named);
    if (!this.files.has(path)) throw fault('FILE_MISSING', named);
    return path;
  }

  readText(path: string): TextInput {
    const content = this.get(path);
    const text = typeof content === 'string' ? content : new TextDecoder().decode(content);
    return { text, sha256: sha256(text) };
  }

  readBytes(path: string): BytesInput {
    const content = this.get(path);
    const bytes = typeof content === 'string' ? new TextEncoder().encode(content) : content;
    return { bytes, sha256: sha256(bytes) };
  }

  private get(path: string): string | Uint8Array {
    const content = this.files.get(path);
    if (content === undefined) throw fault('FILE_MISSING', path);
    return content;
  }
}

const fault = (code: string, path: string) =>
  new InputError([
    { code, message: `expected a file of the project, found none at ${path}`, hint: 'add it' },
  ]);
