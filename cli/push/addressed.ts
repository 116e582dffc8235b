import { randomUUID } from 'node:crypto';
import { sha256 } from '../project/disk-source.ts';
import type { About } from './outgoing.ts';
import type { Packed } from './pack.ts';
import type { Settings } from './settings.ts';

/** What goes with records that are put on their way now, in their order. */
export function addressed(
  parcels: readonly Packed[],
  { server, project }: Settings,
): { about: About; packed: Packed }[] {
  const at = new Date().toISOString();
  return parcels.map((packed, turn) => {
    const { record, json, inputs } = packed;
    const about: About = {
      schema: 'steelyard-tray/1',
      key: randomUUID(),
      server,
      project,
      at,
      turn,
      assembly: record.assembly,
      state: record.state,
      commit: record.provenance.commit ?? null,
      same: sha256(json),
      inputs: inputs.map(({ path, sha256: hash, isText, bytes }) => ({
        path,
        sha256: hash,
        isText,
        found: bytes !== null,
      })),
      why: null,
    };
    return { about, packed };
  });
}
