import { realpathSync } from 'node:fs';
import { resolve } from 'node:path';
import { InputError } from '#core/errors.ts';
import type { ProjectSource } from '#core/model/source.ts';
import type { InputRecord } from '#core/record/record.ts';
import { DiskSource } from '../project/disk-source.ts';
import { projectRoot } from '../project/project-root.ts';
import type { FindInput } from './pack.ts';

/**
 * Looks for an input at its path in project folders. Only the very bytes that the record's hash was taken of will do;
 * what lies outside the folders is not read.
 */
export function findIn(sources: readonly ProjectSource[]): FindInput {
  const found = new Map<string, Uint8Array | null>();
  return (input) => {
    const known = found.get(input.sha256);
    if (known !== undefined) return known;
    const bytes = sources.map((source) => read(source, input)).find((b) => b !== null) ?? null;
    found.set(input.sha256, bytes);
    return bytes;
  };
}

/** The project around a file of records, and the one around the current folder. */
export function sourcesBeside(file: string): ProjectSource[] {
  const roots = [projectRoot(realpathSync(resolve(file))), projectRoot(resolve('x'))];
  return [...new Set(roots)].map((root) => new DiskSource(root));
}

function read(source: ProjectSource, { path, sha256, bytes }: InputRecord): Uint8Array | null {
  try {
    const inside = source.resolve('top', path);
    const input = bytes === undefined ? source.readText(inside) : source.readBytes(inside);
    if (input.sha256 !== sha256) return null;
    return 'text' in input ? Buffer.from(input.text) : input.bytes;
  } catch (error) {
    if (error instanceof InputError) return null;
    throw error;
  }
}
