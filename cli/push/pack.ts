import { INPUT_BYTES_AT_MOST } from '#core/api/push.ts';
import { InputError } from '#core/errors.ts';
import type { InputRecord, RollUpRecord } from '#core/record/record.ts';
import { sha256 } from '../project/disk-source.ts';

/** An input on its way to the server. */
export interface PackedInput {
  readonly path: string;
  readonly sha256: string;
  readonly isText: boolean;
  /** What is sent; null where it was not found, and the record goes without it. */
  readonly bytes: Uint8Array | null;
}

/** A record ready to send: its JSON with the texts taken out of it, and they beside it. */
export interface Packed {
  readonly record: RollUpRecord;
  readonly json: string;
  readonly inputs: readonly PackedInput[];
}

/** Bytes of an input that a record holds by its hash alone; null where they are not to be had. */
export type FindInput = (input: InputRecord) => Uint8Array | null;

/**
 * Takes a record apart for the wire.
 *
 * @throws InputError RECORD_INPUT where a text is not the one that the record's hash was taken of
 */
export function pack(record: RollUpRecord, find: FindInput): Packed {
  const inputs = record.inputs.map((input): PackedInput => {
    const { path, sha256: hash, text, bytes } = input;
    const isText = bytes === undefined;
    if (text === undefined) return { path, sha256: hash, isText, bytes: withinSize(find(input)) };
    if (sha256(text) !== hash) throw changedText(record, path);
    return { path, sha256: hash, isText: true, bytes: withinSize(Buffer.from(text)) };
  });
  const bare = { ...record, inputs: record.inputs.map(({ text: _, ...input }) => input) };
  return { record, json: JSON.stringify(bare), inputs };
}

const withinSize = (bytes: Uint8Array | null): Uint8Array | null =>
  bytes && bytes.length <= INPUT_BYTES_AT_MOST ? bytes : null;

const changedText = ({ assembly, state }: RollUpRecord, path: string): InputError =>
  new InputError([
    {
      code: 'RECORD_INPUT',
      message: `expected the text of ${path} in the record of ${assembly}, ${state}, as it was rolled up, found another one`,
      hint: 'the record was changed by hand: run the assembly again',
    },
  ]);
