import { describe, expect, it } from 'vitest';
import type { Difference } from '#core/difference/index.ts';
import { CliTest } from '../helpers/cli-test.ts';

const machine = (tip: string, x: string) => `
  assembly: beam
  units: { length: mm, mass: g }
  parts:
    - { name: base, solid: particle, mass: 300 }
    - { name: tip, solid: particle, mass: ${tip}, at: [ ${x}, 0, 0 ] }
`;

describe('steelyard diff', () => {
  it('says what moved and which part moved it, summing to the change', async () => {
    const test = new CliTest().file('a.yaml', machine('100', '400')).file('b.yaml', machine('200', '400'));
    const [d] = await test.json<Difference[]>('diff', 'a.yaml', 'b.yaml');
    const change = (name: string) => d!.quantities.find((q) => q.name === name)!.change!;
    expect(change('mass')).toBeCloseTo(0.1, 15);
    // centre: 400·100/400 = 100 mm before, 400·200/500 = 160 mm after
    expect(change('centre.x')).toBeCloseTo(0.06, 15);
    // Iyy: (0.3·0.1/0.4)·0.16 = 0.012 before, (0.3·0.2/0.5)·0.16 = 0.0192 after
    expect(change('inertia.yy')).toBeCloseTo(0.0072, 15);
    const sum = d!.parts.reduce((s, p) => {
      const c = p.contributions['inertia.yy'];
      return c ? s + c.mass + c.place + c.shapeAndTurn : s;
    }, 0);
    expect(sum).toBeCloseTo(0.0072, 15);
    expect(d!.parts.find((p) => p.path === 'base')!.contributions).toEqual({});
  });

  it('takes records, files and git revisions alike', async () => {
    const test = new CliTest().file('m.yaml', machine('100', '400'));
    await test.git('init', '-q', '-b', 'trunk');
    await test.git('add', '.');
    await test.git('commit', '-q', '-m', 'first');
    await test.steelyard('run', 'm.yaml', '-o', 'released.json');
    test.file('m.yaml', machine('100', '500'));
    const fromGit = await test.json<Difference[]>('diff', 'trunk:m.yaml', 'm.yaml');
    const fromRecord = await test.json<Difference[]>('diff', 'released.json', 'm.yaml');
    expect(fromGit[0]!.quantities).toEqual(fromRecord[0]!.quantities);
    expect(fromGit[0]!.a.stamp).toBe(fromRecord[0]!.a.stamp);
    // place alone: 100 mm · 100/400
    expect(fromGit[0]!.quantities.find((q) => q.name === 'centre.x')!.change).toBeCloseTo(0.025, 15);
    for (const wrong of ['nowhere:m.yaml', 'trunk:none.yaml', '--upload-pack=x:m.yaml']) {
      const { status, stderr } = await test.steelyard('diff', '--', wrong, 'm.yaml');
      expect([wrong, status]).toEqual([wrong, 2]);
      expect(stderr).toMatch(/GIT_REVISION|FILE_MISSING/);
    }
  });

  it('exits 1 when a change is over what --fail-over allows, and says by how much', async () => {
    const test = new CliTest().file('a.yaml', machine('100', '400')).file('b.yaml', machine('106', '400'));
    const fine = await test.steelyard('diff', 'a.yaml', 'b.yaml', '--fail-over', 'mass=6.5g');
    expect(fine.status).toBe(0);
    const over = await test.steelyard(
      'diff',
      'a.yaml',
      'b.yaml',
      '--fail-over',
      'mass=5',
      '--fail-over',
      'centre.x=1 m',
    );
    expect([over.status, over.stderr]).toEqual([
      1,
      expect.stringContaining('the change is 6 g, more than 5 g'),
    ]);
    const unknown = await test.steelyard('diff', 'a.yaml', 'b.yaml', '--fail-over', 'mas=5');
    expect([unknown.status, unknown.stderr]).toEqual([2, expect.stringContaining("did you mean 'mass'?")]);
    const wrongUnit = await test.steelyard('diff', 'a.yaml', 'b.yaml', '--fail-over', 'mass=5 mm');
    expect([wrongUnit.status, wrongUnit.stderr]).toEqual([
      2,
      expect.stringContaining('EXPRESSION_WRONG_DIMENSION'),
    ]);
  });

  it('takes a percentage as one of A’s value, where a share of that means something', async () => {
    const test = new CliTest().file('a.yaml', machine('100', '400')).file('b.yaml', machine('106', '400'));
    const over = (limit: string) => test.steelyard('diff', 'a.yaml', 'b.yaml', '--fail-over', limit);
    // 6 g of 400 g is 1.5 %.
    expect((await over('mass=1.6 %')).status).toBe(0);
    const mass = await over('mass=1%');
    expect([mass.status, mass.stderr]).toEqual([
      1,
      expect.stringContaining('the change is 6 g, more than 4 g'),
    ]);
    for (const [limit, says] of [
      ['centre.x=1%', 'a place, a product or an angle'],
      ['inertia.xy=1%', 'a percentage of zero'],
      ['inertia.xx=1%', 'a percentage of zero'],
      ['mass=1% + 1', 'more than a number and %'],
    ] as const) {
      const { status, stderr } = await over(limit);
      expect([limit, status, stderr.replace(/\s+/g, ' ')]).toEqual([limit, 2, expect.stringContaining(says)]);
    }
  });

  it('attributes the quantity that is asked for, to as many parts as asked for, in Markdown as well', async () => {
    const test = new CliTest().file('a.yaml', machine('100', '400')).file('b.yaml', machine('106', '410'));
    const { stdout } = await test.steelyard(
      ...['diff', 'a.yaml', 'b.yaml', '--quantity', 'inertia.yy', '--parts', '1', '-f', 'markdown'],
    );
    expect(stdout.match(/### Who moved it.*/g)).toEqual([expect.stringContaining('Iyy about the centre')]);
  });

  it('prints a table within 80 columns whose contributions add up, and Markdown', async () => {
    const test = new CliTest().file('a.yaml', machine('100', '400')).file('b.yaml', machine('106', '410'));
    const { stdout } = await test.steelyard('diff', 'a.yaml', 'b.yaml', '--format', 'table');
    for (const line of stdout.split('\n')) expect([...line].length, line).toBeLessThanOrEqual(80);
    expect(stdout).toContain('Who moved it: mass');
    const markdown = await test.steelyard('diff', 'a.yaml', 'b.yaml', '-o', 'd.md');
    expect([markdown.status, markdown.stdout]).toEqual([0, '']);
    expect(test.read('d.md')).toContain('### Who moved it');
  });

  it('says that nothing moved where nothing did', async () => {
    const test = new CliTest().file('a.yaml', machine('100', '400'));
    const { stdout, status } = await test.steelyard('diff', 'a.yaml', 'a.yaml', '--format', 'table');
    expect([status, stdout]).toEqual([0, expect.stringContaining('nothing moved')]);
  });

  it('refuses what is not a record, with how to make one', async () => {
    const test = new CliTest()
      .file('a.yaml', machine('100', '400'))
      .file('x.json', '{"schema":"steelyard-record/1"}')
      .file('y.json', 'mass: 3');
    for (const [name, code] of [
      ['x.json', 'RECORD_SHAPE'],
      ['y.json', 'RECORD_NOT_JSON'],
    ] as const) {
      const { status, stderr } = await test.steelyard('diff', name, 'a.yaml');
      expect([status, stderr]).toEqual([2, expect.stringContaining(code)]);
      expect(stderr).toContain('steelyard run --format json');
    }
  });
});
