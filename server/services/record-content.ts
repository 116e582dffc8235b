import { gunzipSync, gzipSync } from 'node:zlib';
import type { InputRecord, Provenance, RollUpRecord } from '#core/record/record.ts';
import { sha256 } from './secrets.ts';

/** What one stamp stands for: a record without its provenance and without the texts of its inputs. */
export type RecordContent = Omit<RollUpRecord, 'provenance' | 'inputs'> & {
  inputs: Omit<InputRecord, 'text'>[];
};

export function contentOf(record: RollUpRecord): RecordContent {
  const { provenance: _, inputs, ...rest } = record;
  return { ...rest, inputs: inputs.map(({ text: __, ...input }) => input) };
}

/** As it is kept: packed JSON, and a hash that does not depend on the order of keys. */
export function packContent(content: RecordContent): { content: Buffer; contentSha256: string } {
  return {
    content: gzipSync(JSON.stringify(content), { level: 4 }),
    contentSha256: sha256(JSON.stringify(sorted(content))),
  };
}

export const unpackContent = (packed: Buffer): RecordContent =>
  JSON.parse(gunzipSync(packed).toString('utf8')) as RecordContent;

/** The whole record again, without texts. */
export const recordOf = (content: RecordContent, provenance: Provenance): RollUpRecord => ({
  ...content,
  provenance,
});

function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (typeof value !== 'object' || value === null) return value;
  const entries = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1));
  return Object.fromEntries(entries.map(([key, v]) => [key, sorted(v)]));
}
