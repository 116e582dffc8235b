import { describe, expect, it } from 'vitest';
import { MeshError, meshShell, meshSolid, readMesh } from '../../../core/mesh/index.ts';
import { box } from '../../../core/solids/blocks.ts';
import { plate } from '../../../core/solids/thin.ts';
import {
  blockMesh,
  joinMeshes,
  objText,
  type PlainMesh,
  stlBinary,
  TETRAHEDRON,
  turnedOver,
  without,
} from '../../helpers/build-mesh.ts';
import { tetrahedra, toBody } from '../../helpers/exact-body.ts';
import { expectBody, expectClose } from '../../helpers/expect-body.ts';

const solid = (mesh: PlainMesh) => meshSolid(readMesh(objText(mesh), { unit: 1 }));
const shell = (mesh: PlainMesh) => meshShell(readMesh(objText(mesh), { unit: 1 }));
const codes = (notes: readonly { code: string }[]) => notes.map((note) => note.code);

function fault(mesh: PlainMesh, unit = 1): MeshError {
  try {
    meshSolid(readMesh(stlBinary(mesh), { unit }));
  } catch (error) {
    if (error instanceof MeshError) return error;
    throw error;
  }
  throw new Error('the mesh was taken');
}

const BIG = blockMesh([4, 3, 2]);
const INNER = blockMesh([1, 0.5, 0.25], [1, 1, 1]);

describe('a closed mesh as a solid', () => {
  it('has the volume, centre and second moments of exact integration, three products included', () => {
    const corners = TETRAHEDRON.triangles.map((t) => t.map((v) => TETRAHEDRON.vertices[v]!));
    const expected = toBody(tetrahedra(corners));
    expect(Math.min(...expected.secondMoments.map(Math.abs))).toBeGreaterThan(0.01);
    expectBody(solid(TETRAHEDRON).body, expected, 1e-14);
  });

  it('keeps its tensor a thousand kilometres from its origin', () => {
    const far = blockMesh([0.5, 0.25, 0.75], [1048576, -2097152, 524288]);
    const { body } = solid(far);
    expectClose(body.secondMoments, box(0.5, 0.25, 0.75).secondMoments, 1e-13, 'second moments');
    expect(body.centre).toEqual([1048576.25, -2097151.875, 524288.375]);
  });

  it('reports what it is', () => {
    const { report, notes } = solid(BIG);
    expect(notes).toEqual([]);
    expect(report).toMatchObject({
      triangles: 12,
      vertices: 8,
      shells: 1,
      voids: 0,
      openEdges: 0,
      dropped: 0,
    });
    expect(report.volume).toBeCloseTo(24, 12);
    expect(report.area).toBeCloseTo(52, 12);
    expect(report.extent).toEqual({ min: [0, 0, 0], max: [4, 3, 2] });
  });

  it('that is inside out is turned, with a note', () => {
    const { body, notes } = solid(turnedOver(BIG));
    expect(codes(notes)).toEqual(['MESH_TURNED']);
    expect(body.mass).toBeCloseTo(24, 12);
    expectBody(body, solid(BIG).body, 1e-14);
  });

  it('with an inner shell turned inward has a void', () => {
    const { body, report, notes } = solid(joinMeshes(BIG, turnedOver(INNER)));
    expect(notes).toEqual([]);
    expect(report).toMatchObject({ shells: 2, voids: 1 });
    expect(body.mass).toBeCloseTo(24 - 0.125, 12);
  });

  it('with a void is turned as a whole when all of it is inside out', () => {
    const hollow = joinMeshes(BIG, turnedOver(INNER));
    const { body, report, notes } = solid(turnedOver(hollow));
    expect(codes(notes)).toEqual(['MESH_TURNED']);
    expect(report.voids).toBe(1);
    expectBody(body, solid(hollow).body, 1e-13);
  });

  it('turns a shell that lies in no material and is inside out, and keeps the other', () => {
    const beside = blockMesh([1, 1, 1], [10, 0, 0]);
    const { body, notes, report } = solid(joinMeshes(BIG, turnedOver(beside)));
    expect(body.mass).toBeCloseTo(25, 12);
    expect(report.voids).toBe(0);
    expect(notes).toMatchObject([{ code: 'MESH_TURNED', message: expect.stringContaining('1 of the 2') }]);
  });

  it('does not take a block beside the body, within its bounding box, for a void', () => {
    // An L of two blocks joined along a face would need a union; a thin frame of its own shows the same: a ring around nothing.
    const hole = joinMeshes(
      blockMesh([4, 1, 1]),
      blockMesh([1, 2, 1], [0, 1, 0]),
      turnedOver(blockMesh([0.5, 0.5, 0.5], [2, 2, 0.25])),
    );
    const { body, notes } = solid(hole);
    expect(codes(notes)).toContain('MESH_TURNED');
    expect(body.mass).toBeCloseTo(4 + 2 + 0.125, 12);
  });

  it('a solid in the void of another is a solid', () => {
    const island = blockMesh([0.25, 0.25, 0.125], [1.25, 1.125, 1.0625]);
    const { body, report, notes } = solid(joinMeshes(BIG, turnedOver(INNER), island));
    expect(notes).toEqual([]);
    expect(report).toMatchObject({ shells: 3, voids: 1 });
    expect(body.mass).toBeCloseTo(24 - 0.125 + 0.0078125, 12);
  });

  it('says so when an outward shell lies inside another', () => {
    const { body, notes } = solid(joinMeshes(BIG, INNER));
    expect(codes(notes)).toEqual(['MESH_NESTED']);
    expect(body.mass).toBeCloseTo(24.125, 12);
  });

  it.each([
    ['along an edge', [4, 3, 0], 1],
    ['along a face', [4, 0, 0], 5],
  ] as const)('of two blocks that touch %s is both, with a note', (_, from, edges) => {
    const { body, notes, report } = solid(joinMeshes(BIG, blockMesh([4, 3, 2], from)));
    expect(codes(notes)).toEqual(['MESH_TOUCHING_EDGES']);
    expect(report.touchingEdges).toBe(edges);
    expect(body.mass).toBeCloseTo(48, 12);
  });

  it('of two blocks touching along an edge turns the one that is inside out', () => {
    const { body, notes } = solid(joinMeshes(BIG, turnedOver(blockMesh([4, 3, 2], [4, 3, 0]))));
    expect(codes(notes)).toEqual(['MESH_TURNED', 'MESH_TOUCHING_EDGES']);
    expect(body.mass).toBeCloseTo(48, 12);
  });
});

