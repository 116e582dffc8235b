import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readDocument } from '../../../core/document/index.ts';
import { faultsOf, placesAndCodes, printed } from '../yaml/faults-of.ts';

const HERON = readFileSync(new URL('heron.yaml', import.meta.url), 'utf8');

const read = (text: string) => readDocument(text, 'a.yaml');
const faults = (text: string) => faultsOf(() => read(text));
const codes = (text: string) => placesAndCodes(faults(text));

/** A file with one part that has these keys and nothing wrong with it otherwise. */
const withPart = (keys: string, name = 'boom') => `assembly: a\nparts:\n  - name: ${name}\n    ${keys}\n`;
/** A file with these keys at its head. */
const withHead = (keys: string) =>
  `assembly: a\n${keys}\nparts: [ { name: b, solid: particle, mass: 1 g } ]\n`;

describe('readDocument', () => {
  it('reads the example of the reference', () => {
    const { document, places } = read(HERON);
    expect(document.assembly).toBe('Heron tail boom');
    expect(document.parts.map((part) => part.name)).toEqual([
      'boom',
      'receiver',
      'servo',
      'fasteners',
      'antenna',
      'tailplane',
    ]);
    expect(document.parts[0]!.parts![0]!.cut).toBe('true');
    expect(document.parts.map((part) => places.lineOf(part))).toEqual([24, 37, 55, 60, 65, 69]);
    expect(document.limits!.map((limit) => places.lineOf(limit))).toEqual([77, 78, 79, 80]);
  });

  it('hands on quantities as they are written', () => {
    const { document } = read(withHead('parameters: { a: 1.20 mm, b: { value: a * 2, u: 5 % } }'));
    expect(document.parameters).toEqual({ a: '1.20 mm', b: { value: 'a * 2', u: '5 %' } });
  });

  it.each([
    'solid: { box: { size: [ 1, 2, 3 ] } }\n    material: al',
    'solid: { tube: { radius: 3, bore_radius: 1, length: { value: 3, tol: 1 } } }\n    density: { value: 1, u: 2 % }',
    'solid: { box: { size: [ { value: 1, u: 1 % }, 2, 3 ] } }\n    mass: 3',
    'solid: { extrusion: { outline: [ [0,0], [1,0], [0,1] ], holes: [ [ [0,0], [1,0], [0,1] ] ], height: 3 } }\n    mass: 1',
    'solid: { polyhedron: { vertices: [[0,0,0],[1,0,0],[0,1,0],[0,0,1]], faces: [[0,2,1],[0,1,3],[1,2,3],[0,3,2]] } }\n    mass: 1',
    'solid: { mesh: { file: a.stl, unit: mm, fill: shell, thickness: 1, weld: exact } }\n    density: 1',
    'solid: particle\n    mass: { value: 3, tol: 1 }\n    repeat: { line: { count: 3, step: [ 1, 0, 0 ] } }',
    'solid: particle\n    mass: 3\n    repeat: [ { mirror: xz }, { ring: { count: 8, axis: x, through: [ 0, 0, 0 ], angle: 90 deg } } ]',
    'solid: particle\n    mass: 3\n    rotate: [ { x: 1 }, { axis: [ 1, 1, 0 ], angle: 2 }, { quaternion: [ 1, 0, 0, 0 ] }, { matrix: [[1,0,0],[0,1,0],[0,0,1]] } ]',
    'body: { mass: 3, inertia: { matrix: [[1,0,0],[0,1,0],[0,0,1]], about: [ 1, 2, 3 ], products: positive } }\n    anchor: centroid',
    'include: a.yaml\n    with: { a: 3 }\n    state: flight\n    override: { mass: 3, reason: weighed }',
    'parts: [ { name: c, solid: particle, mass: 1 } ]\n    states: [ a ]\n    image: xy\n    basis: measured',
  ])('reads a part with %j', (keys) => {
    expect(read(withPart(keys)).document.parts).toHaveLength(1);
  });

  it.each([
    'growth: { estimated: 20 %, structure: { estimated: 18 % } }',
    'states: { flight: {}, stowed: { parameters: { a: 3 }, omit: [ b ], note: n } }',
    'frames: { gimbal: { at: [ 1, 2, 3 ], rotate: [ { z: 180 deg } ], note: n } }',
    'frame: { origin: here, x: forward, y: left, z: up }',
    'products: negative',
    'limits: [ { name: a, quantity: mass, max: 3, waiver: { until: 2028-02-29, reason: r, by: b } } ]',
    'sweeps: { trade: { vary: { a: [ 1, 2 ], b: { from: 1, to: 2, step: 1 }, c: { from: 1, to: 2, count: 3 } }, states: [ s ], keep: [ mass ] } }',
    'units: { length: mm, mass: g, angle: deg, density: g/cm^3, inertia: g*mm^2 }',
    'materials: { al: { density: { value: 2700, tol: 10 } }, cfrp: { density: 1, u: 2 % } }',
  ])('reads a file with %j', (keys) => {
    expect(read(withHead(keys)).document.assembly).toBe('a');
  });
});

