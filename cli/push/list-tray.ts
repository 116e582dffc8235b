import { InputError } from '#core/errors.ts';
import type { Context } from '../commands/context.ts';
import { createInk } from '../output/ink.ts';
import { Sheet } from '../output/sheet.ts';
import type { Kept } from './kept.ts';
import { shortId } from './outgoing.ts';
import { count } from './report.ts';
import { Tray } from './tray.ts';
import { trayFolder } from './user-folders.ts';

export interface TrayOptions {
  format?: 'table' | 'json';
  drop: string[];
  again: string[];
  evenWaiting?: boolean;
}

interface Row {
  readonly item: Kept;
  readonly where: 'waiting' | 'sending' | 'refused';
}

/** `steelyard tray`: what waits and why, what was refused and why; `--drop` and `--again` for the refused. */
export function showTray(options: TrayOptions, context: Context): void {
  const tray = new Tray(trayFolder(context.io.env));
  const rows = rowsOf(tray);
  if (options.drop.length > 0 || options.again.length > 0) {
    change(rows, options, context);
    return;
  }
  const format = options.format ?? (context.io.outIsTerminal ? 'table' : 'json');
  context.io.out(format === 'json' ? asJson(rows) : asTable(rows, tray, context));
}

const rowsOf = (tray: Tray): Row[] => [
  ...tray
    .list('waiting')
    .map((item): Row => ({ item, where: tray.isBeingSent(item) ? 'sending' : 'waiting' })),
  ...tray.list('refused').map((item): Row => ({ item, where: 'refused' })),
];

/** Everything is looked up before anything is changed. */
function change(rows: readonly Row[], { drop, again, evenWaiting }: TrayOptions, context: Context): void {
  const dropped = drop.map((id) => refusedBy(id, rows, evenWaiting === true));
  const retried = again.map((id) => refusedBy(id, rows, false));
  for (const item of dropped) item.done();
  for (const item of retried) item.waitAgain();
  if (context.quiet) return;
  if (dropped.length > 0) context.io.err(`${count(dropped.length)} dropped\n`);
  if (retried.length > 0)
    context.io.err(`${count(retried.length)} waiting again; \`steelyard push\` sends what waits\n`);
}

function refusedBy(id: string, rows: readonly Row[], evenWaiting: boolean): Kept {
  const named = rows.filter(({ item }) => item.about.key.startsWith(id));
  const [row] = named;
  if (id.length < 4 || named.length !== 1)
    throw fault(
      `expected the id of one record in the tray, found ${named.length === 0 ? 'none' : named.length} for '${id}'`,
      '`steelyard tray` lists them; four letters or more of one will do',
    );
  if (row!.where !== 'refused' && !evenWaiting)
    throw fault(
      `expected a refused record, found that ${id} waits to be sent`,
      '`steelyard push` sends it; `--drop` takes --even-waiting to lose it all the same',
    );
  return row!.item;
}

const fault = (message: string, hint: string): InputError =>
  new InputError([{ code: 'CALL_TRAY_ID', message, hint }]);

function asJson(rows: readonly Row[]): string {
  const list = rows.map(({ item: { about }, where }) => ({
    id: about.key,
    where,
    assembly: about.assembly,
    state: about.state,
    commit: about.commit,
    at: about.at,
    server: about.server,
    project: about.project,
    why: about.why,
  }));
  return `${JSON.stringify(list, null, 2)}\n`;
}

function asTable(rows: readonly Row[], tray: Tray, context: Context): string {
  const ink = createInk({ colour: context.colour, unicode: context.unicode });
  const sheet = new Sheet(ink, Math.max(60, Math.min(context.io.columns ?? 80, 120)));
  if (rows.length === 0) {
    sheet.say(`Nothing waits in the tray, ${tray.root}.`);
    return sheet.text();
  }
  sheet.head('Tray', count(rows.length));
  for (const { item, where } of rows) {
    const { about } = item;
    const commit = about.commit ? ` · commit ${about.commit.slice(0, 8)}` : '';
    const paint = where === 'refused' ? ink.outside : undefined;
    sheet.say(`${shortId(about)}  ${where}  ${about.assembly}, ${about.state}`, { paint, hang: 10 });
    sheet.say(
      `${about.at.slice(0, 16).replace('T', ' ')} UTC${commit} · ${about.project} on ${about.server}`,
      {
        indent: 10,
      },
    );
    const why = about.why
      ? `${about.why.code}: ${about.why.message}${about.why.hint ? ` (${about.why.hint})` : ''}`
      : 'not tried yet';
    sheet.say(why, { indent: 10 });
  }
  return sheet.text();
}
