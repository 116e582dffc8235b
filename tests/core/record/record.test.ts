import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { readRecords } from '#core/record/read-records.ts';
import { recordSchema } from '#core/record/record-schema.ts';
import { stampOf } from '#core/record/stamp.ts';
import { recordOfText } from '../../helpers/roll-up-text.ts';

const MACHINE = `
  assembly: cart
  units: { length: mm, mass: kg }
  parameters: { load: 3 kg }
  growth: { estimated: 20 %, measured: 0 % }
  frames: { rear: { at: [ -200, 0, 0 ] } }
  states: { full: {}, bare: { omit: [ cargo ] } }
  parts:
    - { name: bed, solid: { box: { size: [ 400, 300, 20 ] } }, mass: 4, category: structure, maturity: measured, basis: measured }
    - { name: cargo, solid: particle, mass: load, at: [ 50, 0, 40 ], category: load, maturity: estimated, basis: estimated }
    - { name: wheel, include: wheel.yaml, at: [ -100, 0, -50 ], repeat: [ { mirror: xz } ] }
`;
const WHEEL = `
  assembly: wheel
  units: { length: mm, mass: kg }
  parameters: { rim: 0.5 kg }
  parts: [ { name: rim, solid: particle, mass: rim, category: structure, basis: measured } ]
`;
const files = { 'wheel.yaml': WHEEL };

describe('the stamp', () => {
  const stamp = (yaml = MACHINE, more = {}) => recordOfText(yaml, { files, ...more }).stamp;

  it('is the same for the same inputs, state and values, whatever the provenance', () => {
    expect(stamp()).toBe(stamp());
    expect(stamp()).toMatch(/^[0-9a-f]{64}$/);
  });

  it('changes with a comment in a file, an included file, the state and a value that is set', () => {
    const stamps = [
      stamp(),
      stamp(`${MACHINE}  # a remark\n`),
      stamp(MACHINE, { files: { 'wheel.yaml': `${WHEEL}  # a remark\n` } }),
      stamp(MACHINE, { state: 'bare' }),
      stamp(MACHINE, { set: { load: '3.5 kg' } }),
    ];
    expect(new Set(stamps).size).toBe(5);
  });

  it('does not depend on the order in which inputs and parameters are listed', () => {
    const hash = (text: string) => createHash('sha256').update(text).digest('hex');
    const a = { path: 'a.yaml', sha256: '1' };
    const b = { path: 'b.yaml', sha256: '2' };
    const one = { value: 1, unit: 'kg' };
    const two = { value: 2, unit: 'kg' };
    expect(stampOf([a, b], 'a.yaml', 's', { p: one, q: two }, '1', hash)).toBe(
      stampOf([b, a], 'a.yaml', 's', { q: two, p: one }, '1', hash),
    );
    expect(stampOf([a, b], 'b.yaml', 's', { p: one, q: two }, '1', hash)).not.toBe(
      stampOf([a, b], 'a.yaml', 's', { p: one, q: two }, '1', hash),
    );
  });
});

describe('a record', () => {
  const record = recordOfText(MACHINE, { files });

  it('carries its inputs by path, hash and text, the top file first', () => {
    expect(record.inputs.map((i) => i.path)).toEqual(['top.yaml', 'wheel.yaml']);
    for (const { text, sha256 } of record.inputs)
      expect(sha256).toBe(createHash('sha256').update(text!).digest('hex'));
  });

  it('carries the parameters of included files under the path of what includes them', () => {
    expect(record.parameters).toEqual({
      load: { value: 3, unit: 'kg' },
      'wheel/rim': { value: 0.5, unit: 'kg' },
    });
  });

  it('sums masses by category and by basis to the total', () => {
    const by = (groups: typeof record.byCategory) =>
      groups.map((g) => [g.name, g.basic.mass, g.predicted.mass]);
    expect(by(record.byCategory)).toEqual([
      ['structure', 5, 5],
      ['load', 3, expect.closeTo(3.6, 12)],
    ]);
    expect(by(record.byBasis)).toEqual([
      ['measured', 5, 5],
      ['estimated', 3, expect.closeTo(3.6, 12)],
    ]);
    for (const groups of [record.byCategory, record.byBasis])
      for (const on of ['basic', 'predicted'] as const) {
        expect(groups.reduce((sum, g) => sum + g[on].mass, 0)).toBeCloseTo(record[on].mass, 12);
        expect(groups.reduce((sum, g) => sum + g.share[on], 0)).toBeCloseTo(1, 12);
      }
  });

  it('moves the origin of its tensor to the frame, by the parallel-axis theorem', () => {
    const { rear } = record.frames;
    expect(rear!.at).toEqual([-0.2, 0, 0]);
    const { mass, centre, inertia } = record.basic;
    expect(rear!.basic.centre![0]).toBeCloseTo(centre![0]! + 0.2, 14);
    const [x, , z] = rear!.basic.centre!;
    expect(rear!.basic.inertia!.aboutOrigin[1]![1]).toBeCloseTo(
      inertia!.aboutCentre[1]![1]! + mass * (x! ** 2 + z! ** 2),
      13,
    );
  });

  it('is read again as it was printed', () => {
    expect(recordSchema.parse(JSON.parse(JSON.stringify(record)))).toEqual(record);
    expect(readRecords(JSON.stringify([record]), 'r.json')).toEqual([record]);
  });
});
