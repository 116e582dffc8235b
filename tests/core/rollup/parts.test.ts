import { describe, expect, it } from 'vitest';
import { inertiaAboutCentre } from '#core/inertia/body.ts';
import { expectClose } from '../../helpers/expect-body.ts';
import { referenceCase } from '../../helpers/reference-cases.ts';
import { faultsOf, placesOf, recordOfText, rollUpText } from '../../helpers/roll-up-text.ts';

const nine = (yaml: string) => recordOfText(yaml).basic.inertia!.aboutCentre.flat();
const centre = (yaml: string) => recordOfText(yaml).basic.centre!;
const mass = (yaml: string, given = {}) => recordOfText(yaml, given).basic.mass;

describe('published composites', () => {
  it('a block with a round hole (constructed; sum about the origin less m d²)', () => {
    const { expected } = referenceCase('C-block-hole');
    const record = recordOfText(`
      assembly: block
      parts:
        - name: block
          solid: { box: { size: [ 0.2, 0.12, 0.08 ] } }
          density: 2700
          parts:
            - { name: hole, solid: { cylinder: { radius: 0.025, length: 0.08 } }, cut: true, at: [ 0.05, 0.02, 0 ] }
    `);
    expect(record.basic.mass / expected.mass_kg).toBeCloseTo(1, 14);
    expectClose(record.basic.centre!, expected.com_m, 1e-13);
    expectClose(record.basic.inertia!.aboutCentre.flat(), expected.I_com.flat(), 1e-13);
    expectClose(record.basic.inertia!.aboutOrigin.flat(), expected.I_origin.flat(), 1e-13);
    expectClose(record.basic.principal!.moments, expected.principal_com, 1e-13);
  });

  it('a dumbbell of two spheres and a rod (constructed, exact rational)', () => {
    const { expected } = referenceCase('C-dumbbell');
    const record = recordOfText(`
      assembly: dumbbell
      parts:
        - { name: big, solid: { sphere: { radius: 0.06 } }, mass: 7, at: [ -0.3, 0, 0 ] }
        - { name: small, solid: { sphere: { radius: 0.04 } }, mass: 2, at: [ 0.25, 0, 0 ] }
        - { name: rod, solid: { rod: { length: 0.55 } }, mass: 0.5, at: [ -0.025, 0, 0 ], rotate: [ { y: 90 deg } ] }
    `);
    expectClose(record.basic.centre!, expected.com_m, 1e-14);
    expectClose(record.basic.inertia!.aboutCentre.flat(), expected.I_com.flat(), 1e-14);
    expect(record.basic.principal!.free).toEqual([1, 2]);
  });

  it('two blocks, one turned by atan2(4, 3) about z (constructed, exact rational)', () => {
    const { expected } = referenceCase('C-two-blocks');
    const record = recordOfText(`
      assembly: two blocks
      parts:
        - { name: a, solid: { box: { size: [ 0.4, 0.1, 0.05 ] } }, mass: 6 }
        - name: b
          solid: { box: { size: [ 0.2, 0.06, 0.04 ] } }
          mass: 2.5
          at: [ 0.3, 0.25, 0.1 ]
          rotate: [ { z: "atan2(4, 3)" } ]
    `);
    expectClose(record.basic.inertia!.aboutCentre.flat(), expected.I_com.flat(), 1e-13);
    expectClose(record.basic.inertia!.aboutOrigin.flat(), expected.I_origin.flat(), 1e-13);
    expectClose(record.basic.principal!.moments, expected.principal_com, 1e-13);
  });

  it('a steel tube with a flange (constructed, two orders of composition)', () => {
    const { expected } = referenceCase('C-tube-flange');
    const record = recordOfText(`
      assembly: tube and flange
      materials: { steel: { density: 7850 } }
      parts:
        - { name: tube, solid: { tube: { radius: 0.05, bore_radius: 0.04, length: 0.4 } }, material: steel, at: [ 0, 0, 0.2 ] }
        - { name: flange, solid: { cylinder: { radius: 0.09, length: 0.015 } }, material: steel, at: [ 0, 0, 0.4075 ] }
    `);
    expect(record.basic.mass / expected.mass_kg).toBeCloseTo(1, 13);
    expectClose(record.basic.inertia!.aboutCentre.flat(), expected.I_com.flat(), 1e-13);
    expectClose(record.basic.inertia!.aboutOrigin.flat(), expected.I_origin.flat(), 1e-13);
  });

  it('an inertial frame by roll, pitch and yaw (URDF: fixed axes, R = Rz Ry Rx; values at 50 digits)', () => {
    // From the open ROS XML format: mass 2.4, xyz 0.1 −0.05 0.2, rpy 0.3 −0.5 0.9, a tensor with three products.
    const record = recordOfText(`
      assembly: link
      parts:
        - name: link
          body:
            mass: 2.4
            inertia: { xx: 0.05, yy: 0.07, zz: 0.04, xy: 0.002, xz: -0.001, yz: 0.003, about: centre, products: negative }
          at: [ 0.1, -0.05, 0.2 ]
          rotate: [ { x: 0.3 }, { y: -0.5 }, { z: 0.9 } ]
    `);
    expectClose(
      record.basic.inertia!.aboutCentre.flat(),
      [
        0.062463358738742, -0.007372677033623558, -0.006988182050622864, -0.007372677033623558,
        0.05222234754931657, 0.008348290449905977, -0.006988182050622864, 0.008348290449905977,
        0.04531429371194143,
      ],
      1e-13,
    );
    expectClose(
      record.basic.inertia!.aboutOrigin.flat(),
      [
        0.16446335873874202, 0.004627322966376442, -0.054988182050622864, 0.004627322966376442,
        0.17222234754931656, 0.032348290449905975, -0.054988182050622864, 0.032348290449905975,
        0.07531429371194143,
      ],
      1e-13,
    );
    expectClose(
      record.basic.principal!.moments,
      [0.039565190791991015, 0.0499625510431635, 0.07047225816484548],
      1e-13,
    );
  });

  it('a brick in slugs and inches (NASA/TM-2015-218675, check cases, App. B table 4)', () => {
    const { printed } = { printed: [0.00189422, 0.006211019, 0.007194665] };
    const record = recordOfText(`
      assembly: brick
      units: { length: in, mass: slug }
      parts: [ { name: brick, solid: { box: { size: [ 8, 4, 2.25 ] } }, mass: 0.155404754 } ]
    `);
    const slugFt2 = 1.3558179483314003;
    [0, 1, 2].forEach((k) => {
      expect(record.basic.inertia!.aboutCentre[k]![k]! / slugFt2).toBeCloseTo(printed[k]!, 8);
    });
  });
});

