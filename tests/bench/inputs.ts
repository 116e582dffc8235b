import { writeFileSync } from 'node:fs';

/** A small generator with a fixed seed, so that every bench measures the same files. */
function random(seed: number): () => number {
  let state = seed;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

/** An assembly of many parts, about 120 bytes each: boxes, cylinders, tubes and particles, expressions among them. */
export function writeLargeAssembly(path: string, parts: number, faultInLastLine: boolean): void {
  const next = random(3);
  const mm = (low: number, high: number) => (low + next() * (high - low)).toFixed(2);
  const lines = [
    'assembly: many parts',
    'units: { length: mm, mass: g, angle: deg }',
    'parameters: { a: 10 mm, b: a * 2 }',
    'materials: { al: { density: 2700 kg/m^3 } }',
    'parts:',
  ];
  for (let i = 0; i < parts; i++) {
    const at = `[ ${mm(-500, 500)}, ${mm(-500, 500)}, ${mm(-500, 500)} ]`;
    const kind = i % 4;
    if (kind === 0)
      lines.push(
        `  - { name: p${i}, solid: { box: { size: [ ${mm(1, 50)}, b, 5 ] } }, material: al, at: ${at} }`,
      );
    else if (kind === 1)
      lines.push(
        `  - { name: p${i}, solid: { cylinder: { diameter: 5, length: ${mm(1, 50)} } }, material: al, at: ${at}, rotate: [ { y: ${mm(0, 90)} } ] }`,
      );
    else if (kind === 2)
      lines.push(
        `  - name: p${i}`,
        `    solid: { tube: { diameter: 16 mm, wall: 1 mm, length: a + ${mm(1, 50)} mm } }`,
        '    material: al',
        `    at: ${at}`,
      );
    else lines.push(`  - { name: p${i}, solid: particle, mass: ${mm(1, 5)} g, at: ${at} }`);
  }
  if (faultInLastLine) lines.push('  - { name: last, solid: particle, mass: 3 mm }');
  writeFileSync(path, `${lines.join('\n')}\n`);
}

/** A closed torus as binary STL: 2 · around · across triangles. */
export function writeTorusStl(path: string, around: number, across: number): void {
  const bytes = Buffer.alloc(84 + 100 * around * across);
  bytes.writeUInt32LE(2 * around * across, 80);
  const point = (i: number, j: number): [number, number, number] => {
    const u = (2 * Math.PI * (i % around)) / around;
    const v = (2 * Math.PI * (j % across)) / across;
    const r = 100 + 30 * Math.cos(v);
    return [r * Math.cos(u), r * Math.sin(u), 30 * Math.sin(v)];
  };
  let at = 84;
  const triangle = (...corners: [number, number, number][]) => {
    at += 12;
    for (const corner of corners)
      for (const x of corner) {
        bytes.writeFloatLE(x, at);
        at += 4;
      }
    at += 2;
  };
  for (let i = 0; i < around; i++)
    for (let j = 0; j < across; j++) {
      const [a, b, c, d] = [point(i, j), point(i + 1, j), point(i + 1, j + 1), point(i, j + 1)];
      triangle(a, b, c);
      triangle(a, c, d);
    }
  writeFileSync(path, bytes);
}

export function writeMeshAssembly(path: string, stl: string): void {
  writeFileSync(
    path,
    `assembly: one mesh
parts:
  - { name: ring, solid: { mesh: { file: ${stl}, unit: mm } }, density: 1000 kg/m^3 }
`,
  );
}
