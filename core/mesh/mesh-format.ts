import { HEADER, promisedTriangles, RECORD } from './stl-binary.ts';

export type MeshFormat = 'STL binary' | 'STL ASCII' | 'OBJ';

/** What a file that is no mesh seems to be, by how it begins. */
const OTHERS: readonly (readonly [string, string])[] = [
  ['\x89PNG', 'a PNG picture'],
  ['\xff\xd8\xff', 'a JPEG picture'],
  ['GIF8', 'a GIF picture'],
  ['%PDF', 'a PDF document'],
  ['PK\x03\x04', 'a zip archive (a 3MF file is one)'],
  ['\x1f\x8b', 'a gzip archive'],
  ['7z\xbc\xaf', 'a 7-Zip archive'],
  ['iso-10303-21', 'a STEP file'],
  ['version https://git-lfs', 'a Git LFS pointer: the file itself was not fetched'],
  ['<!doctype html', 'a web page'],
  ['<html', 'a web page'],
  ['<?xml', 'an XML file'],
  ['<', 'an XML file'],
  ['ply', 'a PLY mesh'],
  ['off', 'an OFF mesh'],
  ['gltf', 'a glTF mesh'],
  ['{', 'a JSON file'],
  ['\xd0\xcf\x11\xe0', 'a CAD or office file'],
];

const OBJ_WORDS = new Set(['v', 'vt', 'vn', 'vp', 'f', 'o', 'g', 's', 'l', 'p', 'mtllib', 'usemtl', 'mg']);

/**
 * Tells the formats apart by content, not by the file's name. The length comes first: a binary STL whose 84 + 50 n bytes fit
 * is one, even if its header begins with "solid".
 *
 * @returns the format, or in `looksLike` what the file seems to be instead
 */
export function meshFormat(bytes: Uint8Array): { format: MeshFormat } | { looksLike: string } {
  if (bytes.length >= HEADER && bytes.length === HEADER + RECORD * promisedTriangles(bytes))
    return { format: 'STL binary' };
  const start = beginning(bytes);
  const other = OTHERS.find(([mark]) => start.startsWith(mark) || start.toLowerCase().startsWith(mark));
  if (other && !start.toLowerCase().startsWith('off ')) return { looksLike: other[1] };
  if (/^solid\b/i.test(start) && /\bfacet\b|\bendsolid\b/i.test(start)) return { format: 'STL ASCII' };
  if (isObj(start)) return { format: 'OBJ' };
  if (/^solid\b/i.test(start) && isText(start)) return { format: 'STL ASCII' };
  if (isText(start)) return { looksLike: 'some other text' };
  return bytes.length >= HEADER ? { format: 'STL binary' } : { looksLike: 'other data' };
}

/** The first kilobyte or four as Latin-1, after a byte-order mark and white space. */
function beginning(bytes: Uint8Array): string {
  let at = bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf ? 3 : 0;
  while (at < bytes.length && [9, 10, 13, 32].includes(bytes[at]!)) at++;
  let text = '';
  for (let i = at; i < Math.min(bytes.length, at + 4096); i++) text += String.fromCharCode(bytes[i]!);
  return text;
}

/** No control characters but tabs and line ends. */
function isText(start: string): boolean {
  for (let i = 0; i < start.length; i++) {
    const c = start.charCodeAt(i);
    if (c < 9 || (c > 13 && c < 32)) return false;
  }
  return true;
}

/** Whether the first line that is not a comment begins with one of the format's words. */
function isObj(start: string): boolean {
  if (!isText(start)) return false;
  const lines = start.split(/\r?\n/).map((line) => line.trim());
  const first = lines.find((line) => line !== '' && !line.startsWith('#'));
  return first === undefined
    ? start.startsWith('#')
    : OBJ_WORDS.has(first.split(/\s+/)[0]!) && /^\S+(\s|$)/.test(first);
}