describe('placing', () => {
  it('lands a local point at `at + R (x − anchor)`', () => {
    // A cone's centroid is at a quarter of its height; anchored there, turned or not, the centre is `at`.
    const cone = (more: string) => `
      assembly: cone
      parts: [ { name: c, solid: { cone: { diameter: 1, height: 4 } }, mass: 1, at: [ 1, 2, 3 ]${more} } ]
    `;
    expect(centre(cone(''))).toEqual([1, 2, 4]);
    expect(centre(cone(', rotate: [ { y: 90 deg } ]'))).toEqual([2, 2, 3]);
    expect(centre(cone(', anchor: centroid, rotate: [ { y: 90 deg } ]'))).toEqual([1, 2, 3]);
  });

  it('turns in order about the parent’s fixed axes', () => {
    const point = (rotate: string) =>
      centre(`
        assembly: p
        parts:
          - { name: g, rotate: ${rotate}, parts: [ { name: p, solid: particle, mass: 1, at: [ 1, 0, 0 ] } ] }
      `);
    // x → (z by 90°) y → (x by 90°) z; the other order leaves it at y.
    expect(point('[ { z: 90 deg }, { x: 90 deg } ]')).toEqual([0, 0, 1]);
    expect(point('[ { x: 90 deg }, { z: 90 deg } ]')).toEqual([0, 1, 0]);
    expect(
      point('[ { axis: [ 1, 1, 1 ], angle: 120 deg } ]').map((x) => Math.round(x * 1e12) / 1e12 + 0),
    ).toEqual([0, 1, 0]);
    // [w, x, y, z] of a quarter turn about z.
    expectClose(
      point('[ { quaternion: [ 0.7071067811865476, 0, 0, 0.7071067811865476 ] } ]'),
      [0, 1, 0],
      1e-15,
    );
    // Columns are the local axes in the parent's: local x is the parent's −z.
    expect(point('[ { matrix: [ [ 0, 1, 0 ], [ 0, 0, -1 ], [ -1, 0, 0 ] ] } ]')).toEqual([0, 0, -1]);
  });

  it('makes quarter turns exact to the bit', () => {
    const yaml = (rotate: string) => `
      assembly: b
      parts: [ { name: b, solid: { box: { size: [ 0.3, 0.7, 1.1 ] } }, mass: 1.7, rotate: ${rotate} } ]
    `;
    const [xx, , , , yy, , , , zz] = nine(yaml('[]'));
    expect(nine(yaml('[ { z: 90 deg } ]'))).toEqual([yy, 0, 0, 0, xx, 0, 0, 0, zz]);
    expect(nine(yaml('[ { y: -270 deg }, { x: 450 deg } ]')).filter((v) => v !== 0)).toHaveLength(3);
  });

  it('mirrors with `image`, two products turning sign', () => {
    const { inertia } = recordOfText(`
      assembly: m
      parts:
        - name: m
          body:
            mass: 1
            centre: [ 0.1, 0.2, 0.3 ]
            inertia: { xx: 5, yy: 6, zz: 7, xy: 0.1, xz: 0.2, yz: 0.3, about: centre, products: negative }
          at: [ 0, 1, 0 ]
          image: xz
    `).basic;
    expectClose(inertia!.aboutCentre.flat(), [5, -0.1, 0.2, -0.1, 6, -0.3, 0.2, -0.3, 7], 1e-15);
  });

  it('repeats in a line, in a ring and by mirror, a list in order, and counts the original', () => {
    const leaves = (repeat: string, at = '[ 1, 0, 0 ]') =>
      recordOfText(`
        assembly: r
        parts: [ { name: p, solid: particle, mass: 2, at: ${at}, repeat: ${repeat} } ]
      `).parts.map((p) => [p.path, ...p.basic.centre.map((c) => Math.round(c * 1e9) / 1e9 + 0)]);
    expect(leaves('{ line: { count: 3, step: [ 0, 2, 0 ] } }')).toEqual([
      ['p[1]', 1, 0, 0],
      ['p[2]', 1, 2, 0],
      ['p[3]', 1, 4, 0],
    ]);
    expect(leaves('{ ring: { count: 4, axis: z } }')).toEqual([
      ['p[1]', 1, 0, 0],
      ['p[2]', 0, 1, 0],
      ['p[3]', -1, 0, 0],
      ['p[4]', 0, -1, 0],
    ]);
    // Part of a circle: angle / (count − 1), about an axis through a point.
    expect(leaves('{ ring: { count: 3, axis: z, angle: 180 deg, through: [ 2, 0, 0 ] } }')).toEqual([
      ['p[1]', 1, 0, 0],
      ['p[2]', 2, -1, 0],
      ['p[3]', 3, 0, 0],
    ]);
    expect(leaves('{ mirror: xz }', '[ 1, 5, 0 ]')).toEqual([
      ['p[1]', 1, 5, 0],
      ['p[2]', 1, -5, 0],
    ]);
    expect(leaves('[ { line: { count: 2, step: [ 1, 0, 0 ] } }, { mirror: yz } ]')).toEqual([
      ['p[1]', 1, 0, 0],
      ['p[2]', 2, 0, 0],
      ['p[3]', -1, 0, 0],
      ['p[4]', -2, 0, 0],
    ]);
    expect(
      placesOf(
        faultsOf(
          'assembly: r\nparts: [ { name: p, solid: particle, mass: 1, repeat: { ring: { count: 2.5, axis: z } } } ]',
        ),
      ),
    ).toEqual(['REPEAT_COUNT 2:72']);
  });

  it('refuses what is not a rotation', () => {
    const code = (rotate: string) =>
      faultsOf(`assembly: r\nparts: [ { name: p, solid: particle, mass: 1, rotate: [ ${rotate} ] } ]`).map(
        (f) => f.code,
      );
    expect(code('{ quaternion: [ 1, 0, 0, 0.01 ] }')).toEqual(['ROTATION_QUATERNION']);
    expect(code('{ matrix: [ [ 1, 0, 0 ], [ 0, 1, 0 ], [ 0, 0, -1 ] ] }')).toEqual(['ROTATION_MATRIX']);
    expect(code('{ matrix: [ [ 1, 0, 0 ], [ 0, 1, 0.01 ], [ 0, 0, 1 ] ] }')).toEqual(['ROTATION_MATRIX']);
    expect(code('{ axis: [ 0, 0, 0 ], angle: 1 }')).toEqual(['ROTATION_NO_AXIS']);
  });
});

