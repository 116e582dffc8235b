import { describe, expect, it } from 'vitest';
import { MeshError, type MeshErrorCode, meshSolid, readMesh } from '../../../core/mesh/index.ts';
import {
  blockMesh,
  objText,
  type PlainMesh,
  stlAscii,
  stlBinary,
  TETRAHEDRON,
  text,
} from '../../helpers/build-mesh.ts';

const BLOCK = blockMesh([3, 2, 1], [0.5, -1, 0.25]);

function fault(bytes: Uint8Array): { code: MeshErrorCode; message: string } {
  try {
    readMesh(bytes, { unit: 1 });
  } catch (error) {
    if (error instanceof MeshError) return { code: error.code, message: error.message };
    throw error;
  }
  throw new Error('the mesh was read');
}

const plain = (bytes: Uint8Array, unit = 1): PlainMesh => {
  const mesh = readMesh(bytes, { unit });
  const triples = (list: ArrayLike<number>) =>
    Array.from({ length: list.length / 3 }, (_, i) => [list[3 * i]!, list[3 * i + 1]!, list[3 * i + 2]!]);
  return { vertices: triples(mesh.vertices), triangles: triples(mesh.triangles) } as unknown as PlainMesh;
};

describe('readMesh', () => {
  it('reads the same body from binary STL, ASCII STL and OBJ', () => {
    for (const mesh of [BLOCK, TETRAHEDRON]) {
      const [binary, ascii, obj] = [stlBinary(mesh), stlAscii(mesh), objText(mesh)].map((bytes) =>
        meshSolid(readMesh(bytes, { unit: 0.001 })),
      );
      expect(ascii!.body).toEqual(binary!.body);
      expect(obj!.body.mass).toBeCloseTo(binary!.body.mass, 22);
      expect([binary, ascii, obj].map((one) => one!.report.format)).toEqual([
        'STL binary',
        'STL ASCII',
        'OBJ',
      ]);
    }
  });

  it('takes a binary file whose header begins with "solid" for binary', () => {
    expect(readMesh(stlBinary(BLOCK, 'solid made by a program facet'), { unit: 1 }).format).toBe(
      'STL binary',
    );
  });

  it('reads a view into a larger buffer at an odd place', () => {
    const bytes = stlBinary(BLOCK);
    const larger = new Uint8Array(bytes.length + 20).fill(7);
    larger.set(bytes, 13);
    expect(plain(larger.subarray(13, 13 + bytes.length))).toEqual(plain(bytes));
  });

  it('welds equal corners, and minus zero with zero', () => {
    expect(plain(stlBinary(BLOCK)).vertices).toHaveLength(8);
    const signed = stlAscii(blockMesh([3, 2, 1]));
    const mixed = new TextDecoder().decode(signed).replace('vertex 0 0 0', 'vertex -0 0 -0.0');
    const mesh = readMesh(text(mixed), { unit: 1 });
    expect(mesh.vertices).toHaveLength(24);
    expect(Object.is(mesh.vertices[0], 0)).toBe(true);
  });

  it('welds corners that nearly meet only when asked to, with a tolerance in metres', () => {
    const torn = new TextDecoder()
      .decode(stlAscii(blockMesh([3, 2, 1])))
      .replace('vertex 3 2 1', 'vertex 3.0001 2 1');
    expect(readMesh(text(torn), { unit: 0.001 }).vertices).toHaveLength(27);
    expect(readMesh(text(torn), { unit: 0.001, weld: 1e-6 }).vertices).toHaveLength(24);
    expect(readMesh(text(torn), { unit: 0.001, weld: 1e-8 }).vertices).toHaveLength(27);
  });

  it('drops and counts triangles with two equal corners', () => {
    const mesh = { ...BLOCK, triangles: [...BLOCK.triangles, [1, 1, 2], [4, 5, 4]] } as PlainMesh;
    const read = readMesh(stlBinary(mesh), { unit: 1 });
    expect(read.dropped).toBe(2);
    expect(meshSolid(read).notes.map((note) => note.code)).toEqual(['MESH_COLLAPSED_TRIANGLES']);
  });

  it('gives the double nearest to each coordinate in metres', () => {
    const mesh: PlainMesh = { ...TETRAHEDRON, vertices: [[0.1, 1.2, 16], ...TETRAHEDRON.vertices.slice(1)] };
    expect(readMesh(objText(mesh), { unit: 0.001 }).vertices.slice(0, 3)).not.toEqual([]);
    const first = plain(objText(mesh), 0.001).vertices;
    expect(first).toContainEqual([0.0001, 0.0012, 0.016]);
  });

  it.each([
    ['1e-3', 0.001],
    ['+12.5E+2', 1250],
    ['.5', 0.5],
    ['5.', 5],
    ['-0.1', -0.1],
    ['123456789012345678', 123456789012345680],
    ['0.30000000000000004', 0.30000000000000004],
    ['1.7976931348623157e-30', 1.7976931348623157e-30],
    ['8.41e21', 8.41e21],
  ])('reads the number %s as the engine does', (written, value) => {
    const file = new TextDecoder()
      .decode(objText(TETRAHEDRON))
      .replace('v 4 0.5 0.25', `v ${written} 0.5 0.25`);
    expect(plain(text(file)).vertices.map((v) => v[0])).toContain(value);
  });

  it('reads OBJ faces of many corners, negative and slashed indices, comments and split lines', () => {
    const file = [
      '# a block',
      'mtllib none.mtl',
      ...BLOCK.vertices.map((v) => `v ${v.join(' ')} 1.0`),
      'vn 0 0 1',
      'f 1//1 3//1 4//1 2//1',
      'f -4/1/1 -3/2/1 -1/3/1 -2/4/1',
      'f 1 2 \\',
      '  6 5',
      'f 3 7 8 4',
      'f 1 5 7 3',
      'f 2 4 8 6',
    ].join('\r\n');
    const { body, report } = meshSolid(readMesh(text(file), { unit: 1 }));
    expect(body.mass).toBeCloseTo(6, 12);
    expect(report.triangles).toBe(12);
  });

  it('leaves out OBJ vertices that no face names', () => {
    const file = `v 1000 1000 1000\n${new TextDecoder().decode(objText(BLOCK)).replace(/f (\d+) (\d+) (\d+)/g, (_, a, b, c) => `f ${+a + 1} ${+b + 1} ${+c + 1}`)}`;
    expect(meshSolid(readMesh(text(file), { unit: 1 })).report.extent.max).toEqual([3.5, 1, 1.25]);
  });
});

