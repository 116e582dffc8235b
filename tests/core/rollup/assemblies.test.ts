import { describe, expect, it } from 'vitest';
import { selectPart } from '#core/record/select-part.ts';
import { expectClose } from '../../helpers/expect-body.ts';
import { referenceCase } from '../../helpers/reference-cases.ts';
import { faultsOf, type Given, placesOf, recordOfText, rollUpText } from '../../helpers/roll-up-text.ts';

const mass = (yaml: string, given: Given = {}) => recordOfText(yaml, given).basic.mass;
const limit = (yaml: string, given: Given = {}) => recordOfText(yaml, given).limits[0]!;

describe('growth', () => {
  it('gives basic, predicted and shares as the terms are defined (ANSI/AIAA S-120A: predicted = basic + allowance)', () => {
    // Three line items: 120 kg at 12 %, 45.5 kg at 25 %, 30 kg at 3 %: 195.5 basic, 222.175 predicted, limit 260.
    const record = recordOfText(`
      assembly: items
      growth: { early: 12 %, rough: 25 %, late: 3 % }
      parts:
        - { name: a, solid: particle, mass: 120, maturity: early }
        - { name: b, solid: particle, mass: 45.5, maturity: rough }
        - { name: c, solid: particle, mass: 30, maturity: late }
      limits: [ { name: allowable, quantity: mass, max: 260 } ]
    `);
    expect(record.basic.mass).toBeCloseTo(195.5, 12);
    expect(record.predicted.mass).toBeCloseTo(222.175, 12);
    expect(record.limits[0]).toMatchObject({
      on: 'predicted',
      margin: expect.closeTo(37.825, 11),
      marginOfLimit: expect.closeTo(0.14548076923076925, 13),
    });
  });

  it('goes by category where a table names one, else by the plain table', () => {
    const predicted = (part: string) =>
      recordOfText(`
        assembly: g
        growth: { estimated: 10 %, wiring: { estimated: 50 % } }
        parts: [ { name: p, solid: particle, mass: 100, ${part} } ]
      `).predicted.mass;
    expect(predicted('maturity: estimated')).toBeCloseTo(110, 12);
    expect(predicted('maturity: estimated, category: wiring')).toBeCloseTo(150, 12);
    expect(predicted('maturity: estimated, category: structure')).toBeCloseTo(110, 12);
  });

  it('goes down to children that state none, and warns once of parts without maturity', () => {
    const roll = rollUpText(`
      assembly: g
      growth: { estimated: 10 %, measured: 0 % }
      parts:
        - name: group
          maturity: estimated
          parts:
            - { name: a, solid: particle, mass: 100 }
            - { name: b, solid: particle, mass: 100, maturity: measured }
        - { name: c, solid: particle, mass: 1 }
        - { name: d, solid: particle, mass: 1 }
    `);
    expect(roll.total.predicted.mass).toBeCloseTo(212, 12);
    expect(roll.warnings).toEqual([
      {
        code: 'GROWTH_NO_MATURITY',
        message: 'no maturity, so no growth allowance (0 %), on c, d',
        at: { file: 'top.yaml', line: 9 },
      },
    ]);
  });

  it('refuses a maturity that the table does not have', () => {
    expect(
      placesOf(
        faultsOf(`
      assembly: g
      growth: { estimated: 10 % }
      parts: [ { name: p, solid: particle, mass: 1, maturity: estimted } ]
    `),
      ),
    ).toEqual(['MODEL_UNKNOWN_MATURITY 3:57']);
  });

  it('refuses an allowance below zero, also one that a parameter makes', () => {
    const given = (allowance: string) => `
      assembly: g
      parameters: { gx: -150 % }
      growth: { estimated: ${allowance} }
      parts: [ { name: p, solid: particle, mass: 1, maturity: estimated } ]
    `;
    for (const allowance of ['gx', '-150 %', 'gx / 2 - 75 %']) {
      const [fault] = faultsOf(given(allowance));
      expect(placesOf([fault!])).toEqual(['GROWTH_NEGATIVE 3:22']);
      expect(fault!.message).toBe('expected a growth allowance of zero or more, found -150 %');
    }
    expect(recordOfText(given('-gx')).predicted.mass).toBeCloseTo(2.5, 14);
  });

  it('refuses a prediction in which a cut-out has outgrown its host', () => {
    // A 40 mm hole through a 100 mm cube of 1 g/mm³: 1000 − 160 g; the cut grows by its own maturity.
    const cube = (allowance: string, hole = '40, 40, 100', x = '0') => `
      assembly: c
      units: { length: mm, mass: g }
      growth: { firm: 0 %, loose: ${allowance} }
      parts:
        - name: cube
          solid: { box: { size: [ 100, 100, 100 ] } }
          density: 1e-3
          maturity: firm
          parts: [ { name: hole, solid: { box: { size: [ ${hole} ] } }, cut: true, at: [ ${x}, 0, 0 ], maturity: loose } ]
    `;
    expect(recordOfText(cube('100 %')).predicted.mass).toBeCloseTo(0.68, 14);
    // At seven times its mass the hole weighs more than the cube.
    const [gone] = faultsOf(cube('600 %'));
    expect(gone).toMatchObject({ code: 'ASSEMBLY_NO_MASS', message: expect.stringContaining('growth') });
    // A slice of 100 g at one face, five times its mass: ∫x² is 0.83 g·m² of the cube less 1.02 g·m².
    const [more] = faultsOf(cube('400 %', '10, 100, 100', '45'));
    expect(more).toMatchObject({ code: 'ASSEMBLY_IMPOSSIBLE', message: expect.stringContaining('growth') });
  });

  it('sums a margin study’s units as they are published (ESA SRE-PA/2011.097: 5, 10 and 20 % by category)', () => {
    const record = recordOfText(`
      assembly: study
      growth: { off the shelf: 5 %, modified: 10 %, new: 20 % }
      parts:
        - { name: a, solid: particle, mass: 40, maturity: off the shelf }
        - { name: b, solid: particle, mass: 25, maturity: modified }
        - { name: c, solid: particle, mass: 60, maturity: new }
    `);
    expect(record.predicted.mass).toBeCloseTo(141.5, 12);
  });
});

