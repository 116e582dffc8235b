import type { Uploaded } from '#core/api/push.ts';
import type { ChosenFile } from '#web/lib/chosen-files.ts';
import { request } from './client.ts';

/**
 * Sends an assembly's files to be rolled up by the server.
 *
 * @param top path of the assembly's file among them
 * @param state one state alone; every state where left out
 * @returns its runs, or the faults of the files with the texts that have them
 */
export function upload(
  project: string,
  files: readonly ChosenFile[],
  top: string,
  state?: string,
): Promise<Uploaded> {
  const form = new FormData();
  form.append('paths', JSON.stringify(files.map(({ path }) => path)));
  form.append('top', top);
  if (state) form.append('state', state);
  // Names are in `paths`: a file's own name in the form would lose its folder.
  for (const { file } of files) form.append('files', file, file.name);
  return request('upload', { places: { project }, form });
}
