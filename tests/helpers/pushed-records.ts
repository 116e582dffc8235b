import { loadProject } from '#core/model/load-project.ts';
import { buildRecord } from '#core/record/build-record.ts';
import type { Provenance, RollUpRecord } from '#core/record/record.ts';
import { rollUp } from '#core/rollup/roll-up.ts';
import { sha256 } from '#server/services/secrets.ts';
import { MemorySource } from './memory-source.ts';

/** Records of every state of a text, as the command would push them. */
export function recordsOfText(text: string, provenance: Partial<Provenance> = {}): RollUpRecord[] {
  const project = loadProject('rover.yaml', new MemorySource(new Map([['rover.yaml', text]])));
  return project.root.states.map((state) =>
    buildRecord(
      rollUp(project, { state: state.name }),
      { tool: 'steelyard test', at: '2026-11-01T10:00:00.000Z', ...provenance },
      sha256,
    ),
  );
}

/** The body of a push: records without the texts of their inputs. */
export const pushBody = (records: readonly RollUpRecord[], key = 'key-of-the-test') => ({
  runs: records.map((record) => ({
    key,
    record: { ...record, inputs: record.inputs.map(({ text: _, ...input }) => input) },
  })),
});
