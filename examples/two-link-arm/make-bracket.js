// Writes bracket.stl: an L-shaped bracket with a gusset, 60 mm long, in millimetres, as ASCII STL.
// Run it here with: node make-bracket.js
import { writeFileSync } from 'node:fs';

/** The L with a sloping inner corner, counter-clockwise in x and z, and how it splits into triangles. */
export const OUTLINE = [
  [0, 0],
  [70, 0],
  [70, 6],
  [30, 6],
  [6, 30],
  [6, 50],
  [0, 50],
];
const TRIANGLES = [
  [0, 1, 2],
  [0, 2, 3],
  [0, 3, 4],
  [0, 4, 5],
  [0, 5, 6],
];
export const WIDTH = 60;

/** The bracket's surface, facets outward; y runs from 0 to WIDTH. */
function facets() {
  const at = (i, y) => [OUTLINE[i][0], y, OUTLINE[i][1]];
  const faces = TRIANGLES.flatMap(([a, b, c]) => [
    [at(a, 0), at(b, 0), at(c, 0)],
    [at(a, WIDTH), at(c, WIDTH), at(b, WIDTH)],
  ]);
  const sides = OUTLINE.flatMap((_, i) => {
    const j = (i + 1) % OUTLINE.length;
    return [
      [at(i, 0), at(i, WIDTH), at(j, WIDTH)],
      [at(i, 0), at(j, WIDTH), at(j, 0)],
    ];
  });
  return [...faces, ...sides];
}

function normal([a, b, c]) {
  const u = b.map((v, k) => v - a[k]);
  const w = c.map((v, k) => v - a[k]);
  const n = [u[1] * w[2] - u[2] * w[1], u[2] * w[0] - u[0] * w[2], u[0] * w[1] - u[1] * w[0]];
  const length = Math.hypot(...n);
  return n.map((v) => Number((v / length).toFixed(6)) + 0);
}

export function bracketStl() {
  const lines = facets().map(
    (f) =>
      `  facet normal ${normal(f).join(' ')}\n    outer loop\n${f
        .map((v) => `      vertex ${v.join(' ')}\n`)
        .join('')}    endloop\n  endfacet\n`,
  );
  return `solid bracket\n${lines.join('')}endsolid bracket\n`;
}

if (process.argv[1]?.endsWith('make-bracket.js'))
  writeFileSync(new URL('bracket.stl', import.meta.url), bracketStl());
