import fc from 'fast-check';

/** A part of a random assembly, before it is written as YAML; lengths in mm, masses in g. */
export interface RandomPart {
  readonly lines: readonly string[];
}

const n = (min: number, max: number) => fc.integer({ min: min * 100, max: max * 100 }).map((x) => x / 100);
const triple = (low: number, high: number) => fc.tuple(n(low, high), n(low, high), n(low, high));
const list = (x: readonly number[]) => `[ ${x.join(', ')} ]`;

const solid = fc.oneof(
  triple(1, 50).map((s) => `box: { size: ${list(s)} }`),
  fc.tuple(n(2, 40), n(1, 60)).map(([d, l]) => `cylinder: { diameter: ${d}, length: ${l} }`),
  fc.tuple(n(4, 40), n(1, 60)).map(([d, l]) => `tube: { diameter: ${d}, wall: ${d / 8}, length: ${l} }`),
  fc.tuple(n(2, 40), n(1, 60)).map(([d, h]) => `cone: { diameter: ${d}, height: ${h} }`),
  n(2, 40).map((d) => `hemisphere: { diameter: ${d} }`),
  triple(2, 40).map((s) => `wedge: { size: ${list(s)} }`),
  fc.tuple(n(10, 40), n(1, 5)).map(([d, s]) => `torus: { diameter: ${d}, section: ${s}, angle: 200 deg }`),
);

const place = fc
  .tuple(triple(-200, 200), triple(-180, 180))
  .map(
    ([at, r]) => `at: ${list(at)}, rotate: [ { x: ${r[0]} deg }, { y: ${r[1]} deg }, { z: ${r[2]} deg } ]`,
  );

const repeat = fc.constantFrom(
  '',
  ', repeat: { mirror: xz }',
  ', repeat: { line: { count: 3, step: [ 10, 5, 0 ] } }',
  ', repeat: { ring: { count: 4, axis: x } }',
);

const leaf = fc
  .tuple(solid, place, repeat, n(1, 100))
  .map(([s, p, r, mass]) => `solid: { ${s} }, mass: ${mass}, ${p}${r}`);

/** A host box with a hole well inside it. */
const holed = fc
  .tuple(triple(20, 50), place)
  .map(
    ([size, p]) =>
      `solid: { box: { size: ${list(size)} } }, density: 2.7 g/cm^3, ${p}, parts: [ { name: hole, solid: { cylinder: { diameter: ${Math.min(...size) / 2}, length: ${size[2]! / 2} } }, cut: true } ]`,
  );

const group = fc
  .tuple(fc.array(fc.oneof(leaf, holed), { minLength: 1, maxLength: 3 }), place, repeat)
  .map(
    ([parts, p, r]) =>
      `${p}${r}, parts: [ ${parts.map((part, i) => `{ name: g${i}, ${part} }`).join(', ')} ]`,
  );

/** Parts of an assembly in flow style, without names: solids, hosts with holes, groups, repeats, any place and turn. */
export const anyParts: fc.Arbitrary<string[]> = fc.array(fc.oneof(leaf, holed, group), {
  minLength: 1,
  maxLength: 6,
});

export const assemblyOf = (parts: readonly string[], head = ''): string =>
  `assembly: random\nunits: { length: mm, mass: g }\n${head}parts:\n${parts.map((part, i) => `  - { name: p${i}, ${part} }\n`).join('')}`;
