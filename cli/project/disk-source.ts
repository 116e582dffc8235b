import { createHash } from 'node:crypto';
import { closeSync, fstatSync, openSync, readFileSync, readSync, realpathSync } from 'node:fs';
import { isAbsolute, join, relative, resolve, sep } from 'node:path';
import { InputError } from '#core/errors.ts';
import type { BytesInput, ProjectSource, TextInput } from '#core/model/source.ts';
import { projectPath } from './project-root.ts';

const TEXT_AT_MOST = 32 * 2 ** 20;
const MESH_AT_MOST = 2 ** 30;

/** A project on disk: what it names stays inside its folder, symbolic links resolved. */
export class DiskSource implements ProjectSource {
  readonly root: string;

  constructor(root: string) {
    this.root = root;
  }

  resolve(from: string, named: string): string {
    if (isAbsolute(named))
      throw fileFault(
        'FILE_OUTSIDE_PROJECT',
        `expected a path relative to ${from}, found ${named}`,
        'write it relative to the file that names it',
      );
    const real = realPath(resolve(join(this.root, from, '..'), named), named);
    const inside = relative(this.root, real);
    if (inside === '..' || inside.startsWith(`..${sep}`) || isAbsolute(inside))
      throw fileFault(
        'FILE_OUTSIDE_PROJECT',
        `expected a file inside the project folder, found ${named}, which leads out of it`,
        'copy it into the project (the git root, else the folder of the top file), so that a record has all its inputs',
      );
    return projectPath(this.root, real);
  }

  readText(path: string): TextInput {
    const bytes = readBounded(join(this.root, path), path, TEXT_AT_MOST, 'TEXT_TOO_LARGE');
    const text = decodeUtf8(bytes, path);
    return { text, sha256: sha256(text) };
  }

  readBytes(path: string): BytesInput {
    const bytes = readBounded(join(this.root, path), path, MESH_AT_MOST, 'MESH_TOO_LARGE');
    return { bytes, sha256: sha256(bytes) };
  }
}

export const sha256 = (data: string | Uint8Array): string => createHash('sha256').update(data).digest('hex');

/** Text as a record keeps it: UTF-8, no byte order mark, line ends as LF. */
export function decodeUtf8(bytes: Uint8Array, path: string): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes).replace(/\r\n?/g, '\n');
  } catch {
    throw fileFault(
      'TEXT_NOT_UTF8',
      `expected UTF-8 text, found other bytes in ${path}`,
      'save the file as UTF-8; a mesh is named by `solid: { mesh: { file: … } }`',
    );
  }
}

function realPath(path: string, named: string): string {
  try {
    return realpathSync(path);
  } catch (error) {
    throw systemFault(error, named);
  }
}

function readBounded(path: string, named: string, most: number, code: string): Uint8Array {
  let handle: number | undefined;
  try {
    handle = openSync(path, 'r');
    const stat = fstatSync(handle);
    if (stat.isDirectory())
      throw fileFault('FILE_UNREADABLE', `expected a file, found a folder: ${named}`, 'name a file in it');
    if (stat.size > most)
      throw fileFault(
        code,
        `expected at most ${most / 2 ** 20} MiB, found ${(stat.size / 2 ** 20).toFixed(1)} MiB in ${named}`,
        'split it with `include:`, or make a coarser mesh',
      );
    return stat.isFile() ? readWhole(handle, stat.size) : readFileSync(handle);
  } catch (error) {
    throw error instanceof InputError ? error : systemFault(error, named);
  } finally {
    if (handle !== undefined) closeSync(handle);
  }
}

function readWhole(handle: number, size: number): Uint8Array {
  const bytes = Buffer.allocUnsafeSlow(size);
  let at = 0;
  while (at < size) {
    const read = readSync(handle, bytes, at, size - at, null);
    if (read === 0) break;
    at += read;
  }
  return at === size ? bytes : bytes.subarray(0, at);
}

const fileFault = (code: string, message: string, hint: string) => new InputError([{ code, message, hint }]);

function systemFault(error: unknown, named: string): Error {
  const { code } = error as NodeJS.ErrnoException;
  if (code === 'ENOENT' || code === 'ENOTDIR')
    return fileFault(
      'FILE_MISSING',
      `expected a file, found none at ${named}`,
      'check the name; it is relative to the file that names it, or to the current folder',
    );
  if (code === undefined) return error as Error;
  const why: Record<string, string> = {
    EACCES: 'permission is denied',
    ELOOP: 'its symbolic links go in a circle',
    EISDIR: 'it is a folder',
    ENAMETOOLONG: 'the name is too long',
  };
  return fileFault(
    'FILE_UNREADABLE',
    `expected a file that can be read, found ${named}: ${why[code] ?? code}`,
    'mend that, or name another file',
  );
}
