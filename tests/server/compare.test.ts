import { XMLParser } from 'fast-xml-parser';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Comparison, InputTexts } from '#core/api/runs.ts';
import { difference } from '#core/difference/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { machineText } from '../helpers/machine-text.ts';
import { pushBody, recordsOfText } from '../helpers/pushed-records.ts';
import { type Client, TestServer } from '../helpers/test-server.ts';

let server: TestServer;
let client: Client;
let runs: string[];
const texts = [machineText(1), machineText(1.25).replace('[300, 0, 0]', '[340, 10, 0]')];
const records = texts.map(
  (text, i) => recordsOfText(text, { commit: String(i).repeat(40), branch: 'main' })[0]!,
);
const places = { project: 'rover' };

beforeAll(async () => {
  server = await TestServer.start();
  const project = await server.project('rover');
  const person = await server.person('Compa Rer', 'engineer', project);
  client = await server.signIn(person);
  const ci = server.withToken(await server.token(person, project, 'push'));
  for (const record of records) {
    const { text, sha256 } = record.inputs[0]!;
    await ci.get('putInput', { places: { ...places, sha256 }, body: new TextEncoder().encode(text) });
  }
  const pushed = await ci.get<{ runs: { id: string }[] }>('pushRuns', { places, body: pushBody(records) });
  runs = pushed.runs.map((r) => r.id);
});
afterAll(() => server.stop());

describe('a comparison', () => {
  it('is what core says of the two records, to the last bit', async () => {
    const found = await client.get<Comparison>('compareRuns', { places, query: { a: runs[0], b: runs[1] } });
    const wanted = difference(records[0]!, records[1]!, 'predicted');
    expect(found.difference).toEqual(JSON.parse(JSON.stringify(wanted)));
    expect([found.a.id, found.b.id]).toEqual(runs);
    // 0.25 kg with 10 % growth, all of it by the tip.
    const mass = found.difference.quantities.find((q) => q.name === 'mass')!;
    expect(mass.change).toBeCloseTo(0.275, 12);
    const tip = found.difference.parts.find((p) => p.path === 'tip')!;
    expect(tip.contributions.mass).toEqual({ mass: expect.closeTo(0.275, 12), place: 0, shapeAndTurn: 0 });
  });

  it('turned round has every sign flipped', async () => {
    const [ab, ba] = await Promise.all([
      client.get<Comparison>('compareRuns', { places, query: { a: runs[0], b: runs[1] } }),
      client.get<Comparison>('compareRuns', { places, query: { a: runs[1], b: runs[0] } }),
    ]);
    for (const [i, q] of ab.difference.quantities.entries())
      expect(ba.difference.quantities[i]!.change! + q.change!).toBeCloseTo(0, 14);
  });

  it('shows the text that changed, line by line', async () => {
    const { texts: patches } = await client.get<Comparison>('compareRuns', {
      places,
      query: { a: runs[0], b: runs[1] },
    });
    expect(patches.map((p) => p.path)).toEqual(['rover.yaml']);
    const lines = patches[0]!.patch.split('\n');
    expect(lines.filter((l) => /^-[^-]/.test(l))).toEqual([
      '-  - { name: tip, solid: particle, mass: 1, at: [300, 0, 0], maturity: estimated }',
    ]);
    expect(lines.filter((l) => /^\+[^+]/.test(l))).toEqual([
      '+  - { name: tip, solid: particle, mass: 1.25, at: [340, 10, 0], maturity: estimated }',
    ]);
  });

  it('with a baseline that is not there says so', async () => {
    expect(await client.problem('compareRuns', { places, query: { a: 'baseline', b: runs[1] } })).toBe(
      '404 NOT_FOUND',
    );
    expect(await client.problem('compareRuns', { places, query: { a: '0', b: 'x' } })).toBe('404 NOT_FOUND');
  });
});

describe('a download', () => {
  it('is the record as the command printed it, texts of inputs included', async () => {
    const [record] = await client.get<RollUpRecord[]>('downloadRecord', {
      places: { ...places, run: runs[0]! },
    });
    expect(record).toEqual(JSON.parse(JSON.stringify(records[0])));
  });

  it('is a URDF inertial that reads back as the body (URDF: ixy is the tensor’s element, about the centre)', async () => {
    const { body } = await client.ask<string>('downloadUrdf', { places: { ...places, run: runs[1]! } });
    const parser = new XMLParser({
      ignoreAttributes: false,
      attributeNamePrefix: '',
      parseAttributeValue: true,
    });
    const { inertial } = parser.parse(body);
    const { mass, centre, inertia } = records[1]!.predicted;
    expect(inertial.mass.value).toBe(mass);
    expect(inertial.origin.xyz.split(' ').map(Number)).toEqual(centre);
    const [x, y, z] = inertia!.aboutCentre;
    expect(inertial.inertia).toEqual({ ixx: x[0], ixy: x[1], ixz: x[2], iyy: y[1], iyz: y[2], izz: z[2] });
    // The tip lies at +x and +y of the cube: −∫ x y dm is negative.
    expect(inertial.inertia.ixy).toBeLessThan(0);
  });

  it('is the parts as CSV', async () => {
    const { body } = await client.ask<string>('downloadParts', { places: { ...places, run: runs[0]! } });
    expect(body).toContain('mass_kg');
    expect(body).toMatch(/,part,tip,basic,/);
  });

  it('is the inputs as text', async () => {
    const inputs = await client.get<InputTexts>('showInputs', { places: { ...places, run: runs[0]! } });
    expect(inputs).toMatchObject([{ path: 'rover.yaml', text: texts[0] }]);
  });
});
