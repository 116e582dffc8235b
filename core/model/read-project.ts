import { InputError } from '../errors.ts';
import type { FileReader } from './file-reader.ts';
import type { FileModel } from './model.ts';
import { type ReadDocument, readFile } from './read-file.ts';
import type { ProjectSource, TextInput } from './source.ts';
import type { Where } from './where.ts';

/** An assembly with all that it includes, each file read once. */
export interface Project {
  readonly root: FileModel;
  /** By project path, the root first. */
  readonly files: ReadonlyMap<string, FileModel>;
  readonly source: ProjectSource;
}

const INCLUDE_DEPTH = 32;

/**
 * Reads an assembly and what it includes.
 *
 * @param readDocument reader of one file's document
 * @param path of the top file, as `source.readText` takes it
 * @throws InputError with every fault of the file in which reading stopped, and what `readDocument` throws
 */
export function readProject(readDocument: ReadDocument, path: string, source: ProjectSource): Project {
  const files = new Map<string, FileModel>();
  const open: string[] = [];
  const read = (file: string, input: TextInput): FileModel => {
    open.push(file);
    const include = (named: string, where: Where, reader: FileReader): FileModel => {
      const target = atInclude(where, reader, () => source.resolve(file, named));
      const at = open.indexOf(target);
      if (at >= 0 || open.length >= INCLUDE_DEPTH)
        reader.fault(where, {
          code: 'INCLUDE_CIRCLE',
          message:
            at >= 0
              ? `expected files that include one another without a circle, found ${[...open.slice(at), target].join(' → ')}`
              : `expected at most ${INCLUDE_DEPTH} files inside one another, found ${open.join(' → ')}`,
          hint: 'move what both need into a file of its own',
        });
      reader.faults.check();
      const known = files.get(target);
      if (known) return known;
      return read(
        target,
        atInclude(where, reader, () => source.readText(target)),
      );
    };
    const model = readFile(file, input, include, readDocument);
    open.pop();
    files.set(file, model);
    return model;
  };
  const root = read(path, source.readText(path));
  return { root, files: new Map([[path, root], ...files]), source };
}

/** The source's own fault, with the place of the `include:` that named the file. */
function atInclude<T>(where: Where, reader: FileReader, ask: () => T): T {
  try {
    return ask();
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    for (const { at: _, ...fault } of error.faults) reader.fault(where, fault);
    reader.faults.check();
    throw error;
  }
}
