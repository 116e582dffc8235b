/** A file to be sent, by its path within what was chosen. */
export interface ChosenFile {
  /** With `/`, relative to the folder that holds everything. */
  readonly path: string;
  readonly file: File;
}

/** The files of a drop, folders walked through. Must be called in the event itself, for its items are gone after it. */
export async function filesOfDrop(items: DataTransferItemList): Promise<ChosenFile[]> {
  const entries = [...items].map((item) => item.webkitGetAsEntry?.() ?? item.getAsFile());
  const found = await Promise.all(
    entries.map((entry) => {
      if (entry === null) return [];
      return entry instanceof File ? [{ path: entry.name, file: entry }] : filesOfEntry(entry);
    }),
  );
  return found.flat();
}

async function filesOfEntry(entry: FileSystemEntry): Promise<ChosenFile[]> {
  if (entry.name.startsWith('.')) return [];
  if (entry.isFile) {
    const file = await new Promise<File>((resolve, reject) =>
      (entry as FileSystemFileEntry).file(resolve, reject),
    );
    return [{ path: entry.fullPath.replace(/^\//, ''), file }];
  }
  const reader = (entry as FileSystemDirectoryEntry).createReader();
  const found: ChosenFile[] = [];
  // A reader hands out a folder in portions and ends with an empty one.
  for (;;) {
    const portion = await new Promise<FileSystemEntry[]>((resolve, reject) =>
      reader.readEntries(resolve, reject),
    );
    if (portion.length === 0) return found;
    for (const inner of portion) found.push(...(await filesOfEntry(inner)));
  }
}

/** The files of a chooser; a chosen folder brings paths. */
export function filesOfChooser(list: FileList): ChosenFile[] {
  return [...list]
    .map((file) => ({ path: file.webkitRelativePath || file.name, file }))
    .filter(({ path }) => !path.split('/').some((part) => part.startsWith('.')));
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
