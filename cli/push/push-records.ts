import { type Context, tell } from '../commands/context.ts';
import { addressed } from './addressed.ts';
import { Client } from './client.ts';
import { InterruptWatch } from './interrupt.ts';
import { keep } from './keep.ts';
import type { Outgoing } from './outgoing.ts';
import type { Packed } from './pack.ts';
import { Patience } from './patience.ts';
import { count, report } from './report.ts';
import { send } from './send.ts';
import type { Settings } from './settings.ts';
import { Tray } from './tray.ts';
import { trayFolder } from './user-folders.ts';

/** `run --push`: these records into the tray, from there to the server; what waits from before is told of. */
export async function pushRecords(
  parcels: readonly Packed[],
  settings: Settings,
  context: Context,
): Promise<void> {
  const tray = new Tray(trayFolder(context.io.env));
  const keys = await deliver(parcels, () => [], settings, tray, context);
  const before = waitingIn(tray, keys);
  if (before > 0 && !context.quiet)
    context.io.err(`${count(before)} waiting in the tray from before; \`steelyard push\` sends what waits\n`);
}

/**
 * Puts records in the tray and sends them, with others of the tray. All that can end is in the outcome that is
 * reported; Ctrl-C leaves the tray whole.
 *
 * @param others asked for when the new ones are in the tray
 * @returns keys of the new ones
 */
export async function deliver(
  parcels: readonly Packed[],
  others: () => readonly Outgoing[],
  settings: Settings,
  tray: Tray,
  context: Context,
): Promise<Set<string>> {
  const watch = new InterruptWatch(context.io);
  try {
    const { items: fresh, notKept } = keep(addressed(parcels, settings), tray);
    if (notKept) {
      const { reportFaults } = await import('../program.ts');
      reportFaults([notKept], context);
    }
    const keys = new Set(fresh.map(({ about }) => about.key));
    const items = [...others().filter(({ about }) => !keys.has(about.key)), ...fresh];
    watch.items = items;
    if (items.length > 0) tell(context, `sending ${count(items.length)} to ${settings.server}`);
    const client = new Client(settings, new Patience(settings.retries, context.io.env));
    const outcome = await send(items, client, (text) => tell(context, text));
    await report(outcome, settings, tray, context);
    return keys;
  } finally {
    watch.stop();
  }
}

/** Records of other pushes that nobody is sending. */
function waitingIn(tray: Tray, keys: ReadonlySet<string>): number {
  try {
    return tray.list('waiting').filter((item) => !keys.has(item.about.key) && !tray.isBeingSent(item)).length;
  } catch {
    return 0;
  }
}
