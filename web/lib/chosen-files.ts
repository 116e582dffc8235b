/** A file to be sent, by its path within what was chosen. */
export interface ChosenFile {
  /** With `/`, relative to the folder that holds everything. */
  readonly path: string;
  readonly file: File;
}

/** What was there and what came: a path that comes again is replaced. Sorted by path. */
export function mergeFiles(before: readonly ChosenFile[], come: readonly ChosenFile[]): ChosenFile[] {
  const byPath = new Map([...before, ...withoutCommonFolder(come)].map((chosen) => [chosen.path, chosen]));
  return [...byPath.values()].sort((a, b) => (a.path < b.path ? -1 : 1));
}

/** One folder that holds everything is where the project stands, not part of any path. */
function withoutCommonFolder(files: readonly ChosenFile[]): ChosenFile[] {
  const first = files[0]?.path.split('/')[0];
  const shared = first !== undefined && files.every(({ path }) => path.startsWith(`${first}/`));
  if (!shared) return [...files];
  return files.map(({ path, file }) => ({ path: path.slice(first.length + 1), file }));
}

/** Whether a file may be the top of an assembly. */
export const isText = (path: string): boolean => /\.ya?ml$/i.test(path);

/**
 * The file that is probably the assembly: a YAML file that no other includes, the one highest up.
 *
 * @returns null where there is no YAML file
 */
export async function guessTop(files: readonly ChosenFile[]): Promise<string | null> {
  const texts = files.filter(({ path }) => isText(path));
  const included = new Set<string>();
  for (const { file } of texts)
    for (const [, name] of (await file.text()).matchAll(/\binclude:\s*["']?([^\s"',}]+)/g))
      included.add(name!.split('/').at(-1)!);
  const tops = texts.filter(({ path }) => !included.has(path.split('/').at(-1)!));
  const depth = (path: string) => path.split('/').length;
  const best = (tops.length > 0 ? tops : texts).toSorted((a, b) => depth(a.path) - depth(b.path))[0];
  return best?.path ?? null;
}