describe('cut-outs', () => {
  it('take material, growth and maturity from their host; standing alone they state their own', () => {
    const hosted = `
      assembly: c
      growth: { estimated: 50 % }
      parts:
        - name: plate
          solid: { box: { size: [ 1, 1, 0.1 ] } }
          density: 1000
          maturity: estimated
          parts: [ { name: hole, solid: { box: { size: [ 0.5, 0.5, 0.1 ] } }, cut: true } ]
    `;
    const record = recordOfText(hosted);
    expect(record.basic.mass).toBeCloseTo(75, 12);
    expect(record.predicted.mass).toBeCloseTo(112.5, 12);
    expect(record.parts.map((p) => [p.path, p.cut, Math.round(p.basic.mass)])).toEqual([
      ['plate', false, 100],
      ['plate/hole', true, -25],
    ]);
    const alone = faultsOf(
      'assembly: c\nparts: [ { name: a, solid: { box: { size: [ 1, 1, 1 ] } }, cut: true } ]',
    );
    expect(alone.map((f) => f.code)).toEqual(['MODEL_MASS_MISSING']);
  });

  it('hold no parts of their own', () => {
    const faults = faultsOf(`
      assembly: c
      parts:
        - name: block
          solid: { box: { size: [ 2, 1, 1 ] } }
          density: 1000
          parts:
            - name: pocket
              solid: { box: { size: [ 1, 1, 1 ] } }
              cut: true
              parts: [ { name: boss, solid: particle, mass: 1 } ]
    `);
    expect(faults.map((f) => f.code)).toEqual(['MODEL_KEYS_CLASH']);
  });

  it('take the density that a stated mass implies', () => {
    expect(
      mass(`
        assembly: c
        parts:
          - name: block
            solid: { box: { size: [ 2, 1, 1 ] } }
            mass: 4000
            parts: [ { name: hole, solid: { box: { size: [ 1, 1, 1 ] } }, cut: true } ]
      `),
    ).toBe(2000);
  });

  it('are warned of where their box leaves the host’s, and refused where no body is left', () => {
    const block = (at: string, size: string) => `
      assembly: c
      parts:
        - name: block
          solid: { box: { size: [ 1, 1, 1 ] } }
          density: 1000
          parts: [ { name: hole, solid: { box: { size: ${size} } }, cut: true, at: ${at} } ]
    `;
    expect(rollUpText(block('[ 0.4, 0, 0 ]', '[ 0.2, 0.2, 0.2 ]')).warnings).toEqual([]);
    expect(rollUpText(block('[ 0.41, 0, 0 ]', '[ 0.2, 0.2, 0.2 ]')).warnings.map((w) => w.code)).toEqual([
      'CUT_LEAVES_HOST',
    ]);
    expect(faultsOf(block('[ 0, 0, 0 ]', '[ 1, 1, 1 ]')).map((f) => f.code)).toEqual(['ASSEMBLY_NO_MASS']);
    // Nearly all mass taken from far away: what is left has a tensor that no body can have.
    expect(faultsOf(block('[ 5, 0, 0 ]', '[ 0.9, 1, 1 ]')).map((f) => f.code)).toEqual([
      'ASSEMBLY_IMPOSSIBLE',
    ]);
  });
});

