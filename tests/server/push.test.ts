import { gzipSync } from 'node:zlib';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Pushed } from '#core/api/push.ts';
import type { RunDetail, RunPage } from '#core/api/runs.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { stampOf } from '#core/record/stamp.ts';
import { CORE_VERSION } from '#core/version.ts';
import { type Person, type Project, Run } from '#server/models/index.ts';
import { sha256 as hash } from '#server/services/secrets.ts';
import { machineText } from '../helpers/machine-text.ts';
import { pushBody, recordsOfText } from '../helpers/pushed-records.ts';
import { type Client, TestServer, until } from '../helpers/test-server.ts';

let server: TestServer;
let project: Project;
let engineer: Person;
let ci: Client;

beforeAll(async () => {
  server = await TestServer.start();
  project = await server.project('rover');
  engineer = await server.person('Push Er', 'engineer', project);
  ci = server.withToken(await server.token(engineer, project, 'push'));
});
afterAll(() => server.stop());

const places = { project: 'rover' };
const pushAll = (records: readonly RollUpRecord[], key?: string) =>
  ci.ask<Pushed>('pushRuns', { places, body: pushBody(records, key) });
const sendInput = (text: string, sha256: string) =>
  ci.ask('putInput', { places: { ...places, sha256 }, body: new TextEncoder().encode(text) });
const runOf = (id: string) => ci.get<RunDetail>('showRun', { places: { ...places, run: id } });
const recomputed = (id: string) =>
  until(async () => {
    const { run } = await runOf(id);
    return run.recomputation.status !== 'waiting' && run.recomputation;
  });

const forged = (record: RollUpRecord): RollUpRecord => ({
  ...record,
  predicted: { ...record.predicted, mass: record.predicted.mass * 1.01 },
});

