import type { ChosenFile } from './chosen-files.ts';

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
