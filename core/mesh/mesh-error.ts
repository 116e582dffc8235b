/** A mesh file or mesh that cannot be used, as data: the reader of an assembly adds the place where it was named. */
export class MeshError extends Error {
  readonly code: MeshErrorCode;
  readonly hint: string | undefined;
  constructor(code: MeshErrorCode, message: string, hint?: string) {
    super(message);
    this.name = 'MeshError';
    this.code = code;
    this.hint = hint;
  }
}

export type MeshErrorCode =
  | 'MESH_EMPTY'
  | 'MESH_TRUNCATED'
  | 'MESH_NOT_FINITE'
  | 'MESH_FORMAT'
  | 'MESH_OPEN'
  | 'MESH_FLIPPED'
  | 'MESH_NO_VOLUME'
  | 'MESH_TOO_LARGE';

/** The most triangles a mesh may have: an edge and its triangle must pack into one exact double (26 bits each). */
export const TRIANGLES_AT_MOST = 20_000_000;

/** @throws MeshError MESH_TOO_LARGE */
export function refuseTooLarge(triangles: number): void {
  if (triangles <= TRIANGLES_AT_MOST) return;
  throw new MeshError(
    'MESH_TOO_LARGE',
    `the mesh has ${triangles} triangles; at most ${TRIANGLES_AT_MOST} can be read.`,
    'export it with a coarser tolerance',
  );
}