describe('where mass comes from', () => {
  it('is `mass`, or volume × density, in the file’s units or any written', () => {
    expect(
      mass(
        'assembly: m\nparts: [ { name: p, solid: { box: { size: [ 0.1, 0.2, 0.3 ] } }, density: 2.7 g/cm^3 } ]',
      ),
    ).toBeCloseTo(16.2, 12);
    const grams =
      'assembly: m\nunits: { length: mm, mass: g }\nmaterials: { a: { density: 0.0027 } }\nparts: [ { name: p, solid: { box: { size: [ 10, 20, 30 ] } }, material: a } ]';
    expect(mass(grams)).toBeCloseTo(0.0162, 16);
    expect(mass('assembly: m\nparts: [ { name: p, solid: { disk: { diameter: 2 } }, mass: 3 } ]')).toBe(3);
    // A thin plate: area × thickness × density.
    expect(
      mass(
        'assembly: m\nparts: [ { name: p, solid: { plate: { size: [ 2, 3 ], thickness: 1 mm } }, density: 1000 } ]',
      ),
    ).toBeCloseTo(6, 12);
  });

  it.each([
    ['solid: { box: { size: [ 1, 1, 1 ] } }', 'MODEL_MASS_MISSING'],
    ['solid: { rod: { length: 1 } }', 'MODEL_MASS_MISSING'],
    ['solid: { disk: { diameter: 1 } }, density: 1000', 'MODEL_MASS_MISSING'],
    ['solid: particle, mass: -1', 'MODEL_MASS_NEGATIVE'],
    ['solid: particle, mass: 0', 'ASSEMBLY_NO_MASS'],
    ['solid: { box: { size: [ 1, 1, 1 ] } }, density: -1', 'DENSITY_NOT_POSITIVE'],
    ['solid: { box: { size: [ 1, 1, 1 ] } }, density: 2.7e6', 'DENSITY_TOO_LARGE'],
    ['solid: { tube: { diameter: 10, wall: 6, length: 1 } }, mass: 1', 'SOLID_WALL_TOO_THICK'],
    [
      'solid: { extrusion: { outline: [ [ 0, 0 ], [ 1, 1 ], [ 1, 0 ], [ 0, 1 ] ], height: 1 } }, mass: 1',
      'SOLID_OUTLINE_CROSSES',
    ],
  ])('refuses { %s } with %s', (part, code) => {
    expect(faultsOf(`assembly: m\nparts: [ { name: p, ${part} } ]`).map((f) => f.code)).toContain(code);
  });

  it('warns of thick thin solids, of nothing in a shape, and of densities that nothing has', () => {
    const codes = (part: string) =>
      rollUpText(
        `assembly: m\nparts: [ { name: q, solid: particle, mass: 1 }, { name: p, ${part} } ]`,
      ).warnings.map((w) => w.code);
    expect(codes('solid: { disk: { diameter: 1, thickness: 0.051 } }, density: 1000')).toEqual([
      'SOLID_NOT_THIN',
    ]);
    expect(codes('solid: { disk: { diameter: 1, thickness: 0.049 } }, density: 1000')).toEqual([]);
    expect(codes('solid: { sphere: { diameter: 1 } }, mass: 0')).toEqual(['MODEL_NO_MASS']);
    expect(codes('solid: { sphere: { diameter: 0.01 } }, mass: 1')).toEqual(['SOLID_DENSITY_DOUBTFUL']);
    expect(codes('solid: { sphere: { diameter: 10 } }, mass: 1')).toEqual(['SOLID_DENSITY_DOUBTFUL']);
  });
});

