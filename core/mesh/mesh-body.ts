import type { Warning } from '../errors.ts';
import type { Body } from '../inertia/body.ts';
import { areaBody } from './area-body.ts';
import { type EdgeReport, examineEdges } from './edges.ts';
import type { Extent } from './extent.ts';
import { MeshError } from './mesh-error.ts';
import { orientShells, turnShells } from './orient-shells.ts';
import type { Mesh } from './read-mesh.ts';
import { type Shells, takeApart } from './shells.ts';
import { volumeBody } from './volume-body.ts';

/** What is known of a mesh once it is a body. */
export interface MeshReport {
  readonly format: string;
  readonly triangles: number;
  readonly vertices: number;
  /** Triangles left out because two of their corners are one point. */
  readonly dropped: number;
  /** Edge-connected surfaces, voids included. */
  readonly shells: number;
  readonly voids: number;
  /** Edges without a neighbour; more than none only in a thin mesh. */
  readonly openEdges: number;
  readonly touchingEdges: number;
  /** [m³]; 0 for a thin mesh */
  readonly volume: number;
  /** [m²] */
  readonly area: number;
  /** Bounding box [m], for a plausibility check of the unit. */
  readonly extent: Extent;
}

export interface MeshBody {
  /** Unit density (unit area density for a thin mesh), the mesh's own axes. */
  readonly body: Body;
  readonly report: MeshReport;
  readonly notes: readonly Warning[];
}

/**
 * A closed mesh as a solid body. Nothing is mended silently and no hull is taken: a gap or a flipped triangle is a fault,
 * a mesh that is inside out as a whole (or a shell of it that lies in no material) is turned with a note.
 *
 * @returns unit density: mass is the volume [m³], central Q [m⁵]
 * @throws MeshError MESH_OPEN, MESH_FLIPPED, MESH_NO_VOLUME
 */
export function meshSolid(mesh: Mesh): MeshBody {
  const edges = examineEdges(mesh);
  refuseOpen(mesh, edges);
  refuseFlipped(mesh, edges);
  const shells = takeApart(mesh, edges.shells);
  const { turned, voids, nested } = orientShells(mesh, shells);
  const body = volumeBody(turnShells(mesh, shells, turned));
  const extent = extentOf(mesh);
  refuseFlat(body.mass, extent);
  const notes = [...turnedNote(shells, turned), ...touchingNote(edges.touching), ...nestedNote(nested)];
  const report = {
    ...counts(mesh, edges, shells.count),
    voids,
    volume: body.mass,
    area: areaBody(mesh).mass,
    extent,
  };
  return { body, report, notes: [...notes, ...droppedNote(mesh.dropped)] };
}

/**
 * A mesh as a thin shell: its triangles alone, open or closed, turned either way.
 *
 * @returns unit area density: mass is the area [m²], central Q [m⁴]; the caller multiplies by thickness × density
 * @throws MeshError MESH_NO_VOLUME where the triangles have no area
 */
export function meshShell(mesh: Mesh): MeshBody {
  const edges = examineEdges(mesh);
  const body = areaBody(mesh);
  if (!(body.mass > 0))
    throw new MeshError('MESH_NO_VOLUME', 'the mesh has no area: each triangle is a line.');
  const report = {
    ...counts(mesh, edges, edges.shells.labels().count),
    voids: 0,
    volume: 0,
    area: body.mass,
    extent: extentOf(mesh),
  };
  return { body, report, notes: droppedNote(mesh.dropped) };
}

const counts = (mesh: Mesh, edges: EdgeReport, shells: number) => ({
  format: mesh.format,
  triangles: mesh.triangles.length / 3,
  vertices: mesh.vertices.length / 3,
  dropped: mesh.dropped,
  shells,
  openEdges: edges.open,
  touchingEdges: edges.touching,
});