describe('override', () => {
  const group = (override: string, maturity = '') => `
    assembly: o
    growth: { estimated: 20 %, measured: 0 % }
    parts:
      - name: tail
        ${maturity}
        override: ${override}
        parts:
          - { name: a, solid: particle, mass: 1, at: [ 1, 0, 0 ], maturity: estimated }
          - { name: b, solid: particle, mass: 3, at: [ -1, 0, 0 ], maturity: measured }
  `;

  it('scales mass and tensor, keeps the centre, and is listed', () => {
    const record = recordOfText(group('{ mass: 8, reason: weighed }'));
    expect(record.basic.mass).toBe(8);
    expect(record.basic.centre).toEqual([-0.5, 0, 0]);
    // (1·3/4)·2² = 3, doubled.
    expect(record.basic.inertia!.aboutCentre[1]![1]).toBeCloseTo(6, 14);
    expect(record.overrides).toEqual([
      { path: 'tail', reason: 'weighed', at: { file: 'top.yaml', line: 6 }, from: 4, to: 8 },
    ]);
    // Growth of the group as it was: 4.2 / 4.
    expect(record.predicted.mass).toBeCloseTo(8.4, 13);
    expect(record.parts.map((p) => p.basic.mass)).toEqual([2, 6]);
    const contributions = record.parts.reduce((s, p) => s + p.predicted.mass, 0);
    expect(contributions).toBeCloseTo(8.4, 13);
  });

  it('grows by its own maturity where it states one', () => {
    expect(
      recordOfText(group('{ mass: 8, reason: weighed }', 'maturity: measured')).predicted.mass,
    ).toBeCloseTo(8, 13);
  });

  it('is per copy, and refused where there is nothing to scale', () => {
    expect(
      mass(`
      assembly: o
      parts: [ { name: p, solid: particle, mass: 1, override: { mass: 3, reason: r }, repeat: { mirror: xz }, at: [ 0, 1, 0 ] } ]
    `),
    ).toBe(6);
    const code = (part: string) =>
      faultsOf(`assembly: o\nparts: [ { name: q, solid: particle, mass: 1 }, { name: p, ${part} } ]`).map(
        (f) => f.code,
      );
    expect(code('solid: particle, mass: 0, override: { mass: 3, reason: r }')).toEqual([
      'OVERRIDE_NOT_POSITIVE',
    ]);
    expect(code('solid: particle, mass: 1, override: { mass: 0, reason: r }')).toEqual([
      'OVERRIDE_NOT_POSITIVE',
    ]);
  });
});

