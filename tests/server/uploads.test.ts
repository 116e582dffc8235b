import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Uploaded } from '#core/api/push.ts';
import type { RunDetail } from '#core/api/runs.ts';
import { Input, Run } from '#server/models/index.ts';
import { machineText } from '../helpers/machine-text.ts';
import { recordsOfText } from '../helpers/pushed-records.ts';
import { type Client, TestServer } from '../helpers/test-server.ts';

let server: TestServer;
let client: Client;
const places = { project: 'rover' };

beforeAll(async () => {
  server = await TestServer.start({ RECOMPUTE_SECONDS: '20' });
  const project = await server.project('rover');
  client = await server.signIn(await server.person('Up Loader', 'engineer', project));
});
afterAll(() => server.stop());

function form(
  files: Readonly<Record<string, string | Uint8Array>>,
  more: Record<string, string> = {},
): FormData {
  const data = new FormData();
  for (const content of Object.values(files))
    data.append('files', new Blob([content as never]), 'of the browser');
  data.append('paths', JSON.stringify(Object.keys(files)));
  for (const [key, value] of Object.entries(more)) data.append(key, value);
  return data;
}

const upload = (files: Parameters<typeof form>[0], more?: Parameters<typeof form>[1]) =>
  client.ask<Uploaded>('upload', { places, body: form(files, more) });

describe('an upload', () => {
  it('is rolled up in every state and kept, to the same stamp as the command gives', async () => {
    const { body, status } = await upload({ 'rover.yaml': machineText(1) });
    expect(status).toBe(200);
    expect(body.faults).toEqual([]);
    expect(body.runs.map((r) => [r.state, r.stamp, r.recomputation.status])).toEqual(
      recordsOfText(machineText(1)).map((r) => [r.state, r.stamp, 'recomputed']),
    );
    const detail = await client.get<RunDetail>('showRun', { places: { ...places, run: body.runs[0]!.id } });
    expect(detail.hasDrawing).toBe(true);
  });

  it('takes includes in folders, and a mesh', async () => {
    const stl = readFileSync(
      join(import.meta.dirname, '..', '..', 'examples', 'two-link-arm', 'bracket.stl'),
    );
    const { body } = await upload(
      {
        'rover/top.yaml':
          'assembly: top\nparts:\n  - { name: half, include: parts/half.yaml }\n  - { name: bracket, solid: { mesh: { file: ../meshes/bracket.stl, unit: mm, fill: solid } }, density: 7850 kg/m^3 }\n',
        'rover/parts/half.yaml': 'assembly: half\nparts: [ { name: p, solid: particle, mass: 1 } ]\n',
        'meshes/bracket.stl': stl,
      },
      { top: 'rover/top.yaml' },
    );
    expect(body.faults).toEqual([]);
    expect(body.runs).toHaveLength(1);
    const inputs = await client.get<{ path: string; bytes: number | null }[]>('showInputs', {
      places: { ...places, run: body.runs[0]!.id },
    });
    expect(inputs.map((i) => [i.path, i.bytes])).toEqual([
      ['rover/top.yaml', null],
      ['rover/parts/half.yaml', null],
      ['meshes/bracket.stl', stl.length],
    ]);
  });

  it('with faults shows each with its place and the text, and keeps nothing', async () => {
    const before = [await Run.count(), await Input.count()];
    const text =
      'assembly: wrong\nparts:\n  - { name: p, solid: particle, mass: 1 m }\n  - { name: p, solid: sphere }\n';
    const { body } = await upload({ 'wrong.yaml': text });
    expect(body.runs).toEqual([]);
    expect(body.faults.length).toBeGreaterThan(0);
    for (const fault of body.faults) expect(fault.at).toMatchObject({ file: 'wrong.yaml' });
    expect(body.texts).toEqual([{ path: 'wrong.yaml', text }]);
    expect([await Run.count(), await Input.count()]).toEqual(before);
  });

  it('refuses names that lead out of the project, twice the same, and too many', async () => {
    const refused = async (files: Parameters<typeof form>[0], more?: Parameters<typeof form>[1]) =>
      (await upload(files, more)).body as unknown as { code: string };
    const text = machineText(1);
    for (const path of [
      '../rover.yaml',
      '/etc/rover.yaml',
      'a/../../b.yaml',
      'a\u0000b.yaml',
      'a\\..\\..\\b.yaml',
    ])
      expect(await refused({ [path]: text }), path).toMatchObject({ code: 'UPLOAD_NAME' });
    expect(await refused({ 'a.yaml': text }, { top: 'b.yaml' })).toMatchObject({ code: 'UPLOAD_TOP' });
    expect(await refused({ 'a/b.yaml': text, './a/b.yaml': text })).toMatchObject({ code: 'UPLOAD_TWICE' });
    expect(await refused({})).toMatchObject({ code: 'UPLOAD_EMPTY' });
    const many = Object.fromEntries(Array.from({ length: 201 }, (_, i) => [`${i}.yaml`, 'x']));
    expect((await upload(many)).status).toBe(413);
  });

  it('that is a bomb ends with a fault, and the server goes on', async () => {
    const parts = Array.from({ length: 9 }, (_, i) => `{ line: { count: 10, step: [${i}, 0, 0] } }`).join(
      ', ',
    );
    const text = `assembly: bomb\nparts:\n  - { name: p, solid: particle, mass: 1, repeat: [${parts}] }\n`;
    const { body } = await upload({ 'bomb.yaml': text });
    expect(body.faults.map((f) => f.code)).toEqual([expect.stringMatching(/TOO_LARGE|TOO_MANY|REPEAT/)]);
    expect((await upload({ 'rover.yaml': machineText(1) })).status).toBe(200);
  });
});
