import type { InputRecord, ParameterRecord } from './record.ts';

/** SHA-256 of a text as UTF-8, lower-case hex. Given by the face, for the core has no I/O and no Node API. */
export type HashText = (text: string) => string;

/**
 * The stamp of a record: the hash of its inputs (by path and SHA-256, sorted by path), its state, its parameter values
 * and the core's version, as one canonical JSON text. Nothing of its provenance. One stamp, one record.
 */
export function stampOf(
  inputs: readonly InputRecord[],
  assembly: string,
  state: string,
  parameters: Readonly<Record<string, ParameterRecord>>,
  coreVersion: string,
  hash: HashText,
): string {
  const byPath = [...inputs].sort((a, b) => (a.path < b.path ? -1 : a.path > b.path ? 1 : 0));
  const byName = Object.entries(parameters).sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return hash(
    JSON.stringify({
      core: coreVersion,
      top: assembly,
      state,
      inputs: byPath.map(({ path, sha256 }) => [path, sha256]),
      parameters: byName.map(([name, { value }]) => [name, value]),
    }),
  );
}
