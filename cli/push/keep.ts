import type { Fault } from '#core/errors.ts';
import { whyNotWritten } from '../io.ts';
import { Loose } from './loose.ts';
import type { About, Outgoing } from './outgoing.ts';
import type { Packed } from './pack.ts';
import type { Tray } from './tray.ts';

/**
 * Puts records in the tray before anything is sent. Where the disk does not take them they are sent from memory, and
 * the fault says that nothing is kept.
 */
export function keep(
  parcels: readonly { about: About; packed: Packed }[],
  tray: Tray,
): { items: readonly Outgoing[]; notKept: Fault | null } {
  try {
    tray.tidy();
    return { items: tray.put(parcels), notKept: null };
  } catch (error) {
    return {
      items: parcels.map(({ about, packed }) => new Loose(about, packed)),
      notKept: {
        code: 'TRAY_NOT_KEPT',
        message: `expected to keep ${parcels.length === 1 ? 'the record' : `${parcels.length} records`} in ${tray.root} until sent, found that ${whyNotWritten(error)}`,
        hint: 'sent all the same, but nothing is kept should that fail; make room, or set STEELYARD_TRAY to another folder',
      },
    };
  }
}