describe('figures that no double carries', () => {
  const at = (...parts: string[]) =>
    placesOf(faultsOf(`assembly: m\nparts:\n${parts.map((p, i) => `  - { name: p${i}, ${p} }`).join('\n')}`));
  const small = 'solid: particle, mass: 1';

  it.each([
    ['a mass', 'solid: particle, mass: 1e300'],
    ['a place', 'solid: particle, mass: 1, at: [ 1e300, 0, 0 ]'],
    ['a place whose square is too large', 'solid: particle, mass: 1, at: [ 1e200, 0, 0 ]'],
    ['a step of copies', `${small}, repeat: { line: { count: 3, step: [ -1e300, 0, 0 ] } }`],
    ['a size', 'solid: { box: { size: [ 1e300, 1, 1 ] } }, mass: 1'],
    [
      'corners',
      'solid: { extrusion: { outline: [ [ 0, 0 ], [ 1e200, 0 ], [ 0, 1 ] ], height: 1 } }, mass: 1',
    ],
    ['a volume', 'solid: { sphere: { diameter: 1e30 } }, density: 1000'],
    ['an override', `${small}, override: { mass: 1e300, reason: r }`],
    [
      'a bought item',
      'body: { mass: 1, inertia: { xx: 1e300, yy: 1e300, zz: 1e300, xy: 0, xz: 0, yz: 0, about: centre } }',
    ],
  ])('%s is refused at its part', (_, part) => {
    expect(at(small, part)).toEqual([expect.stringMatching(/^PART_TOO_LARGE 4:/)]);
  });

  it('a frame is refused at the frame, also for what is wrong with its turn', () => {
    const frame = (f: string) =>
      placesOf(faultsOf(`assembly: m\nframes: { f: ${f} }\nparts: [ { name: p, ${small} } ]`));
    expect(frame('{ at: [ 0, 1e300, 0 ] }')).toEqual(['PART_TOO_LARGE 2:14']);
    expect(frame('{ rotate: [ { axis: [ 0, 0, 0 ], angle: 1 } ] }')).toEqual(['ROTATION_NO_AXIS 2:34']);
  });

  it('the largest masses and lengths that are taken give finite numbers throughout', () => {
    const record = recordOfText(`
      assembly: m
      frames: { f: { at: [ 1e40, -1e40, 1e40 ], rotate: [ { x: 30 deg } ] } }
      parts:
        - { name: a, solid: particle, mass: 1e40, at: [ 1e40, 0, 0 ], repeat: { mirror: yz } }
        - { name: b, solid: particle, mass: 1e40, at: [ 0, 1e40, -1e40 ] }
    `);
    expect(JSON.stringify(record.basic) + JSON.stringify(record.frames)).not.toContain('null,null');
    // 2 · m d² about z from a; b adds (2/3) m d² to xx about the centre.
    expectClose([record.basic.inertia!.aboutOrigin[2]![2]!], [3e120], 1e-14);
    expect(record.basic.principal!.moments.every(Number.isFinite)).toBe(true);
    expect(record.parts.every((p) => Object.values(p.share).every(Number.isFinite))).toBe(true);
  });

  it('an axis may be as short or long as it likes', () => {
    const turned = (axis: string) =>
      centre(
        `assembly: m\nparts: [ { name: p, parts: [ { name: q, ${small}, at: [ 1, 2, 3 ] } ], rotate: [ { axis: ${axis}, angle: 90 deg } ] } ]`,
      );
    for (const size of ['1', '1e-200', '1e200', '4e-324', '1e308'])
      expectClose(turned(`[ 0, 0, ${size} ]`), [-2, 1, 3], 1e-15);
    // A third of a turn about the diagonal would be exact; a quarter about [1, 1, 0] takes z to [1, −1, 0]/√2 · z.
    expectClose(turned('[ 1e-200, 1e-200, 0 ]'), turned('[ 1, 1, 0 ]'), 1e-15);
  });
});