describe('a push', () => {
  it('is in the history when it is acknowledged, and once however often it is sent', async () => {
    const records = recordsOfText(machineText(1.1), { commit: 'a'.repeat(40), branch: 'main' });
    const first = await pushAll(records, 'first-key');
    expect(first.status).toBe(201);
    expect(first.body.runs.map((r) => r.status)).toEqual(['created', 'created']);
    const { rows } = await ci.get<RunPage>('listRuns', { places });
    expect(rows.map((row) => row.id)).toEqual(expect.arrayContaining(first.body.runs.map((r) => r.id!)));
    const again = await pushAll(records, 'another-key');
    expect(again.status).toBe(200);
    expect(again.body.runs.map((r) => [r.status, r.id])).toEqual(first.body.runs.map((r) => ['known', r.id]));
  });

  it('of one record from another commit is another run of the same stored record', async () => {
    const text = machineText(1.2);
    const [one] = (await pushAll(recordsOfText(text, { commit: 'b'.repeat(40) }))).body.runs;
    const [two] = (await pushAll(recordsOfText(text, { commit: 'c'.repeat(40) }))).body.runs;
    expect(two!.status).toBe('created');
    const [a, b] = await Promise.all([Run.findByPk(one!.id!), Run.findByPk(two!.id!)]);
    expect(a!.recordId).toBe(b!.recordId);
  });

  it('without a commit is told apart by its key', async () => {
    const records = recordsOfText(machineText(1.3));
    const ids = async (key: string) => (await pushAll(records, key)).body.runs.map((r) => r.id);
    const first = await ids('key-number-one');
    expect(await ids('key-number-one')).toEqual(first);
    expect(await ids('key-number-two')).not.toEqual(first);
  });

  it('sent twice at the same moment is one run', async () => {
    const records = recordsOfText(machineText(1.4), { commit: 'd'.repeat(40) });
    const answers = await Promise.all(Array.from({ length: 8 }, () => pushAll(records)));
    const ids = new Set(answers.flatMap((a) => a.body.runs.map((r) => r.id)));
    expect(ids.size).toBe(2);
    expect(answers.flatMap((a) => a.body.runs).filter((r) => r.status === 'created')).toHaveLength(2);
  });

  it('is refused, with its reason, when the stamp is not of what it says, and the others are kept', async () => {
    const [good, bad] = recordsOfText(machineText(1.5), { commit: 'e'.repeat(40) });
    const { body, status } = await pushAll([good!, { ...bad!, state: 'flying' }]);
    expect(status).toBe(201);
    expect(body.runs.map((r) => r.status)).toEqual(['created', 'refused']);
    expect(body.runs[1]!.fault).toMatchObject({ code: 'RECORD_STAMP' });
  });

  it('is refused when it says other figures than the server computes under that stamp', async () => {
    const records = recordsOfText(machineText(1.6), { commit: 'f'.repeat(40) });
    const { text, sha256 } = records[0]!.inputs[0]!;
    await sendInput(text!, sha256);
    const { body: first } = await pushAll(records);
    for (const { id } of first.runs) await recomputed(id!);
    const { body } = await pushAll(records.map(forged));
    expect(body.runs.map((r) => r.fault?.code)).toEqual(['RECORD_CONTRADICTS', 'RECORD_CONTRADICTS']);
  });

  it('with false figures does not keep the true ones out, whichever came first', async () => {
    const [record] = recordsOfText(machineText(1.65), { commit: '0'.repeat(40) });
    const { text, sha256 } = record!.inputs[0]!;
    await sendInput(text!, sha256);
    const [wrong] = (await pushAll([forged(record!)])).body.runs;
    expect((await recomputed(wrong!.id!)).status).toBe('differs');
    const [right] = (await pushAll([record!])).body.runs;
    expect(right!.status).toBe('created');
    expect((await recomputed(right!.id!)).status).toBe('recomputed');
    expect((await runOf(wrong!.id!)).run.recomputation.status).toBe('differs');
  });

  it('is computed again when its inputs come later', async () => {
    const [record] = recordsOfText(machineText(1.66), { commit: '7'.repeat(40) });
    const [run] = (await pushAll([record!])).body.runs;
    expect((await recomputed(run!.id!)).status).toBe('not recomputable');
    const { text, sha256 } = record!.inputs[0]!;
    await sendInput(text!, sha256);
    expect((await pushAll([record!])).body.runs[0]).toMatchObject({ status: 'known', id: run!.id });
    await until(async () => (await runOf(run!.id!)).run.recomputation.status === 'recomputed');
  });

  it('from a tree with changes is another run than from the commit it stands on', async () => {
    const text = machineText(1.67, 9);
    const at = { commit: '8'.repeat(40), branch: 'mine' };
    const [dirty] = (await pushAll(recordsOfText(text, { ...at, dirty: true }))).body.runs;
    const [clean] = (await pushAll(recordsOfText(text, at))).body.runs;
    expect(clean!.id).not.toBe(dirty!.id);
    expect((await runOf(clean!.id!)).run.dirty).toBe(false);
    // The branch is merged as it was: the run belongs to the watched branch from then on, and stays one.
    const [merged] = (await pushAll(recordsOfText(text, { ...at, branch: 'main' }))).body.runs;
    expect(merged).toMatchObject({ status: 'known', id: clean!.id });
    expect((await runOf(clean!.id!)).run.branch).toBe('main');
  });

  it('in the same moment as others that bring the same records in another order comes through', async () => {
    const records = Array.from({ length: 12 }, (_, i) =>
      recordsOfText(machineText(4 + i / 100), { commit: '9'.repeat(39) + i.toString(16) }),
    ).flat();
    const answers = await Promise.all(
      [records, [...records].reverse(), records, [...records].reverse()].map((all) => pushAll(all)),
    );
    for (const { status } of answers) expect([200, 201]).toContain(status);
    const created = answers.flatMap((a) => a.body.runs).filter((r) => r.status === 'created');
    expect(created).toHaveLength(24);
  });

  it('of what is no record is refused as a whole, with the place of the fault', async () => {
    const [record] = recordsOfText(machineText(1.7));
    const broken = { ...record!, basic: { ...record!.basic, mass: 'heavy' } } as unknown as RollUpRecord;
    const { status, body } = await ci.ask<{ code: string; faults: { message: string }[] }>('pushRuns', {
      places,
      body: pushBody([broken]),
    });
    expect(status).toBe(400);
    expect(body.faults[0]!.message).toContain('runs.0.record.basic.mass');
  });

  it('may be packed, and is bounded, in size and in depth', async () => {
    const json = JSON.stringify(pushBody(recordsOfText(machineText(1.8))));
    const headers = { 'content-type': 'application/json', 'content-encoding': 'gzip' };
    const packed = await ci.ask('pushRuns', { places, body: new Uint8Array(gzipSync(json)), headers });
    expect(packed.status).toBe(201);
    const deep = new TextEncoder().encode(`${'['.repeat(5000)}${']'.repeat(5000)}`);
    const plain = { 'content-type': 'application/json' };
    expect(await ci.problem('pushRuns', { places, body: deep, headers: plain })).toBe('400 BODY_TOO_DEEP');
    const bomb = new Uint8Array(gzipSync(Buffer.alloc(80 * 2 ** 20, ' ')));
    expect(await ci.problem('pushRuns', { places, body: bomb, headers })).toBe('413 BODY_TOO_LARGE');
    const cut = new Uint8Array(gzipSync(json).subarray(0, 100));
    expect(await ci.problem('pushRuns', { places, body: cut, headers })).toBe('400 BODY_NOT_READ');
  });
});

