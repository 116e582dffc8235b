/** A mesh in the file's own unit, as lists. */
export interface PlainMesh {
  readonly vertices: readonly (readonly [number, number, number])[];
  readonly triangles: readonly (readonly [number, number, number])[];
}

type Point = readonly [number, number, number];

const BOX_TRIANGLES = [
  [0, 2, 3],
  [0, 3, 1],
  [4, 5, 7],
  [4, 7, 6],
  [0, 1, 5],
  [0, 5, 4],
  [2, 6, 7],
  [2, 7, 3],
  [0, 4, 6],
  [0, 6, 2],
  [1, 3, 7],
  [1, 7, 5],
] as const;

/** A block from its lowest corner, 12 outward triangles. */
export function blockMesh(size: Point, from: Point = [0, 0, 0]): PlainMesh {
  const vertices = Array.from(
    { length: 8 },
    (_, i): Point => [
      from[0] + (i & 1 ? size[0] : 0),
      from[1] + (i & 2 ? size[1] : 0),
      from[2] + (i & 4 ? size[2] : 0),
    ],
  );
  return { vertices, triangles: BOX_TRIANGLES };
}

/** A scalene tetrahedron with three different products, outward. */
export const TETRAHEDRON: PlainMesh = {
  vertices: [
    [0, 0, 0],
    [4, 0.5, 0.25],
    [1, 3, -0.5],
    [0.5, 0.75, 2],
  ],
  triangles: [
    [0, 2, 1],
    [0, 1, 3],
    [0, 3, 2],
    [1, 2, 3],
  ],
};

/** A ring of round section about z, `rows` × `columns` × 2 triangles. */
export function ringMesh(ring: number, section: number, rows: number, columns: number): PlainMesh {
  const vertices: Point[] = [];
  for (let i = 0; i < rows; i++)
    for (let j = 0; j < columns; j++) {
      const a = (2 * Math.PI * i) / rows;
      const b = (2 * Math.PI * j) / columns;
      const r = ring + section * Math.cos(b);
      vertices.push([r * Math.cos(a), r * Math.sin(a), section * Math.sin(b)]);
    }
  const at = (i: number, j: number) => (i % rows) * columns + (j % columns);
  const triangles: Point[] = [];
  for (let i = 0; i < rows; i++)
    for (let j = 0; j < columns; j++)
      triangles.push([at(i, j), at(i + 1, j), at(i + 1, j + 1)], [at(i, j), at(i + 1, j + 1), at(i, j + 1)]);
  return { vertices, triangles };
}

export const joinMeshes = (...meshes: readonly PlainMesh[]): PlainMesh => {
  const vertices: Point[] = [];
  const triangles: Point[] = [];
  for (const mesh of meshes) {
    const base = vertices.length;
    vertices.push(...mesh.vertices);
    for (const [a, b, c] of mesh.triangles) triangles.push([a + base, b + base, c + base]);
  }
  return { vertices, triangles };
};

export const turnedOver = (mesh: PlainMesh): PlainMesh => ({
  ...mesh,
  triangles: mesh.triangles.map(([a, b, c]) => [a, c, b]),
});

export const without = (mesh: PlainMesh, ...left: readonly number[]): PlainMesh => ({
  ...mesh,
  triangles: mesh.triangles.filter((_, i) => !left.includes(i)),
});

/** The bytes of a binary STL; coordinates are rounded to single precision. */
export function stlBinary(mesh: PlainMesh, header = ''): Uint8Array {
  const bytes = new Uint8Array(84 + 50 * mesh.triangles.length);
  bytes.set(new TextEncoder().encode(header).subarray(0, 80));
  const view = new DataView(bytes.buffer);
  view.setUint32(80, mesh.triangles.length, true);
  mesh.triangles.forEach((corners, t) => {
    corners.forEach((v, k) => {
      mesh.vertices[v]!.forEach((value, axis) => {
        view.setFloat32(84 + 50 * t + 12 + 12 * k + 4 * axis, value, true);
      });
    });
  });
  return bytes;
}

export const text = (value: string): Uint8Array => new TextEncoder().encode(value);

export const stlAscii = (mesh: PlainMesh, name = 'part'): Uint8Array =>
  text(
    `solid ${name}\n${mesh.triangles
      .map(
        (corners) =>
          `  facet normal 0 0 0\n    outer loop\n${corners.map((v) => `      vertex ${mesh.vertices[v]!.join(' ')}`).join('\n')}\n    endloop\n  endfacet\n`,
      )
      .join('')}endsolid ${name}\n`,
  );

export const objText = (mesh: PlainMesh): Uint8Array =>
  text(
    `# part\n${mesh.vertices.map((v) => `v ${v.join(' ')}\n`).join('')}${mesh.triangles.map((t) => `f ${t.map((v) => v + 1).join(' ')}\n`).join('')}`,
  );