describe('readDocument refuses', () => {
  it.each([
    ['an unknown key', 'solid: particle\n    materail: al', '5:5 MODEL_UNKNOWN_KEY'],
    ['an unknown solid', 'solid: { cuboid: { size: [ 1, 2, 3 ] } }', '4:14 MODEL_UNKNOWN_CHOICE'],
    ['an unknown word for a solid', 'solid: partical', '4:12 MODEL_UNKNOWN_CHOICE'],
    ['an unknown key of a solid', 'solid: { box: { sise: [ 1, 2, 3 ] } }', '4:21 MODEL_UNKNOWN_KEY'],
    ['two numbers for a place', 'solid: particle\n    at: [ 1, 2 ]', '5:9 MODEL_WRONG_SHAPE'],
    ['text for a place', 'solid: particle\n    at: 3', '5:9 MODEL_WRONG_SHAPE'],
    ['a list in a place', 'solid: particle\n    at: [ 1, [ 2 ], 3 ]', '5:14 MODEL_WRONG_SHAPE'],
    ['a list for a mass', 'solid: particle\n    mass: [ 3 ]', '5:11 MODEL_WRONG_SHAPE'],
    ['no value', 'solid: particle\n    mass: { u: 3 }', '5:11 MODEL_MISSING_KEY'],
    ['a rotation outside a list', 'solid: particle\n    rotate: { x: 3 }', '5:13 MODEL_WRONG_SHAPE'],
    ['a rotation of two kinds', 'solid: particle\n    rotate: [ { x: 3, y: 3 } ]', '5:23 MODEL_KEYS_CLASH'],
    ['an empty rotation', 'solid: particle\n    rotate: [ {} ]', '5:15 MODEL_MISSING_KEY'],
    [
      'an axis without an angle',
      'solid: particle\n    rotate: [ { axis: [ 1, 0, 0 ] } ]',
      '5:15 MODEL_MISSING_KEY',
    ],
    ['an angle without an axis', 'solid: particle\n    rotate: [ { angle: 3 } ]', '5:15 MODEL_MISSING_KEY'],
    ['an angle beside x', 'solid: particle\n    rotate: [ { x: 3, angle: 3 } ]', '5:23 MODEL_KEYS_CLASH'],
    ['an unknown plane', 'solid: particle\n    image: zx', '5:12 MODEL_UNKNOWN_CHOICE'],
    [
      'an unknown axis',
      'solid: particle\n    repeat: { ring: { count: 3, axis: w } }',
      '5:39 MODEL_UNKNOWN_CHOICE',
    ],
    ['no count', 'solid: particle\n    repeat: { ring: { axis: x } }', '5:21 MODEL_MISSING_KEY'],
    [
      'two repeats in one',
      'solid: particle\n    repeat: { mirror: xy, line: { count: 2, step: [1,0,0] } }',
      '5:15 MODEL_KEYS_CLASH',
    ],
    ['yes for true', 'solid: particle\n    cut: yes', '5:10 MODEL_UNKNOWN_CHOICE'],
    [
      'a solid and a body',
      'solid: particle\n    body: { mass: 3, inertia: { matrix: [[1,0,0],[0,1,0],[0,0,1]], about: centre } }',
      '5:5 MODEL_KEYS_CLASH',
    ],
    ['nothing that a part could be', 'note: n', '3:5 MODEL_MISSING_KEY'],
    ['two solids in one', 'solid: { box: { size: [1,2,3] }, rod: { length: 3 } }', '4:38 MODEL_KEYS_CLASH'],
    ['an empty solid', 'solid: {}', '4:12 MODEL_MISSING_KEY'],
    ['with without include', 'solid: particle\n    with: { a: 3 }', '5:5 MODEL_KEYS_CLASH'],
    ['state without include', 'solid: particle\n    state: flight', '5:5 MODEL_KEYS_CLASH'],
    ['mass on an include', 'include: a.yaml\n    mass: 3', '5:5 MODEL_MASS_MISPLACED'],
    [
      'a material on a group',
      'parts: [ { name: c, solid: particle } ]\n    material: al',
      '5:5 MODEL_MASS_MISPLACED',
    ],
    ['a cut without a solid', 'include: a.yaml\n    cut: true', '5:5 MODEL_KEYS_CLASH'],
    [
      'a cut with parts',
      'solid: particle\n    cut: true\n    parts: [ { name: c, solid: particle } ]',
      '6:5 MODEL_KEYS_CLASH',
    ],
    ['an anchor on an include', 'include: a.yaml\n    anchor: centroid', '5:5 MODEL_KEYS_CLASH'],
    ['a material and a density', 'solid: particle\n    material: al\n    density: 3', '6:5 MODEL_KEYS_CLASH'],
    ['u and tol', 'solid: particle\n    mass: { value: 3, u: 1, tol: 1 }', '5:29 MODEL_KEYS_CLASH'],
    [
      'u and tol of a size',
      'solid: { box: { size: [ 1, { value: 3, u: 1, tol: 1 }, 3 ] } }',
      '4:50 MODEL_KEYS_CLASH',
    ],
    ['a bare override', 'solid: particle\n    override: 3', '5:15 MODEL_WRONG_SHAPE'],
    ['an override without a reason', 'solid: particle\n    override: { mass: 3 }', '5:15 MODEL_MISSING_KEY'],
    ['a body without inertia', 'body: { mass: 3 }', '4:11 MODEL_MISSING_KEY'],
    [
      'an inertia without about',
      'body: { mass: 3, inertia: { matrix: [[1,0,0],[0,1,0],[0,0,1]] } }',
      '4:31 MODEL_MISSING_KEY',
    ],
    [
      'five elements',
      'body: { mass: 3, inertia: { xx: 1, yy: 1, zz: 1, xy: 0, xz: 0, about: centre } }',
      '4:31 MODEL_MISSING_KEY',
    ],
    [
      'elements and a matrix',
      'body: { mass: 3, inertia: { xx: 1, matrix: [[1,0,0],[0,1,0],[0,0,1]], about: centre } }',
      '4:33 MODEL_KEYS_CLASH',
    ],
    [
      'an about that is no point',
      'body: { mass: 3, inertia: { matrix: [[1,0,0],[0,1,0],[0,0,1]], about: [ 1, 2 ] } }',
      '4:75 MODEL_WRONG_SHAPE',
    ],
    [
      'an about misspelt',
      'body: { mass: 3, inertia: { matrix: [[1,0,0],[0,1,0],[0,0,1]], about: center } }',
      '4:75 MODEL_UNKNOWN_CHOICE',
    ],
    [
      'a thickness in a full mesh',
      'solid: { mesh: { file: a.stl, unit: mm, thickness: 3 } }',
      '4:45 MODEL_KEYS_CLASH',
    ],
    ['a mesh without its unit', 'solid: { mesh: { file: a.stl } }', '4:20 MODEL_MISSING_KEY'],
    ['a mesh without its file', 'solid: { mesh: { unit: mm } }', '4:20 MODEL_MISSING_KEY'],
    ['no states at all', 'solid: particle\n    states: []', '5:13 MODEL_WRONG_SHAPE'],
    ['parts that are nothing', 'parts:', '4:5 MODEL_WRONG_SHAPE'],
    [
      'an outline of two corners',
      'solid: { extrusion: { outline: [[0,0],[1,0]], height: 3 } }',
      '4:36 MODEL_WRONG_SHAPE',
    ],
    [
      'a tetrahedron of three corners',
      'solid: { tetrahedron: { vertices: [[0,0,0],[1,0,0],[0,1,0]] } }',
      '4:39 MODEL_WRONG_SHAPE',
    ],
    [
      'an unquoted comma in a list',
      'solid: particle\n    at: [ max(a, b), 0, 0 ]',
      '5:11 YAML_UNQUOTED_COMMA',
    ],
    [
      'a text with a comma, unquoted in a mapping',
      'solid: particle\n    override: { mass: 1, reason: wraps, I hope, well enough }',
      '5:34 YAML_UNQUOTED_COMMA',
    ],
    [
      'an unquoted comma in a mapping',
      'solid: { rod: { length: max(a, min(b, c)) } }',
      '4:29 YAML_UNQUOTED_COMMA',
    ],
    [
      'a part called __proto__',
      'solid: particle\n    with: { __proto__: 3 }\n    include: a',
      '5:13 MODEL_UNKNOWN_KEY',
    ],
  ])('%s in a part', (_, keys, expected) => {
    expect(codes(withPart(keys))).toContain(expected);
    expect(codes(withPart(keys)).length).toBeLessThanOrEqual(
      keys.includes('include: a\n') || keys.includes('__proto__') ? 3 : 1,
    );
  });

  it.each([
    ['a missing name', 'assembly: a\nparts:\n  - solid: particle', '3:5 MODEL_MISSING_KEY'],
    ['missing parts', 'assembly: a', '1:1 MODEL_MISSING_KEY'],
    ['a missing title', 'parts: [ { name: a, solid: particle } ]', '1:1 MODEL_MISSING_KEY'],
    ['no parts', 'assembly: a\nparts: []', '2:8 MODEL_WRONG_SHAPE'],
    ['a part that is text', 'assembly: a\nparts: [ boom ]', '2:10 MODEL_WRONG_SHAPE'],
    ['parts in a mapping', 'assembly: a\nparts: { boom: { solid: particle } }', '2:8 MODEL_WRONG_SHAPE'],
    ['no state among the states', withHead('states: {}'), '2:9 MODEL_WRONG_SHAPE'],
    ['a state that is nothing', withHead('states:\n  flight:'), '3:3 MODEL_WRONG_SHAPE'],
    [
      'a limit that is unknown',
      withHead('limits: [ { name: a, quantity: mass, maks: 3 } ]'),
      '2:38 MODEL_UNKNOWN_KEY',
    ],
    [
      'a day that is none',
      withHead(
        'limits: [ { name: a, quantity: mass, max: 3, waiver: { until: 2027-02-29, reason: r, by: b } } ]',
      ),
      '2:63 MODEL_BAD_DATE',
    ],
    [
      'a date of another form',
      withHead(
        'limits: [ { name: a, quantity: mass, max: 3, waiver: { until: 1.2.2027, reason: r, by: b } } ]',
      ),
      '2:63 MODEL_BAD_DATE',
    ],
    [
      'two limits of a name',
      withHead('limits:\n- { name: a, quantity: mass, max: 3 }\n- { name: a, quantity: mass, min: 1 }'),
      '4:11 MODEL_DUPLICATE_NAME',
    ],
    [
      'a range without a step',
      withHead('sweeps: { t: { vary: { a: { from: 1, to: 2 } } } }'),
      '2:27 MODEL_MISSING_KEY',
    ],
    [
      'a range with step and count',
      withHead('sweeps: { t: { vary: { a: { from: 1, to: 2, step: 1, count: 2 } } } }'),
      '2:54 MODEL_KEYS_CLASH',
    ],
    [
      'an unquoted comma in a sweep',
      withHead('sweeps: { t: { vary: { a: [ max(1, 2), 3 ] } } }'),
      '2:29 YAML_UNQUOTED_COMMA',
    ],
    [
      'a parameter with u and tol',
      withHead('parameters: { a: { value: 1, u: 1, tol: 1 } }'),
      '2:36 MODEL_KEYS_CLASH',
    ],
    ['a parameter in a list', withHead('parameters: { a: [ 1 ] }'), '2:18 MODEL_WRONG_SHAPE'],
    [
      'a material with u twice',
      withHead('materials: { a: { density: { value: 1, u: 1 }, u: 1 } }'),
      '2:48 MODEL_KEYS_CLASH',
    ],
    ['a material without a density', withHead('materials: { a: { u: 1 } }'), '2:17 MODEL_MISSING_KEY'],
    ['an unknown sign', withHead('products: minus'), '2:11 MODEL_UNKNOWN_CHOICE'],
    ['a parameter called __proto__', withHead('parameters: { __proto__: 3 }'), '2:15 MODEL_UNKNOWN_KEY'],
    ['the same in escapes', withHead('parameters: { "\\x5f_proto__": [] }'), '2:15 MODEL_UNKNOWN_KEY'],
    ['a constructor', withHead('constructor: 3'), '2:1 MODEL_UNKNOWN_KEY'],
    ['a toString in a state', withHead('states: { a: { toString: 3 } }'), '2:16 MODEL_UNKNOWN_KEY'],
  ])('%s', (_, text, expected) => {
    expect(codes(text)).toEqual([expected]);
  });

  it.each(['a/b', 'a[1]', "' a'", '"a "', "''", '"a\\nb"', '"a\\tb"'])('%s for a name', (name) => {
    expect(codes(withPart('solid: particle', name))).toEqual(['3:11 MODEL_BAD_NAME']);
  });

  it.each(['größe', 'a b', 'M3×8', 'x-1.2', "'[0'"].slice(0, 4))('not %s for a name', (name) => {
    expect(read(withPart('solid: particle', name)).document.parts[0]!.name).toBe(name);
  });

  it('siblings of one name, but not cousins', () => {
    const nested = (a: string, b: string) =>
      `assembly: a\nparts:\n- name: g\n  parts: [ { name: ${a}, solid: particle } ]\n- name: h\n  parts: [ { name: ${b}, solid: particle }, { name: c, solid: particle } ]`;
    expect(read(nested('x', 'x')).document.parts).toHaveLength(2);
    expect(codes(nested('x', 'c'))).toEqual(['6:50 MODEL_DUPLICATE_NAME']);
  });

  it('siblings that are one part by alias', () => {
    expect(codes('assembly: a\nparts:\n- &p { name: a, solid: particle }\n- *p')[0]).toContain(
      'MODEL_DUPLICATE_NAME',
    );
  });

  it('everything wrong in one go, in the order of the text', () => {
    const text = HERON.replace('material: cfrp', 'materail: cfrp')
      .replace('at: [30, 0, 0]', 'at: [30, 0]')
      .replace('mirror: xz', 'mirror: zx')
      .replace('name: servo', 'name: boom')
      .replace(', reason: weighed after paint', '')
      .replace('quantity: mass, max: 250 g', 'quantity: [ mass ], max: 250 g');
    expect(codes(text)).toEqual([
      '26:5 MODEL_UNKNOWN_KEY',
      '52:9 MODEL_WRONG_SHAPE',
      '55:11 MODEL_DUPLICATE_NAME',
      '59:23 MODEL_UNKNOWN_CHOICE',
      '74:15 MODEL_MISSING_KEY',
      '77:38 MODEL_WRONG_SHAPE',
    ]);
  });

  it('at most twenty faults, the first of the text', () => {
    const parts = Array.from({ length: 300 }, (_, i) => `  - { name: p${i}, solid: particle, colour: red }`);
    const found = faults(`assembly: a\nparts:\n${parts.join('\n')}`);
    expect(found).toHaveLength(20);
    expect(found[19]!.at!.line).toBe(22);
  });

  it('a mistyped key once, not as missing too', () => {
    expect(codes('assembly: a\nparts: [ { nane: b, solid: particle } ]')).toEqual(['2:12 MODEL_UNKNOWN_KEY']);
  });
});

