import { describe, expect, it } from 'vitest';
import { decodeText } from '../../../core/yaml/decode-text.ts';
import { faultsOf, placesAndCodes, printed } from './faults-of.ts';

const encode = (text: string) => new TextEncoder().encode(text);
const faults = (bytes: Uint8Array) => faultsOf(() => decodeText(bytes, 'a.yaml'));

describe('decodeText', () => {
  it('decodes UTF-8 and drops a byte order mark', () => {
    expect(decodeText(encode('\ufeffé → 𝄞'), 'a.yaml')).toBe('é → 𝄞');
  });

  it('names the place of the first byte that belongs to no character', () => {
    const bytes = new Uint8Array([...encode('é: b\nc: 𝄞d'), 0xff, ...encode('e\n'), 0xff]);
    expect(placesAndCodes(faults(bytes))).toEqual(['2:7 TEXT_NOT_UTF8']);
  });

  it('names the place of a character cut off at the end', () => {
    expect(placesAndCodes(faults(encode('a: é').slice(0, -1)))).toEqual(['1:4 TEXT_NOT_UTF8']);
  });

  it('names the place of a character cut off in the middle', () => {
    const bytes = new Uint8Array([...encode('a: b'), 0xe2, 0x86, ...encode('c')]);
    expect(placesAndCodes(faults(bytes))).toEqual(['1:5 TEXT_NOT_UTF8']);
  });

  it('recognises UTF-16', () => {
    expect(printed(faults(new Uint8Array([0xff, 0xfe, 0x61, 0])))).toBe(
      'a.yaml:1:1 (1) TEXT_NOT_UTF8: the file is UTF-16, not UTF-8\n  hint: save the file as UTF-8',
    );
  });

  it('refuses a large file by its bytes, before decoding it', () => {
    expect(printed(faults(new Uint8Array(100 * 1024 * 1024)))).toMatchInlineSnapshot(`
      "a.yaml:1:1 (1) TEXT_TOO_LARGE: the file is 100 MiB; at most 32 MiB are read
        hint: split the assembly with "include"; meshes belong in files of their own"
    `);
  });
});
