import { describe, expect, it } from 'vitest';
import type { Explanations } from '#core/why/sentence.ts';
import { CliTest } from '../helpers/cli-test.ts';

const VENDOR = (inertia: string) => `
  assembly: vendor
  units: { length: mm, mass: g }
  parts:
    - name: receiver
      body:
        mass: 38.5 g
        centre: [ 12, 4, 3 ]
        inertia: { ${inertia} }
`;
const MAKER = 'xx: 5200, yy: 8100, zz: 9900, xy: -120, xz: 80, yz: 45, about: centre, products: negative';

describe('steelyard why', () => {
  it('says in a sentence which convention makes a body of a file differ from one written out', async () => {
    const test = new CliTest().file('v.yaml', VENDOR(MAKER));
    const other =
      '{ mass: 38.5 g, centre: [ 12 mm, 4 mm, 3 mm ], inertia: { xx: 5200 g*mm^2, yy: 8100 g*mm^2, zz: 9900 g*mm^2, xy: 120 g*mm^2, xz: -80 g*mm^2, yz: -45 g*mm^2, about: centre, products: negative } }';
    const { stdout, status } = await test.steelyard('why', 'v.yaml#receiver', other, '--format', 'table');
    expect(status).toBe(0);
    expect(stdout.split('\n')[0]).toBe('B is A with its products negated.');
    for (const line of stdout.split('\n')) expect([...line].length, line).toBeLessThanOrEqual(80);
  });

  it('explains a body that no body can have, which run refuses', async () => {
    // By hand: xx 5200 + 38.5·(4² + 3²), xy −120 − 38.5·12·4 and so on, declared about the centre.
    const aboutOrigin = VENDOR(
      'xx: 6162.5, yy: 13990.5, zz: 16060, xy: -1968, xz: -1306, yz: -417, about: origin, products: negative',
    );
    const test = new CliTest()
      .file('right.yaml', VENDOR(MAKER))
      .file('wrong.yaml', aboutOrigin.replace('about: origin', 'about: centre'));
    const found = await test.json<Explanations>('why', 'right.yaml#receiver', 'wrong.yaml#receiver');
    expect(found.summary).toBe('B is A about the origin, not about its centre.');
  });

  it('takes a record and a part of it', async () => {
    const test = new CliTest().file('v.yaml', VENDOR(MAKER));
    await test.steelyard('run', 'v.yaml', '-o', 'r.json');
    const found = await test.json<Explanations>('why', 'r.json#receiver', 'v.yaml#receiver');
    expect(found.agree).toBe(true);
    const whole = await test.json<Explanations>('why', 'r.json', 'v.yaml#receiver');
    expect(whole.agree).toBe(true);
  });

  const PLACED = `
    assembly: placed
    units: { length: mm, mass: g }
    parts:
      - name: bay
        at: [ 100, 0, 0 ]
        rotate: [ { x: 20 deg } ]
        parts:
          - name: rx
            body:
              mass: 30
              centre: [ -12, 2, 3 ]
              inertia: { xx: 5200, yy: 8100, zz: 9900, xy: -120, xz: 80, yz: 45, about: centre, products: negative }
            at: [ 40, 10, 5 ]
            rotate: [ { z: 30 deg } ]
            repeat: { mirror: xz }
  `;
  const SAME =
    '{ mass: 30 g, centre: [ -12 mm, 2 mm, 3 mm ], inertia: { xx: 5200 g*mm^2, yy: 8100 g*mm^2, zz: 9900 g*mm^2, xy: -120 g*mm^2, xz: 80 g*mm^2, yz: 45 g*mm^2, about: centre, products: negative } }';

  it('compares a body that its assembly turns, copies and mirrors in common axes', async () => {
    const test = new CliTest().file('f.yaml', PLACED);
    await test.steelyard('run', 'f.yaml', '-o', 'run.json');
    for (const [a, b] of [
      ['f.yaml#bay/rx', 'f.yaml#bay/rx'],
      ['f.yaml#bay/rx', SAME],
      [SAME, 'f.yaml#bay/rx'],
      ['f.yaml#bay/rx', 'run.json#bay/rx[1]'],
      ['run.json#bay/rx[1]', 'f.yaml#bay/rx[1]'],
      ['run.json#bay/rx[2]', 'f.yaml#bay/rx[2]'],
    ] as const) {
      const found = await test.json<Explanations>('why', a, b);
      expect([a, b, found.agree, found.explanations[0]!.centresAgree]).toEqual([a, b, true, true]);
    }
  });

  it('takes a body with the parameters and the state asked for', async () => {
    const test = new CliTest().file(
      'f.yaml',
      VENDOR('xx: 5200 * k, yy: 8100 * k, zz: 9900 * k, xy: 0, xz: 0, yz: 0, about: centre').replace(
        'parts:',
        'parameters: { k: 1 }\n  states: { one: {}, two: { parameters: { k: 2 } } }\n  parts:',
      ),
    );
    const differences = async (...more: string[]) =>
      (
        await test.json<Explanations>(
          'why',
          'f.yaml#receiver',
          '{ mass: 38.5 g, inertia: { xx: 5200 g*mm^2, yy: 8100 g*mm^2, zz: 9900 g*mm^2, xy: 0, xz: 0, yz: 0, about: centre } }',
          ...more,
        )
      ).differences.map((d) => d.a / d.b);
    expect(await differences()).toEqual([]);
    expect(await differences('--state', 'two')).toEqual([2, 2, 2].map((x) => expect.closeTo(x, 12)));
    expect(await differences('--set', 'k=3')).toEqual([3, 3, 3].map((x) => expect.closeTo(x, 12)));
    for (const [more, code] of [
      [['--set', 'q=3'], 'SET_UNKNOWN_PARAMETER'],
      [['--state', 'nope'], 'MODEL_UNKNOWN_STATE'],
      [['--state', 'one,two'], 'CALL_STATE'],
    ] as const) {
      const { status, stderr } = await test.steelyard('why', 'f.yaml#receiver', 'f.yaml#receiver', ...more);
      expect([status, stderr]).toEqual([2, expect.stringContaining(code)]);
    }
  });

  it('answers a wrong side with what is expected', async () => {
    const test = new CliTest().file('v.yaml', VENDOR(MAKER));
    for (const [side, code] of [
      ['v.yaml#reciever', 'CALL_TENSOR'],
      ['none.yaml', 'FILE_MISSING'],
      ['{ mass: 1 kg }', 'MODEL_MISSING_KEY'],
      ['{ mass: 1 kg, inertia: { xx: 1 mm } }', 'MODEL_MISSING_KEY'],
    ] as const) {
      const { status, stderr } = await test.steelyard('why', side, 'v.yaml#receiver');
      expect([side, status, stderr]).toEqual([side, 2, expect.stringContaining(code)]);
    }
  });
});