describe('readMesh refuses', () => {
  it('an empty file and files without triangles with MESH_EMPTY', () => {
    expect(fault(new Uint8Array(0)).code).toBe('MESH_EMPTY');
    expect(fault(stlBinary({ vertices: [], triangles: [] })).code).toBe('MESH_EMPTY');
    expect(fault(text('solid nothing\nendsolid nothing\n')).code).toBe('MESH_EMPTY');
    expect(fault(text('v 1 2 3\nv 2 3 4\n')).code).toBe('MESH_EMPTY');
    expect(fault(stlBinary({ ...BLOCK, triangles: [[1, 1, 2]] })).code).toBe('MESH_EMPTY');
  });

  it('a binary file cut short with MESH_TRUNCATED, saying how many triangles were promised and found', () => {
    const found = fault(stlBinary(BLOCK).subarray(0, 84 + 50 * 7 + 3));
    expect(found.code).toBe('MESH_TRUNCATED');
    expect(found.message).toMatch(/12 .*7/);
  });

  it('an ASCII file cut short with MESH_TRUNCATED', () => {
    const whole = stlAscii(BLOCK);
    expect(fault(whole.subarray(0, whole.length - 100)).code).toBe('MESH_TRUNCATED');
  });

  it.each([Number.NaN, Infinity, -Infinity])('a coordinate of %d with MESH_NOT_FINITE', (value) => {
    const bytes = stlBinary(BLOCK);
    new DataView(bytes.buffer).setFloat32(84 + 50 * 4 + 12, value, true);
    expect(fault(bytes)).toMatchObject({
      code: 'MESH_NOT_FINITE',
      message: expect.stringContaining('triangle 5'),
    });
    expect(fault(text(`v ${value} 0 0\nf 1 1 1\n`)).code).toBe('MESH_NOT_FINITE');
  });

  it.each<[string, string | number[], RegExp]>([
    ['a PNG picture', [0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10], /PNG/],
    ['a zip archive', [0x50, 0x4b, 3, 4, 20, 0], /zip.*3MF/],
    ['a STEP file', 'ISO-10303-21;\nHEADER;', /STEP/],
    ['a web page', '<!DOCTYPE html>\n<html></html>', /web page/],
    ['an unfetched file', 'version https://git-lfs.github.com/spec/v1\noid sha256:0\nsize 1\n', /LFS/],
    ['a PLY mesh', 'ply\nformat ascii 1.0\n', /PLY/],
    ['some other text', 'steel and brass\n', /text/],
    ['a few other bytes', [0, 1, 2, 3], /data/],
  ])('%s with MESH_FORMAT, naming what it looks like', (_, content, looks) => {
    const bytes = typeof content === 'string' ? text(content) : Uint8Array.from(content);
    expect(fault(bytes)).toMatchObject({ code: 'MESH_FORMAT', message: expect.stringMatching(looks) });
  });

  it('text that breaks off its own format with MESH_FORMAT and the line', () => {
    const ascii = new TextDecoder().decode(stlAscii(BLOCK));
    expect(fault(text(ascii.replace('vertex 0.5 -1 0.25', 'vertex 0,5 -1 0.25')))).toMatchObject({
      code: 'MESH_FORMAT',
      message: expect.stringMatching(/line 4: "0,5"/),
    });
    expect(fault(text('v 0 0 0\nv 1 0 0\nf 1 2 9\n')).message).toMatch(/line 3.*"9"/);
    expect(fault(text('v 0 0 0\nv 1 0 0\nf 1 2\n')).code).toBe('MESH_FORMAT');
  });
});