describe('states and parameters', () => {
  const boom = `
    assembly: s
    units: { length: mm, mass: g }
    parameters: { half: boom / 2, boom: { value: 400 mm, min: 100 mm, max: 500 mm } }
    states:
      flight: {}
      stowed: { parameters: { boom: 200 }, omit: [ antenna ] }
    parts:
      - { name: tip, solid: particle, mass: 10, at: [ half, 0, 0 ] }
      - { name: antenna, solid: particle, mass: 5 }
      - { name: cover, solid: particle, mass: 7, states: [ stowed ] }
  `;

  it('choose parts and values; --set goes before the state, the state before the file', () => {
    expect(mass(boom, { state: 'flight' })).toBeCloseTo(0.015, 16);
    expect(mass(boom, { state: 'stowed' })).toBeCloseTo(0.017, 16);
    const tip = (given: Given) => recordOfText(boom, given).parts[0]!.basic.centre[0];
    expect(tip({ state: 'flight' })).toBe(0.2);
    expect(tip({ state: 'stowed' })).toBe(0.1);
    expect(tip({ state: 'stowed', set: { boom: '30 cm' } })).toBe(0.15);
  });

  it('hold a parameter to its own bounds, wherever its value comes from', () => {
    expect(placesOf(faultsOf(boom, { set: { boom: '600' } }))).toEqual(['PARAMETER_OUT_OF_RANGE 3:46']);
    expect(faultsOf(boom.replace('boom: 200 }', 'boom: 99 }'), { state: 'stowed' })[0]!.message).toContain(
      'at least 100 mm',
    );
  });

  it('report circles with their path, also those that a state closes', () => {
    const circle = faultsOf(
      'assembly: c\nparameters: { a: b + 1 mm, b: 2 * c, c: a }\nparts: [ { name: p, solid: particle, mass: 1 } ]',
    );
    expect(circle.map((f) => f.code)).toEqual(['PARAMETER_CIRCLE']);
    expect(circle[0]!.message).toMatch(/a → b → c → a/);
    const inState = faultsOf(
      'assembly: c\nparameters: { a: 1 mm, b: a }\nstates: { s: { parameters: { a: b } } }\nparts: [ { name: p, solid: particle, mass: 1 } ]',
    );
    expect(inState.map((f) => f.code)).toEqual(['PARAMETER_CIRCLE']);
  });

  it.each([
    ['states: { s: { omit: [ nose ] } }', 'MODEL_UNKNOWN_PART'],
    ['states: { s: { parameters: { len: 1 } } }', 'MODEL_UNKNOWN_PARAMETER'],
    ['limits: [ { name: l, quantity: mass, max: 1, states: [ s ] } ]', 'MODEL_UNKNOWN_STATE'],
    ['limits: [ { name: l, quantity: mass, max: 1, of: nose } ]', 'MODEL_UNKNOWN_PART'],
    ['limits: [ { name: l, quantity: mass, max: 1, frame: nose } ]', 'MODEL_UNKNOWN_FRAME'],
    ['limits: [ { name: l, quantity: mass } ]', 'LIMIT_WITHOUT_STOP'],
    ['limits: [ { name: l, quantity: mass, min: 3, max: 1 } ]', 'LIMIT_EMPTY'],
    ['limits: [ { name: l, quantity: centre.q, max: 1 } ]', 'EXPRESSION_UNKNOWN_NAME'],
    ['limits: [ { name: l, quantity: mass, max: 1 mm } ]', 'EXPRESSION_WRONG_DIMENSION'],
    ['parameters: { mm: 1 }', 'PARAMETER_NAME'],
    ['parameters: { mass: 1 }', 'PARAMETER_NAME'],
    ['parameters: { a: { value: 1 mm, u: -1 um } }', 'MODEL_UNCERTAINTY_NEGATIVE'],
    ['growth: { estimated: -5 % }', 'GROWTH_NEGATIVE'],
    ['units: { length: kg }', 'UNITS_WRONG_KIND'],
    ['units: { length: parsec }', 'UNITS_UNKNOWN_NAME'],
    ['sweeps: { s: { vary: { a: [ 1, 2 ] } } }', 'MODEL_UNKNOWN_PARAMETER'],
    ['materials: { a: { density: 2700 kg } }', 'EXPRESSION_WRONG_DIMENSION'],
  ])('refuse { %s } with %s', (line, code) => {
    expect(
      faultsOf(
        `assembly: s\n${line}\nparts: [ { name: p, solid: particle, mass: 1, maturity: estimated } ]`,
      ).map((f) => f.code),
    ).toContain(code);
  });
});

