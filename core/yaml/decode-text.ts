import { InputError } from '../errors.ts';
import { LineTable } from './line-table.ts';

/** The largest text that is read, in bytes of UTF-8. */
export const BYTES_AT_MOST = 32 * 1024 * 1024;

/**
 * Decodes a file's bytes as UTF-8; a byte order mark is dropped.
 *
 * @throws InputError TEXT_TOO_LARGE, TEXT_NOT_UTF8 (with the place of the first wrong byte)
 */
export function decodeText(bytes: Uint8Array, file: string): string {
  refuseTooLarge(bytes.length, file);
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    throw notUtf8(bytes, file);
  }
}

/** @throws InputError TEXT_TOO_LARGE */
export function refuseTooLarge(byteLength: number, file: string): void {
  if (byteLength <= BYTES_AT_MOST) return;
  throw new InputError([
    {
      code: 'TEXT_TOO_LARGE',
      message: `the file is ${megabytes(byteLength)} MiB; at most ${megabytes(BYTES_AT_MOST)} MiB are read`,
      at: { file, line: 1, column: 1 },
      hint: 'split the assembly with "include"; meshes belong in files of their own',
    },
  ]);
}

function megabytes(byteLength: number): string {
  const inMiB = byteLength / (1024 * 1024);
  return Number.isInteger(inMiB) ? String(inMiB) : (Math.ceil(inMiB * 10) / 10).toFixed(1);
}

function notUtf8(bytes: Uint8Array, file: string): InputError {
  const good = new TextDecoder('utf-8').decode(bytes.subarray(0, longestGoodPrefix(bytes)));
  const isUtf16 = (bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff);
  return new InputError([
    {
      code: 'TEXT_NOT_UTF8',
      message: isUtf16
        ? 'the file is UTF-16, not UTF-8'
        : 'the file is not UTF-8: a byte here belongs to no character',
      at: { file, ...new LineTable(good).placeOf(good.length) },
      hint: 'save the file as UTF-8',
    },
  ]);
}

/** The number of bytes before the first wrong one, by halving: a prefix is good when it decodes as a stream. */
function longestGoodPrefix(bytes: Uint8Array): number {
  let good = 0;
  let bad = bytes.length;
  while (bad - good > 1) {
    const middle = (good + bad) >> 1;
    if (decodesSoFar(bytes.subarray(0, middle))) good = middle;
    else bad = middle;
  }
  while (good > 0 && (bytes[good - 1]! & 0xc0) !== 0 && !decodesWhole(bytes.subarray(0, good))) good -= 1;
  return good;
}

function decodesSoFar(bytes: Uint8Array): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes, { stream: true });
    return true;
  } catch {
    return false;
  }
}

function decodesWhole(bytes: Uint8Array): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    return true;
  } catch {
    return false;
  }
}
