import { MeshError } from './mesh-error.ts';
import { TextScanner } from './text-scanner.ts';
import { type RawMesh, TriangleSink } from './triangle-sink.ts';

/** Bytes of one facet as most programs write it: a guess at the number of triangles. */
const BYTES_A_FACET = 200;

/**
 * ASCII STL: `facet … outer loop, three times vertex x y z, endloop, endfacet`, one or more solids to a file. Normals and
 * names are not read.
 *
 * @throws MeshError MESH_EMPTY, MESH_TRUNCATED, MESH_NOT_FINITE, MESH_FORMAT, MESH_TOO_LARGE
 */
export function readStlAscii(bytes: Uint8Array): RawMesh {
  const scanner = new TextScanner(bytes);
  const sink = new TriangleSink(Math.ceil(bytes.length / BYTES_A_FACET));
  const corners = [0, 0, 0];
  let facets = 0;
  let whole = 0;
  let count = 0;
  let open = false;
  while (scanner.next()) {
    if (scanner.is('vertex')) {
      if (!open || count === 3) throw unexpected(scanner, 'a vertex outside a facet of three');
      corners[count++] = readCorner(scanner, sink);
    } else if (scanner.is('facet')) {
      if (open) throw unexpected(scanner, 'a facet inside another');
      open = true;
      count = 0;
      facets++;
      scanner.skipLine();
    } else if (scanner.is('endfacet')) {
      if (!open || count !== 3) throw unexpected(scanner, `a facet with ${count} vertices`);
      open = false;
      whole++;
      sink.add(corners[0]!, corners[1]!, corners[2]!);
    } else if (scanner.is('solid') || scanner.is('endsolid')) scanner.skipLine();
    else if (scanner.atEnd) throw cutShort(facets, whole);
    else if (!scanner.is('outer') && !scanner.is('loop') && !scanner.is('endloop'))
      throw unexpected(scanner, `"${printable(scanner.word())}"`);
  }
  if (open) throw cutShort(facets, whole);
  if (whole === 0) throw new MeshError('MESH_EMPTY', 'the file holds no triangles.');
  return sink.finish();
}

const cutShort = (facets: number, whole: number): MeshError =>
  new MeshError(
    'MESH_TRUNCATED',
    `the file ends in the middle: it begins ${facets} triangles and ${whole} of them are whole.`,
    'export or copy the file again',
  );

function readCorner(scanner: TextScanner, sink: TriangleSink): number {
  const x = readCoordinate(scanner);
  const y = readCoordinate(scanner);
  const z = readCoordinate(scanner);
  return sink.corner(x, y, z);
}

/** The next word as a finite number. @throws MeshError MESH_TRUNCATED, MESH_FORMAT, MESH_NOT_FINITE */
export function readCoordinate(scanner: TextScanner): number {
  if (!scanner.nextOnLine())
    throw new MeshError('MESH_TRUNCATED', `line ${scanner.line} ends before the third coordinate.`);
  const value = scanner.number();
  if (Number.isFinite(value)) return value;
  const word = printable(scanner.word());
  if (Number.isNaN(value) && !/^[+-]?(nan|inf)/i.test(word))
    throw new MeshError('MESH_FORMAT', `line ${scanner.line}: "${word}" is not a number.`);
  throw new MeshError('MESH_NOT_FINITE', `line ${scanner.line}: "${word}" is not a finite number.`);
}

const unexpected = (scanner: TextScanner, what: string): MeshError =>
  new MeshError('MESH_FORMAT', `line ${scanner.line} of this ASCII STL file has ${what}.`);

/** Control characters and bytes above 126 as question marks. */
export const printable = (text: string): string => text.replace(/[^ -~]/g, '?');