describe('readDocument says', () => {
  it.each([
    withPart('solid: particle\n    materail: al'),
    withPart('solid: particle\n    position: [ 1, 2, 3 ]'),
    withPart('solid: particle\n    mass: { valeu: 3 }'),
    withPart('solid: { cuboid: {} }'),
    withPart('solid: { xyzzyxyzzy: {} }'),
    withPart('solid: tube'),
    withPart('solid: particle\n    at: [ 1, 2 ]'),
    withPart('solid: particle\n    at: 3'),
    withPart('solid: particle\n    mass: [ 3 ]'),
    withPart('solid: particle\n    rotate: { x: 3 }'),
    withPart('solid: particle\n    rotate: [ {} ]'),
    withPart('solid: particle\n    rotate: [ { axis: [ 1, 0, 0 ] } ]'),
    withPart('solid: particle\n    image: zx'),
    withPart('solid: particle\n    cut: yes'),
    withPart('solid: particle\n    repeat: {}'),
    withPart('solid: particle\n    include: a'),
    withPart('solid: particle\n    with: { a: 3 }'),
    withPart('include: a\n    mass: 3'),
    withPart('parts: [ { name: c, solid: particle } ]\n    mass: 3'),
    withPart('solid: particle\n    cut: true\n    override: { mass: 3, reason: r }'),
    withPart('solid: particle\n    material: al\n    density: 3'),
    withPart('solid: { box: { size: [1,2,3] }, rod: { length: 3 } }'),
    withPart('solid: {}'),
    withPart('note: n'),
    withPart('solid: { mesh: { file: a, unit: mm, thickness: 3 } }'),
    withPart('body: { mass: 3, inertia: { xx: 1, yy: 1, zz: 1, xy: 0, xz: 0, about: centre } }'),
    withPart('body: { mass: 3, inertia: { matrix: [[1,0,0],[0,1,0],[0,0,1]], about: center } }'),
    withPart('solid: { extrusion: { outline: [[0,0],[1,0]], height: 3 } }'),
    withPart('solid: particle\n    at: [ max(a, b), 0, 0 ]'),
    withPart('solid: particle', 'a/b'),
    withPart('solid: particle', "''"),
    withPart('solid: particle', "' a'"),
    withPart('parts:'),
    'assembly: a\nparts: [ { name: b, solid: particle }, { name: b, solid: particle } ]',
    'assembly: a',
    'assembly: a\nparts: [ boom ]',
    withHead('states: { a: }'),
    withHead(
      'limits: [ { name: a, quantity: mass, max: 3, waiver: { until: 2027-02-29, reason: r, by: b } } ]',
    ),
    withHead('sweeps: { t: { vary: { a: { from: 1, to: 2 } } } }'),
    withHead('materials: { a: { density: { value: 1, u: 1 }, u: 1 } }'),
    withHead('parameters: { __proto__: 3 }'),
  ])('what is wrong with %j and how to mend it', (text) => {
    expect(printed(faults(text))).toMatchSnapshot();
  });
});