describe('includes', () => {
  const wing = `
    assembly: wing
    units: { length: cm, mass: kg }
    parameters: { span: 100 cm, thick: span / 10 }
    states: { spread: {}, folded: { parameters: { span: 50 } } }
    parts:
      - { name: spar, solid: { rod: { length: span } }, mass: 2 }
      - { name: tip, solid: particle, mass: 1, at: [ 0, 0, thick ], states: [ spread ] }
  `;
  const top = (more: string) => `
    assembly: top
    units: { length: mm, mass: g }
    parameters: { half: 400 mm }
    states: { flight: {}, stowed: {} }
    parts: [ { name: wing, include: wing.yaml, ${more} } ]
  `;
  const files = { 'wing.yaml': wing };

  it('take `with` values in the caller’s units, and keep units of their own', () => {
    const span = (more: string) => recordOfText(top(more), { files }).parameters['wing/span'];
    expect(span('state: spread')).toEqual({ value: 1, unit: 'm' });
    expect(span('state: spread, with: { span: 2 * half }')).toEqual({ value: 0.8, unit: 'm' });
    expect(span('state: spread, with: { span: 700 }')).toEqual({ value: 0.7, unit: 'm' });
    expect(span('state: folded')).toEqual({ value: 0.5, unit: 'm' });
  });

  it('choose a state for all of the caller’s, or by name', () => {
    const masses = (more: string) => ['flight', 'stowed'].map((state) => mass(top(more), { files, state }));
    expect(masses('state: spread')).toEqual([3, 3]);
    expect(masses('state: { flight: spread, stowed: folded }')).toEqual([3, 2]);
    expect(faultsOf(top('at: [ 0, 0, 0 ]'), { files }).map((f) => f.code)).toEqual(['INCLUDE_STATE_MISSING']);
  });

  it('are refused in circles, where missing, and with names they do not have, at the place that names them', () => {
    const codes = (more: string, other = files) => placesOf(faultsOf(top(more), { files: other }));
    expect(codes('state: spred')).toEqual(['MODEL_UNKNOWN_STATE 5:51']);
    expect(codes('state: spread, with: { spam: 1 }')).toEqual(['MODEL_UNKNOWN_PARAMETER 5:67']);
    expect(codes('state: spread', {} as never)).toEqual(['FILE_MISSING 5:33']);
    const circle = { 'wing.yaml': 'assembly: w\nparts: [ { name: t, include: top.yaml } ]' };
    const [fault] = faultsOf(top('state: x'), { files: circle });
    expect(fault).toMatchObject({ code: 'INCLUDE_CIRCLE', at: { file: 'wing.yaml', line: 2 } });
    expect(fault!.message).toContain('top.yaml → wing.yaml → top.yaml');
  });

  it('use their own growth table where they have one, else the caller’s, and judge no limits of theirs', () => {
    const part = 'parts: [ { name: p, solid: particle, mass: 100, maturity: estimated } ]';
    const predicted = (inner: string) =>
      recordOfText('assembly: t\ngrowth: { estimated: 10 % }\nparts: [ { name: i, include: i.yaml } ]', {
        files: { 'i.yaml': `assembly: i\n${inner}${part}\nlimits: [ { name: l, quantity: mass, max: 1 } ]` },
      });
    expect(predicted('').predicted.mass).toBeCloseTo(110, 12);
    expect(predicted('growth: { estimated: 30 % }\n').predicted.mass).toBeCloseTo(130, 12);
    expect(predicted('').limits).toEqual([]);
  });

  it('have the copies that an outer state leaves out by their path', () => {
    const wing = 'assembly: w\nparts: [ { name: p, solid: particle, mass: 1, repeat: { mirror: xz } } ]';
    const leaving = (path: string) =>
      `assembly: t\nstates: { s: { omit: [ "${path}" ] } }\nparts: [ { name: w, include: w.yaml } ]`;
    expect(mass(leaving('w/p[2]'), { files: { 'w.yaml': wing } })).toBe(1);
    expect(placesOf(faultsOf(leaving('w/p[3]'), { files: { 'w.yaml': wing } }))).toEqual([
      'MODEL_UNKNOWN_PART 2:24',
    ]);
  });

  it('lose the parts that an outer state leaves out by their path', () => {
    const yaml = `
      assembly: t
      states: { all: {}, bare: { omit: [ w/tip ] } }
      parts: [ { name: w, include: wing.yaml, state: spread } ]
    `;
    expect(['all', 'bare'].map((state) => mass(yaml, { files, state }))).toEqual([3, 2]);
  });
});

