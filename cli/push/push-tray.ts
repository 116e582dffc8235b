import { existsSync } from 'node:fs';
import { InputError } from '#core/errors.ts';
import { plainText } from '#core/figures/index.ts';
import type { Context } from '../commands/context.ts';
import { readRecordFile } from '../commands/load-side.ts';
import { EXIT } from '../exit-status.ts';
import { sha256 } from '../project/disk-source.ts';
import { findIn, sourcesBeside } from './find-input.ts';
import type { Kept } from './kept.ts';
import { type Packed, pack } from './pack.ts';
import { deliver } from './push-records.ts';
import { count } from './report.ts';
import { type PushOptions, readSettings, type Settings } from './settings.ts';
import { Tray } from './tray.ts';
import { trayFolder } from './user-folders.ts';

/** `steelyard push`: records of files into the tray, and all that waits there for this server and project out of it. */
export async function pushTray(
  files: readonly string[],
  options: PushOptions & { redirect?: boolean },
  context: Context,
): Promise<void> {
  const tray = new Tray(trayFolder(context.io.env));
  if (files.length === 0 && tray.list('waiting').length === 0) {
    if (!context.quiet) context.io.err('nothing waits in the tray\n');
    return;
  }
  const settings = readSettings(options, context.io.env);
  const parcels = files.flatMap((file) => packFile(file));
  const fresh = parcels.filter((packed) => !isInTray(packed, tray, settings));
  let aside: Kept[] = [];
  const others = () => {
    const waiting = tray.list('waiting');
    const isForHere = ({ about }: Kept) =>
      options.redirect || (about.server === settings.server && about.project === settings.project);
    aside = waiting.filter((item) => !isForHere(item));
    return waiting.filter(isForHere);
  };
  await deliver(fresh, others, settings, tray, context);
  if (aside.length === 0) return;
  const places = [...new Set(aside.map(({ about }) => `${about.project} on ${about.server}`))];
  context.io.err(
    plainText(
      `${count(aside.length)} waiting for project ${places.join(', and ')}: push with that server and project, or --redirect`,
    ).concat('\n'),
  );
  if (context.status === EXIT.fine) context.status = EXIT.unsent;
}

function packFile(file: string): Packed[] {
  if (!existsSync(file))
    throw new InputError([
      {
        code: 'FILE_MISSING',
        message: `expected a file of records, found none at ${file}`,
        hint: 'records are what `steelyard run --format json` prints; `steelyard run FILE --push` does both',
      },
    ]);
  const find = findIn(sourcesBeside(file));
  return readRecordFile(file).map((record) => pack(record, find));
}

/** The same record given once more is sent under the key that it waits with; one that was refused gets another try. */
function isInTray({ json }: Packed, tray: Tray, { server, project }: Settings): boolean {
  const same = sha256(json);
  const isTwin = ({ about }: Kept) =>
    about.same === same && about.server === server && about.project === project;
  if (tray.list('waiting').some(isTwin)) return true;
  const refused = tray.list('refused').find(isTwin);
  refused?.waitAgain();
  return refused !== undefined;
}