function refuseOpen(mesh: Mesh, edges: EdgeReport): void {
  if (edges.open === 0) return;
  throw new MeshError(
    'MESH_OPEN',
    `the mesh is not closed: ${plural(edges.open, 'edge')} ${edges.open === 1 ? 'has' : 'have'} a side missing, at ${places(mesh, edges)} (middles, in the file's unit).`,
    'close the gaps where the mesh is made, weld corners that nearly meet, or take it as a thin shell with a thickness',
  );
}

function refuseFlipped(mesh: Mesh, edges: EdgeReport): void {
  if (edges.flipped === 0) return;
  throw new MeshError(
    'MESH_FLIPPED',
    `neighbouring triangles disagree about outside along ${plural(edges.flipped, 'edge')}, at ${places(mesh, edges)} (middles, in the file's unit).`,
    'make the normals agree where the mesh is made',
  );
}

/** A volume under this many eps of its box's size cubed is the rounding of the coordinates. */
const FLAT = 64 * Number.EPSILON;

function refuseFlat(volume: number, { min, max }: Extent): void {
  const size = Math.max(max[0] - min[0], max[1] - min[1], max[2] - min[2]);
  if (volume > FLAT * size * size * size) return;
  throw new MeshError(
    'MESH_NO_VOLUME',
    'the mesh is closed but encloses no volume.',
    'take it as a thin shell with a thickness if it is a sheet',
  );
}

const turnedNote = (shells: Shells, turned: ReadonlySet<number>): Warning[] =>
  turned.size === 0
    ? []
    : [
        {
          code: 'MESH_TURNED',
          message:
            turned.size === shells.count
              ? 'the mesh was inside out (its triangles face inward); it was turned as a whole.'
              : `${turned.size} of the ${shells.count} shells were inside out and lay in no material; they were turned.`,
        },
      ];

const touchingNote = (touching: number): Warning[] =>
  touching === 0
    ? []
    : [
        {
          code: 'MESH_TOUCHING_EDGES',
          message: `${plural(touching, 'edge')} ${touching === 1 ? 'is' : 'are'} shared by more than two triangles: solids that touch there.`,
        },
      ];

const nestedNote = (nested: number): Warning[] =>
  nested === 0
    ? []
    : [
        {
          code: 'MESH_NESTED',
          message: `${plural(nested, 'shell')} ${nested === 1 ? 'lies' : 'lie'} inside the material of another and ${nested === 1 ? 'looks' : 'look'} outward too: the volume counts twice. A void looks inward.`,
        },
      ];

const droppedNote = (dropped: number): Warning[] =>
  dropped === 0
    ? []
    : [
        {
          code: 'MESH_COLLAPSED_TRIANGLES',
          message: `${plural(dropped, 'triangle')} with two equal corners ${dropped === 1 ? 'was' : 'were'} left out.`,
        },
      ];

const plural = (count: number, word: string): string => `${count} ${word}${count === 1 ? '' : 's'}`;

/** "(1, 2, 0.5)" for the middle of each of the first few edges, in the file's unit to six digits. */
function places({ vertices, unit }: Mesh, { first, open, flipped }: EdgeReport): string {
  const named = first.map(([u, v]) => {
    const middle = [0, 1, 2].map((axis) =>
      Number(((vertices[3 * u + axis]! / 2 + vertices[3 * v + axis]! / 2) / unit).toPrecision(6)),
    );
    return `(${middle.join(', ')})`;
  });
  const all = open > 0 ? open : flipped;
  return all > named.length ? `${named.join(', ')} and elsewhere` : named.join(', ');
}

function extentOf({ vertices }: Mesh): Extent {
  const min: [number, number, number] = [Infinity, Infinity, Infinity];
  const max: [number, number, number] = [-Infinity, -Infinity, -Infinity];
  for (let i = 0; i < vertices.length; i++) {
    const axis = i % 3;
    const value = vertices[i]!;
    if (value < min[axis]!) min[axis] = value;
    if (value > max[axis]!) max[axis] = value;
  }
  return { min, max };
}
