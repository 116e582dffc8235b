// Triangle meshes: read, judged, and integrated to bodies of unit density.
export { areaBody } from './area-body.ts';
export type { Extent } from './extent.ts';
export { type MeshBody, type MeshReport, meshShell, meshSolid } from './mesh-body.ts';
export { MeshError, type MeshErrorCode, TRIANGLES_AT_MOST } from './mesh-error.ts';
export type { MeshFormat } from './mesh-format.ts';
export { type Mesh, type ReadOptions, readMesh } from './read-mesh.ts';
export { type TriangleMesh, volumeBody } from './volume-body.ts';