describe('bought items', () => {
  const body = (inertia: string, head = '') => `
    assembly: b
    ${head}
    parts: [ { name: p, body: { mass: 2, centre: [ 1, 2, 3 ], inertia: { ${inertia} } } } ]
  `;
  const central = [10, -1, -2, -1, 11, -3, -2, -3, 12];

  it('mean the same about centre, origin or a point, and under either sign', () => {
    expectClose(
      nine(body('xx: 10, yy: 11, zz: 12, xy: -1, xz: -2, yz: -3, about: centre, products: negative')),
      central,
      1e-15,
    );
    expectClose(
      nine(body('xx: 10, yy: 11, zz: 12, xy: 1, xz: 2, yz: 3, about: centre, products: positive')),
      central,
      1e-15,
    );
    // + m (|c|² 1 − c cᵀ) with m = 2, c = (1, 2, 3): xx +26, yy +20, zz +10, xy −4, xz −6, yz −12.
    expectClose(
      nine(body('xx: 36, yy: 31, zz: 22, xy: -5, xz: -8, yz: -15, about: origin, products: negative')),
      central,
      1e-14,
    );
    // About (1, 0, 0): c − p = (0, 2, 3): xx +26, yy +18, zz +8, yz −12.
    expectClose(
      nine(body('xx: 36, yy: 29, zz: 20, xy: -1, xz: -2, yz: -15, about: [ 1, 0, 0 ], products: negative')),
      central,
      1e-14,
    );
    expectClose(
      nine(
        body('matrix: [ [ 10, -1, -2 ], [ -1, 11, -3 ], [ -2, -3, 12 ] ], about: centre, products: negative'),
      ),
      central,
      1e-15,
    );
    expectClose(
      nine(body('xx: 10, yy: 11, zz: 12, xy: 1, xz: 2, yz: 3, about: centre', 'products: positive')),
      central,
      1e-15,
    );
  });

  it('need a declared sign only where a product is not zero', () => {
    expect(nine(body('xx: 10, yy: 11, zz: 12, xy: 0, xz: 0, yz: 0, about: centre'))[0]).toBe(10);
    expect(
      faultsOf(body('xx: 10, yy: 11, zz: 12, xy: 0, xz: 0, yz: 1, about: centre')).map((f) => f.code),
    ).toEqual(['BODY_PRODUCTS_UNDECLARED']);
  });

  it('are refused when no body can have them, and the message names the reading that would do', () => {
    const [fault] = faultsOf(
      body(
        'xx: 2.00, yy: 2.00, zz: 2.00, xy: 0.900, xz: 0.900, yz: 0.900, about: centre, products: negative',
      ),
    );
    expect(fault).toMatchObject({ code: 'BODY_IMPOSSIBLE', at: { line: 3 } });
    // J = 2·1 + 0.9·(ones − 1): moments 1.1, 1.1, 3.8, short by 1.6.
    expect(fault!.message).toContain('1.1');
    expect(fault!.message).toContain('3.8');
    expect(fault!.message).toContain('short of it by 1.6 ');
    expect(fault!.hint).toContain("with the products' sign the other way");
  });

  it('pass with a warning when only the rounding of their digits makes them impossible', () => {
    // A flat plate: zz = xx + yy, each rounded to three digits on its own.
    const codes = (zz: string) =>
      rollUpText(body(`xx: 1.11, yy: 2.22, zz: ${zz}, xy: 0, xz: 0, yz: 0, about: centre`)).warnings.map(
        (w) => w.code,
      );
    expect(codes('3.34')).toEqual(['BODY_IMPOSSIBLE_BY_ROUNDING']);
    expect(codes('3.33')).toEqual([]);
    expect(
      faultsOf(body('xx: 1.11, yy: 2.22, zz: 3.36, xy: 0, xz: 0, yz: 0, about: centre')).map((f) => f.code),
    ).toEqual(['BODY_IMPOSSIBLE']);
  });

  it('are doubted when they look like placeholders or slips of units', () => {
    const codes = (inertia: string) =>
      rollUpText(`
        assembly: b
        parts:
          - { name: box, solid: { box: { size: [ 0.3, 0.3, 0.3 ] } }, mass: 1 }
          - { name: p, body: { mass: 1.6, inertia: { ${inertia}, xy: 0, xz: 0, yz: 0, about: centre } } }
      `).warnings.map((w) => w.code);
    expect(codes('xx: 1, yy: 1, zz: 1')).toContain('BODY_PLACEHOLDER');
    expect(codes('xx: 1e-3, yy: 1e-3, zz: 1e-3')).toContain('BODY_PLACEHOLDER');
    expect(codes('xx: 0, yy: 0, zz: 0')).toEqual(['BODY_PLACEHOLDER']);
    expect(codes('xx: 1.6, yy: 1.7, zz: 1.5')).toEqual(['BODY_GYRATION_TOO_LARGE']);
    expect(codes('xx: 1.6e-9, yy: 1.7e-9, zz: 1.5e-9')).toEqual(['BODY_TOO_COMPACT']);
    expect(codes('xx: 1.6e-3, yy: 1.7e-3, zz: 1.5e-3')).toEqual([]);
  });

  it('have symmetric matrices', () => {
    expect(
      placesOf(
        faultsOf(
          body(
            'matrix: [ [ 10, -1, -2 ], [ -1, 11, -3 ], [ -2, -3.5, 12 ] ], about: centre, products: negative',
          ),
        ),
      ),
    ).toEqual(['BODY_NOT_SYMMETRIC 3:118']);
  });
});

describe('a part’s own numbers', () => {
  it('add to the whole', () => {
    const roll = rollUpText(`
      assembly: a
      parts:
        - { name: a, solid: { box: { size: [ 1, 2, 3 ] } }, mass: 3, at: [ 1, 0, 0 ] }
        - { name: b, solid: { cone: { diameter: 1, height: 2 } }, mass: 2, rotate: [ { x: 40 deg } ] }
    `);
    expect(inertiaAboutCentre(roll.total.basic)[0]).toBeGreaterThan(0);
    expect(roll.leaves.map((l) => l.path)).toEqual(['a', 'b']);
  });
});