describe('a mesh that cannot be a solid', () => {
  it('with a triangle missing is MESH_OPEN: three edges and their middles in the file unit', () => {
    const error = fault(without(blockMesh([4, 3, 2]), 0), 0.001);
    expect(error.code).toBe('MESH_OPEN');
    expect(error.message).toContain('3 edges have a side missing');
    for (const middle of ['(0, 1.5, 0)', '(2, 3, 0)', '(2, 1.5, 0)']) expect(error.message).toContain(middle);
    expect(error.hint).toContain('thin shell');
  });

  it('with one triangle turned over is MESH_FLIPPED: its three edges', () => {
    const mesh = blockMesh([4, 3, 2]);
    const turned = turnedOver(mesh).triangles[6]!;
    const triangles = mesh.triangles.map((t, i) => (i === 6 ? turned : t));
    const error = fault({ ...mesh, triangles });
    expect(error.code).toBe('MESH_FLIPPED');
    expect(error.message).toContain('3 edges');
  });

  it('with a triangle given twice is not closed', () => {
    const mesh = blockMesh([4, 3, 2]);
    expect(fault({ ...mesh, triangles: [...mesh.triangles, mesh.triangles[3]!] }).code).toBe('MESH_OPEN');
  });

  it('of a sheet with two sides has no volume', () => {
    const sheet: PlainMesh = {
      vertices: [
        [0, 0, 0],
        [1, 0, 0],
        [0, 1, 0],
      ],
      triangles: [
        [0, 1, 2],
        [0, 2, 1],
      ],
    };
    expect(fault(sheet).code).toBe('MESH_NO_VOLUME');
  });
});

describe('a mesh as a thin shell', () => {
  it('of an open rectangle is the plate', () => {
    const sheet: PlainMesh = {
      vertices: [
        [-1.5, -1, 0],
        [1.5, -1, 0],
        [1.5, 1, 0],
        [-1.5, 1, 0],
      ],
      triangles: [
        [0, 1, 2],
        [0, 2, 3],
      ],
    };
    const { body, report } = shell(sheet);
    expectBody(body, plate(3, 2), 1e-14, 1);
    expect(report).toMatchObject({ openEdges: 4, volume: 0 });
  });

  it('of a block is its six faces, whichever way they are turned', () => {
    const { body } = shell(blockMesh([4, 3, 2], [-2, -1.5, -1]));
    // Faces ±x of 3 × 2, ±y of 4 × 2, ±z of 4 × 3: ∫ x² over each pair.
    const xx = 2 * 6 * 4 + (2 * 8 * 16) / 12 + (2 * 12 * 16) / 12;
    const yy = (2 * 6 * 9) / 12 + 2 * 8 * 2.25 + (2 * 12 * 9) / 12;
    const zz = (2 * 6 * 4) / 12 + (2 * 8 * 4) / 12 + 2 * 12;
    expectBody(body, { mass: 52, centre: [0, 0, 0], secondMoments: [xx, yy, zz, 0, 0, 0] }, 1e-14, 4);
    const turned = without(turnedOver(blockMesh([4, 3, 2], [-2, -1.5, -1])), 0);
    expect(shell(turned).body.mass).toBeCloseTo(52 - 6, 12);
  });
});
