import { MeshError, refuseTooLarge } from './mesh-error.ts';
import { type RawMesh, TriangleSink } from './triangle-sink.ts';

export const HEADER = 84;
export const RECORD = 50;

/** Triangles that the header of a binary STL promises (bytes 80 to 83, little-endian). */
export const promisedTriangles = (bytes: Uint8Array): number => viewOf(bytes).getUint32(80, true);

/**
 * Binary STL: 80 bytes of any text, a count, then 50 bytes a triangle: a normal, which is not read, three corners in single
 * precision, two spare bytes.
 *
 * @param bytes at least 84
 * @throws MeshError MESH_EMPTY, MESH_TRUNCATED, MESH_NOT_FINITE, MESH_TOO_LARGE
 */
export function readStlBinary(bytes: Uint8Array): RawMesh {
  const promised = promisedTriangles(bytes);
  const found = Math.floor((bytes.length - HEADER) / RECORD);
  if (promised > found)
    throw new MeshError(
      'MESH_TRUNCATED',
      `the file promises ${promised} triangles and holds ${found} of them.`,
      'export or copy the file again',
    );
  if (promised === 0) throw new MeshError('MESH_EMPTY', 'the file holds no triangles.');
  refuseTooLarge(promised);
  const sink = new TriangleSink(promised);
  const view = viewOf(bytes);
  for (let t = 0, at = HEADER + 12; t < promised; t++, at += RECORD) {
    const ax = view.getFloat32(at, true);
    const ay = view.getFloat32(at + 4, true);
    const az = view.getFloat32(at + 8, true);
    const bx = view.getFloat32(at + 12, true);
    const by = view.getFloat32(at + 16, true);
    const bz = view.getFloat32(at + 20, true);
    const cx = view.getFloat32(at + 24, true);
    const cy = view.getFloat32(at + 28, true);
    const cz = view.getFloat32(at + 32, true);
    // Nine single-precision numbers cannot overflow a double: their sum of magnitudes is finite when each of them is.
    const all =
      Math.abs(ax) +
      Math.abs(ay) +
      Math.abs(az) +
      Math.abs(bx) +
      Math.abs(by) +
      Math.abs(bz) +
      Math.abs(cx) +
      Math.abs(cy) +
      Math.abs(cz);
    if (!(all < Infinity))
      throw new MeshError(
        'MESH_NOT_FINITE',
        `triangle ${t + 1} has a coordinate that is not a finite number.`,
      );
    sink.add(sink.corner(ax, ay, az), sink.corner(bx, by, bz), sink.corner(cx, cy, cz));
  }
  return sink.finish();
}

const viewOf = (bytes: Uint8Array): DataView =>
  new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