describe('an input', () => {
  it('is asked for until it is there, and must be what its hash says', async () => {
    const [record] = recordsOfText(machineText(2));
    const { sha256, text } = record!.inputs[0]!;
    const missing = () =>
      ci.get<{ missing: string[] }>('findMissingInputs', { places, body: { sha256: [sha256] } });
    expect((await missing()).missing).toEqual([sha256]);
    expect((await sendInput(`${text} `, sha256)).body).toMatchObject({ code: 'INPUT_HASH' });
    expect((await sendInput(text!, sha256)).status).toBe(204);
    expect((await sendInput(text!, sha256)).status).toBe(204);
    expect((await missing()).missing).toEqual([]);
  });
});

describe('the server’s own computation', () => {
  it('gives the same bits from the inputs, and draws the machine', async () => {
    const records = recordsOfText(machineText(2.1), { commit: '1'.repeat(40) });
    const [input] = records[0]!.inputs;
    await sendInput(input!.text!, input!.sha256);
    const { body } = await pushAll(records);
    for (const { id } of body.runs)
      expect(await recomputed(id!)).toEqual({ status: 'recomputed', detail: null });
    const drawing = await ci.ask<string>('downloadDrawing', {
      places: { ...places, run: body.runs[0]!.id! },
    });
    expect(drawing.body).toContain('<svg');
  });

  it('says where a record differs from what it computes', async () => {
    const records = recordsOfText(machineText(2.2), { commit: '2'.repeat(40) });
    const [input] = records[0]!.inputs;
    await sendInput(input!.text!, input!.sha256);
    const [record] = records;
    const wrong = { ...record!, basic: { ...record!.basic, mass: record!.basic.mass + 1e-15 * 8 } };
    const { body } = await pushAll([wrong]);
    const found = await recomputed(body.runs[0]!.id!);
    expect(found.status).toBe('differs');
    expect(found.detail).toMatch(/^basic\.mass: pushed 4\.20000000000000\d+, computed here 4\.2/);
  });

  it('says what keeps it from computing: an input that did not come, another version of the core', async () => {
    const [record] = recordsOfText(machineText(2.3), { commit: '3'.repeat(40) });
    const { body } = await pushAll([record!]);
    expect(await recomputed(body.runs[0]!.id!)).toEqual({
      status: 'not recomputable',
      detail: 'inputs that did not come with it: rover.yaml',
    });
    const old = { ...record!, conventions: { ...record!.conventions, coreVersion: '0' } };
    const { inputs, state, parameters } = old;
    old.stamp = stampOf(inputs, 'rover.yaml', state, parameters, '0', hash);
    const [pushed] = (await pushAll([old])).body.runs;
    expect(await recomputed(pushed!.id!)).toEqual({
      status: 'not recomputable',
      detail: `made by core version 0; this server has ${CORE_VERSION}`,
    });
  });
});

describe('a limit newly broken on a watched branch', () => {
  it('is told by mail to those who want it, once', async () => {
    const quiet = await server.person('Quiet One', 'viewer', project);
    await quiet.update({ mailLimits: false });
    const provenance = (commit: string) => ({
      commit: commit.repeat(40),
      branch: 'main',
      author: 'A <a@b.example>',
    });
    await pushAll(recordsOfText(machineText(1, 3.5), provenance('4')));
    expect(server.mail().filter((m) => m.subject.includes('all up'))).toEqual([]);
    await pushAll(recordsOfText(machineText(3, 3.5), provenance('5')));
    const { text, subject } = await server.letter(engineer.email, 'all up outside on main');
    // 2 kg and 3 kg with 10 % growth: 5.3 kg against 3.5 kg.
    expect(subject).toBe('rover, driving: all up outside on main');
    expect(text).toContain('5.3');
    expect(text).toContain('over by 1.8');
    expect(text).toContain('tip (rover.yaml:6)');
    // Broken already: nothing new.
    await pushAll(recordsOfText(machineText(3.1, 3.5), provenance('6')));
    await until(async () => (await Run.count({ where: { commit: '6'.repeat(40) } })) > 0);
    const told = server.mail().filter((m) => m.subject.includes('all up'));
    expect(told.map((m) => m.to)).toEqual([engineer.email]);
  });

  it('is not told of after one click on the link in the mail', async () => {
    const { text } = await server.letter(engineer.email, 'all up outside on main');
    const link = /mail-stop\/(\S+)/.exec(text)![1]!;
    expect((await server.anyone().ask('stopMail', { places: { link } })).status).toBe(204);
    await engineer.reload();
    expect([engineer.mailLimits, engineer.mailReleases]).toEqual([false, false]);
    expect(await server.anyone().problem('stopMail', { places: { link: 'forged' } })).toBe('404 NOT_FOUND');
  });
});