describe('limits', () => {
  const two = (limits: string, more = '') => `
    assembly: l
    units: { length: mm, mass: kg, angle: deg }
    ${more}
    parts:
      - { name: a, solid: particle, mass: 3, at: [ 100, 0, 0 ] }
      - { name: b, solid: particle, mass: 1, at: [ -100, 200, 50 ] }
    limits: [ ${limits} ]
  `;

  it('measure the margin to the nearest stop, absolute and of the limit', () => {
    // centre.x = (300 − 100)/4 = 50 mm
    expect(limit(two('{ name: x, quantity: centre.x, min: 40, max: 70 }'))).toMatchObject({
      value: expect.closeTo(0.05, 15),
      nearest: 'min',
      margin: expect.closeTo(0.01, 15),
      marginOfLimit: expect.closeTo(0.25, 13),
      verdict: 'within',
      unit: 'm',
      shown: { unit: 'mm', factor: 0.001 },
    });
    expect(limit(two('{ name: x, quantity: centre.x, max: 40 mm }'))).toMatchObject({
      nearest: 'max',
      margin: expect.closeTo(-0.01, 15),
      verdict: 'outside',
    });
    expect(limit(two('{ name: x, quantity: centre.z, max: 0 }')).marginOfLimit).toBeNull();
  });

  it('take any expression of the quantities of a roll-up', () => {
    const value = (quantity: string) => limit(two(`{ name: x, quantity: "${quantity}", min: -1e9 }`)).value;
    // By hand: M 4 kg, μ = 3/4, d = (200, −200, −50) mm.
    expect(value('mass')).toBe(4);
    expect(value('inertia.xx')).toBeCloseTo(0.75 * (0.04 + 0.0025), 14);
    expect(value('inertia.xy')).toBeCloseTo(0.75 * 0.04, 14);
    expect(value('origin.zz')).toBeCloseTo(3 * 0.01 + 1 * (0.01 + 0.04), 14);
    expect(value('gyration.x')).toBeCloseTo(Math.sqrt((0.75 * 0.0425) / 4), 14);
    expect(value('principal.min')).toBeCloseTo(0, 14);
    expect(value('principal.max')).toBeCloseTo(0.75 * 0.0825, 13);
    expect(value('mass * centre.x')).toBeCloseTo(0.2, 14);
    expect(value('inertia.zz / max(inertia.xx, inertia.yy)')).toBeCloseTo(0.08 / 0.0425, 12);
    expect(value('hypot(centre.x, centre.y)')).toBeCloseTo(Math.hypot(0.05, 0.05), 14);
    expect(value('basic.mass + predicted.mass')).toBe(8);
  });

  it('use parameters, frames and parts of the file', () => {
    const frame = 'frames: { f: { at: [ 50, 0, 0 ], rotate: [ { z: 90 deg } ] } }';
    // In axes turned by 90° about z from (50, 0, 0): x' = y, y' = −(x − 50).
    const inFrame = (quantity: string) =>
      limit(two(`{ name: x, quantity: ${quantity}, frame: f, max: 1e9 }`, frame)).value;
    expect(inFrame('centre.x')).toBeCloseTo(0.05, 15);
    expect(inFrame('centre.y')).toBeCloseTo(0, 15);
    expect(inFrame('inertia.xy')).toBeCloseTo(-0.75 * 0.04, 14);
    expect(limit(two('{ name: x, quantity: mass, of: b, max: 1e9 }')).value).toBe(1);
    expect(limit(two('{ name: x, quantity: mass / m0, max: 2 }', 'parameters: { m0: 2 kg }')).value).toBe(2);
  });

  it('are within to the stop itself, and outside where there is no value', () => {
    expect(limit(two('{ name: x, quantity: mass, max: 4 }')).verdict).toBe('within');
    expect(
      limit(
        two(
          '{ name: x, quantity: sqrt(mass - 5 kg) / 1 kg^0.5, max: 4 }'
            .replace(' / 1 kg^0.5', '')
            .replace('sqrt(mass - 5 kg)', 'mass / (mass - 4 kg)'),
        ),
      ),
    ).toMatchObject({
      value: null,
      margin: null,
      verdict: 'outside',
    });
  });

  it('name the parts that push a broken one out, by how far it moves back without them', () => {
    const { heaviest } = limit(two('{ name: x, quantity: centre.x, max: 0 }'));
    // Without a the centre is at −100 mm: it accounts for 150 mm; b pulls the other way.
    expect(heaviest).toEqual([
      { path: 'a', at: { file: 'top.yaml', line: 5 }, value: expect.closeTo(0.15, 14) },
    ]);
  });

  it('weigh nothing of a part that the state leaves out', () => {
    const yaml = `
      assembly: l
      states: { full: {}, bare: { omit: [ b ] } }
      parts: [ { name: a, solid: particle, mass: 1 }, { name: b, solid: particle, mass: 2, at: [ 1, 0, 0 ] } ]
      limits:
        - { name: mass of b, quantity: mass, of: b, max: 3 }
        - { name: place of b, quantity: centre.x, of: b, max: 3 }
    `;
    expect(recordOfText(yaml, { state: 'bare' }).limits.map((l) => [l.value, l.verdict])).toEqual([
      [0, 'within'],
      [null, 'outside'],
    ]);
  });

  describe('of a part inside a repeated one', () => {
    const servos = (more: string, head = '') => `
      assembly: l
      units: { length: mm, mass: g }
      ${head}
      parts:
        - name: servo
          at: [ 0, 30, 0 ]
          repeat: { mirror: xz }
          parts:
            - { name: horn, solid: particle, mass: 50, at: [ 10, 5, 0 ] }
            - name: case
              solid: { box: { size: [ 20, 10, 10 ] } }
              density: 2 g/cm^3
              parts: [ { name: hole, solid: { box: { size: [ 2, 2, 2 ] } }, cut: true, at: [ 1, 2, 3 ] } ]
      ${more}
    `;
    const of = (path: string, quantity = 'mass', max = '1') =>
      limit(servos(`limits: [ { name: x, quantity: ${quantity}, of: "${path}", max: ${max} } ]`));

    it('weigh that part in all copies together, or in the copy that is named', () => {
      expect(of('servo/horn')).toMatchObject({ value: expect.closeTo(0.1, 15), verdict: 'outside' });
      expect(of('servo[2]/horn').value).toBeCloseTo(0.05, 15);
      // Horns at y = ±35 mm: 2 · 50 g · (35 mm)².
      expect(of('servo/horn', 'inertia.zz').value).toBeCloseTo(0.1 * 0.035 ** 2, 18);
      expect(of('servo[2]/horn', 'centre.y').value).toBeCloseTo(-0.035, 15);
      expect(of('servo/horn').heaviest.map((h) => h.path)).toEqual(['servo[1]/horn', 'servo[2]/horn']);
    });

    it('weigh what cut-outs of all copies take away, and name them where that is too much', () => {
      // 8 mm³ of 2 g/cm³ each.
      expect(of('servo/case/hole', 'mass', '0.001')).toMatchObject({
        value: expect.closeTo(32e-6, 18),
        heaviest: [
          { path: 'servo[1]/case/hole', value: expect.closeTo(16e-6, 18) },
          { path: 'servo[2]/case/hole', value: expect.closeTo(16e-6, 18) },
        ],
      });
    });

    it('refuse a copy that the part does not make, where it is named', () => {
      const limits = (path: string, more = '') =>
        servos(`limits:\n        - { name: x, quantity: mass, of: "${path}", max: 1${more} }`);
      const [fault] = faultsOf(limits('servo[5]'));
      expect(placesOf([fault!])).toEqual(['MODEL_UNKNOWN_PART 15:36']);
      expect(fault!.message).toBe("expected a copy from servo[1] to servo[2], found 'servo[5]'");
      expect(faultsOf(limits('servo[3]/horn'))[0]!.code).toBe('MODEL_UNKNOWN_PART');
      expect(faultsOf(limits('servo[0]'))[0]!.code).toBe('MODEL_UNKNOWN_PART');
      expect(faultsOf(limits('servo[01]'))[0]!.code).toBe('MODEL_UNKNOWN_PART');
    });

    it('weigh nothing of a copy that the state leaves out', () => {
      const yaml = servos(
        'limits: [ { name: x, quantity: mass, of: "servo[2]/horn", max: 1 }, { name: y, quantity: mass, of: servo/horn, max: 1 } ]',
        'states: { one: { omit: [ "servo[2]" ] } }',
      );
      expect(recordOfText(yaml).limits.map((l) => l.value)).toEqual([0, expect.closeTo(0.05, 15)]);
    });

    it('are what `--of` picks as well', () => {
      const yaml = servos('');
      const roll = rollUpText(yaml);
      const picked = (path: string) => selectPart(roll, recordOfText(yaml), path).basic;
      expect(picked('servo/horn').mass).toBeCloseTo(0.1, 15);
      expectClose(picked('servo/horn').centre!, [0.01, 0, 0], 1e-15);
      expect(() => picked('servo[3]/horn')).toThrow('servo[3]/horn');
    });
  });

  it('hold what a published spinner needs: the tilt of its axis (½ atan2(2 Ixz, Izz − Ixx))', () => {
    // The F-16’s Ixz = +982 slug·ft² is the plus integral (Stevens & Lewis, App. A): its principal axis tilts by 1.049°.
    const { inputs, expected } = referenceCase('L-f16');
    const value = limit(`
      assembly: f16
      units: { length: ft, mass: slug, angle: deg }
      parts:
        - name: all
          body:
            mass: 636.94
            inertia: { xx: ${inputs.Ixx}, yy: ${inputs.Iyy}, zz: ${inputs.Izz}, xy: 0, xz: ${inputs.Ixz_plus_integral}, yz: 0, about: centre, products: positive }
      limits: [ { name: tilt, quantity: tilt.x, max: 2 deg } ]
    `).value!;
    expectClose([(value * 180) / Math.PI], [expected.principal_axis_tilt_deg], 1e-12);
  });
});
