import { MeshError } from './mesh-error.ts';
import { printable, readCoordinate } from './stl-ascii.ts';
import { TextScanner } from './text-scanner.ts';
import { type RawMesh, TriangleSink } from './triangle-sink.ts';

const BYTES_A_FACE = 60;

/**
 * OBJ: `v x y z` and `f a b c …`, 1-based or negative from the end, `a/b/c` for the vertex alone; a face of more corners is a
 * fan from its first. Everything else is not read.
 *
 * @throws MeshError MESH_EMPTY, MESH_TRUNCATED, MESH_NOT_FINITE, MESH_FORMAT, MESH_TOO_LARGE
 */
export function readObj(bytes: Uint8Array): RawMesh {
  const scanner = new TextScanner(bytes);
  const sink = new TriangleSink(Math.ceil(bytes.length / BYTES_A_FACE));
  const listed: number[] = [];
  let faces = 0;
  while (scanner.next()) {
    if (scanner.is('v'))
      listed.push(sink.corner(readCoordinate(scanner), readCoordinate(scanner), readCoordinate(scanner)));
    else if (scanner.is('f')) {
      readFace(scanner, sink, listed);
      faces++;
    }
    scanner.skipLine();
  }
  if (faces === 0)
    throw new MeshError('MESH_EMPTY', `the file holds ${listed.length} vertices and no faces.`);
  return sink.finish();
}

function readFace(scanner: TextScanner, sink: TriangleSink, listed: readonly number[]): void {
  let first = -1;
  let last = -1;
  let corners = 0;
  while (scanner.nextOnLine()) {
    if (scanner.is('\\')) {
      scanner.skipLine();
      if (!scanner.next()) break;
    }
    const corner = readIndex(scanner, listed);
    if (corners === 0) first = corner;
    else if (corners > 1) sink.add(first, last, corner);
    last = corner;
    corners++;
  }
  if (corners < 3)
    throw new MeshError(
      'MESH_FORMAT',
      `line ${scanner.line}: a face of ${corners} corners; it needs three or more.`,
    );
}

function readIndex(scanner: TextScanner, listed: readonly number[]): number {
  const word = scanner.word();
  const slash = word.indexOf('/');
  const text = slash < 0 ? word : word.slice(0, slash);
  const index = /^[+-]?\d+$/.test(text) ? Number(text) : 0;
  const found = listed[index < 0 ? listed.length + index : index - 1];
  if (found !== undefined) return found;
  throw new MeshError(
    'MESH_FORMAT',
    `line ${scanner.line}: the face names vertex "${printable(text)}"; ${listed.length} vertices are listed before it.`,
  );
}
