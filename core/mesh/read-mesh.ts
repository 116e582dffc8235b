import { dropUnused } from './drop-unused.ts';
import { MeshError } from './mesh-error.ts';
import { type MeshFormat, meshFormat } from './mesh-format.ts';
import { readObj } from './obj.ts';
import { readStlAscii } from './stl-ascii.ts';
import { readStlBinary } from './stl-binary.ts';
import type { RawMesh } from './triangle-sink.ts';
import type { TriangleMesh } from './volume-body.ts';
import { weldNear } from './weld-near.ts';

/** A mesh in metres, as its file gives it: not yet known to be closed. */
export interface Mesh extends TriangleMesh {
  readonly format: MeshFormat;
  /** Metres per unit of the file; faults speak in that unit. */
  readonly unit: number;
  /** Triangles left out because two of their corners are one point. */
  readonly dropped: number;
}

export interface ReadOptions {
  /** Metres per unit of the file: 0.001 for millimetres. */
  readonly unit: number;
  /** Corners closer than this are one [m]; exact equality where left out. */
  readonly weld?: number;
}

const READERS: Record<MeshFormat, (bytes: Uint8Array) => RawMesh> = {
  'STL binary': readStlBinary,
  'STL ASCII': readStlAscii,
  OBJ: readObj,
};

/**
 * Reads a triangle mesh, telling the format by content. Equal corners become one vertex, −0 is +0.
 *
 * @returns vertices in metres, in the file's axes
 * @throws MeshError MESH_EMPTY, MESH_TRUNCATED, MESH_NOT_FINITE, MESH_FORMAT, MESH_TOO_LARGE
 */
export function readMesh(bytes: Uint8Array, options: ReadOptions): Mesh {
  if (bytes.length === 0) throw new MeshError('MESH_EMPTY', 'the file is empty.');
  const found = meshFormat(bytes);
  if ('looksLike' in found)
    throw new MeshError(
      'MESH_FORMAT',
      `the file is not an STL or OBJ mesh: it looks like ${found.looksLike}.`,
      'export the part as STL or OBJ',
    );
  const raw = dropUnused(weldNear(READERS[found.format](bytes), (options.weld ?? 0) / options.unit));
  if (raw.triangles.length === 0)
    throw new MeshError('MESH_EMPTY', `all ${raw.dropped} triangles of the file are collapsed.`);
  return {
    format: found.format,
    unit: options.unit,
    vertices: toMetres(raw.vertices, options.unit),
    triangles: raw.triangles,
    dropped: raw.dropped,
  };
}

/**
 * Scales in place. A unit that is one part of a whole number (mm, µm) divides by that number, which rounds once: 1.5 mm is the
 * double nearest to 0.0015.
 *
 * @throws MeshError MESH_NOT_FINITE where a coordinate leaves the range of doubles
 */
function toMetres(vertices: Float64Array, unit: number): Float64Array {
  const parts = Math.round(1 / unit);
  const divides = unit < 1 && 1 / parts === unit;
  if (unit !== 1)
    for (let i = 0; i < vertices.length; i++)
      vertices[i] = divides ? vertices[i]! / parts : vertices[i]! * unit;
  // Squares and cubes of sizes must stay finite: fifth powers of 1e60 do.
  for (let i = 0; i < vertices.length; i++)
    if (!(Math.abs(vertices[i]!) < 1e60))
      throw new MeshError('MESH_NOT_FINITE', `a coordinate of ${vertices[i]! / unit} is beyond any machine.`);
  return vertices;
}
