import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Release, RunDetail, RunPage } from '#core/api/runs.ts';
import { AuditEntry, type Person, type Project } from '#server/models/index.ts';
import { machineText } from '../helpers/machine-text.ts';
import { pushBody, recordsOfText } from '../helpers/pushed-records.ts';
import { type Client, TestServer, until } from '../helpers/test-server.ts';

let server: TestServer;
let project: Project;
let ci: Client;
let approver: Person;
let who: Record<'engineer' | 'other' | 'approver' | 'second' | 'viewer', Client>;

beforeAll(async () => {
  server = await TestServer.start();
  project = await server.project('rover');
  const engineer = await server.person('Pre Parer', 'engineer', project);
  const people = {
    engineer,
    other: await server.person('Check Er', 'engineer', project),
    approver: await server.person('Appro Ver', 'approver', project),
    second: await server.person('Second Approver', 'approver', project),
    viewer: await server.person('View Er', 'viewer', project),
  };
  approver = people.approver;
  ci = server.withToken(await server.token(people.approver, project, 'push'));
  const clients = await Promise.all(
    Object.entries(people).map(async ([name, person]) => [name, await server.signIn(person)] as const),
  );
  who = Object.fromEntries(clients) as typeof who;
});
afterAll(() => server.stop());

let commits = 0;

/** Pushes one run with its input, waits for the server's own computation, and gives its places. */
async function pushed(tip: number, more: Record<string, unknown> = {}, limit = 9, by: Client = ci) {
  commits += 1;
  const commit = commits.toString(16).padStart(40, '9');
  const provenance = { commit, branch: 'main', author: 'Some One <some@example.org>', ...more };
  const [record] = recordsOfText(machineText(tip, limit), provenance);
  const { text, sha256 } = record!.inputs[0]!;
  await by.get('putInput', { places: { project: 'rover', sha256 }, body: new TextEncoder().encode(text) });
  const { runs } = await by.get<{ runs: { id: string }[] }>('pushRuns', {
    places: { project: 'rover' },
    body: pushBody([record!], `key-of-push-${commits}`),
  });
  const places = { project: 'rover', run: runs[0]!.id };
  await until(async () => (await detail(places)).run.recomputation.status !== 'waiting');
  return places;
}

const detail = (places: Record<string, string>, as: Client = who.viewer) =>
  as.get<RunDetail>('showRun', { places });

describe('a release', () => {
  it('is asked for, checked and made by three people, whose names stay', async () => {
    const places = await pushed(1, { author: 'Pre Parer <pre.parer@example.org>' });
    expect((await detail(places, who.approver)).may.release).toEqual({
      allowed: false,
      why: 'Nobody has asked for its release yet.',
    });
    await who.engineer.get('askForRelease', { places });
    await who.other.get('markAsChecked', { places });
    const release = await who.approver.get<Release>('releaseRun', { places, body: {} });
    expect(release).toMatchObject({
      state: 'released',
      preparedBy: 'Pre Parer',
      checkedBy: 'Check Er',
      approvedBy: 'Appro Ver',
    });
    const { rows } = await who.viewer.get<RunPage>('listRuns', { places: { project: 'rover' } });
    expect(rows.find((row) => row.id === places.run)!.release).toBe('released');
    const trail = await AuditEntry.findAll({ order: ['id'] });
    expect(trail.map((e) => [e.who, e.action])).toEqual([
      ['Pre Parer', 'release.asked'],
      ['Check Er', 'release.checked'],
      ['Appro Ver', 'release.made'],
    ]);
    expect((await server.letter('view.er@example.org', 'Appro Ver released rover')).text).toContain('/runs/');
  });

  it('is the baseline of later runs until it is withdrawn, with a reason', async () => {
    const released = await pushed(1.1);
    await who.engineer.get('askForRelease', { places: released });
    await who.approver.get('releaseRun', { places: released, body: {} });
    const later = await pushed(1.2);
    expect((await detail(later)).baseline?.id).toBe(released.run);
    // 2 kg and 1.1 kg with 10 % growth.
    expect((await detail(later)).baselineLimits['all up']).toBeCloseTo(3.21, 12);
    expect(await who.approver.problem('withdrawRelease', { places: released, body: { reason: '' } })).toBe(
      '400 BODY_NOT_RIGHT',
    );
    await who.second.get('withdrawRelease', { places: released, body: { reason: 'wrong load case' } });
    expect((await detail(later)).baseline?.id).not.toBe(released.run);
    expect((await detail(released)).release).toMatchObject({
      state: 'withdrawn',
      withdrawnBy: 'Second Approver',
      withdrawnReason: 'wrong load case',
    });
    // It can be asked for anew, and begins anew.
    await who.engineer.get('askForRelease', { places: released });
    expect((await detail(released)).release).toMatchObject({
      state: 'asked',
      approvedBy: null,
      withdrawnBy: null,
    });
  });

  it('is not made by who pushed the run, nor by who wrote its commit, by name or by address', async () => {
    const own = server.withToken(await server.token(approver, project, 'push', 'person'));
    const mine = await pushed(1.3, {}, 9, own);
    await who.engineer.get('askForRelease', { places: mine });
    expect((await detail(mine, who.approver)).may.release.why).toBe('You pushed it yourself.');
    expect(await who.approver.problem('releaseRun', { places: mine, body: {} })).toBe('409 RELEASE_NOT_NOW');
    await who.second.get('releaseRun', { places: mine, body: {} });
    for (const author of [
      'Appro Ver <else@example.org>',
      'Someone <APPRO.VER@example.org>',
      'appro.ver@example.org',
    ]) {
      const written = await pushed(1.4, { author });
      await who.engineer.get('askForRelease', { places: written });
      expect((await detail(written, who.approver)).may.release.why).toBe('You wrote its commit yourself.');
      expect(await who.approver.problem('releaseRun', { places: written, body: {} })).toBe(
        '409 RELEASE_NOT_NOW',
      );
    }
  });

  it('is not made of a dirty tree, nor of what the server cannot compute again or computes otherwise', async () => {
    const dirty = await pushed(1.5, { dirty: true });
    expect(await who.engineer.problem('askForRelease', { places: dirty })).toBe('409 RELEASE_NOT_NOW');
    expect((await detail(dirty, who.engineer)).may.ask.why).toContain('not committed');
    const [record] = recordsOfText(machineText(7), { commit: 'e'.repeat(40) });
    const { runs } = await ci.get<{ runs: { id: string }[] }>('pushRuns', {
      places: { project: 'rover' },
      body: pushBody([record!]),
    });
    const places = { project: 'rover', run: runs[0]!.id };
    await until(async () => (await detail(places)).run.recomputation.status === 'not recomputable');
    expect((await detail(places, who.engineer)).may.ask.why).toBe('The server cannot compute it again.');
  });

  it('with a broken limit takes a written reason', async () => {
    const broken = await pushed(2, {}, 3);
    await who.engineer.get('askForRelease', { places: broken });
    expect((await detail(broken)).needsReason).toBe(true);
    expect(await who.approver.problem('releaseRun', { places: broken, body: {} })).toBe('400 RELEASE_REASON');
    const reason = 'test article, never flown';
    expect(await who.approver.get<Release>('releaseRun', { places: broken, body: { reason } })).toMatchObject(
      { reason },
    );
  });

  it('is made once, however many press at the same moment', async () => {
    const places = await pushed(1.6);
    await who.engineer.get('askForRelease', { places });
    const answers = await Promise.all(
      [who.approver, who.second, who.approver, who.second].map((c) =>
        c.ask('releaseRun', { places, body: {} }),
      ),
    );
    expect(answers.map((a) => a.status).sort()).toEqual([200, 409, 409, 409]);
  });
});

describe('a run from a machine', () => {
  it('that says no author counts as pushed by who gave it the token', async () => {
    const places = await pushed(1.8, { author: undefined });
    await who.engineer.get('askForRelease', { places });
    expect((await detail(places, who.approver)).may.release.why).toBe('You pushed it yourself.');
    await who.second.get('releaseRun', { places, body: {} });
  });

  it('keeps the names on its release when people are renamed', async () => {
    const places = await pushed(1.9);
    await who.engineer.get('askForRelease', { places });
    await who.engineer.get('changeAccount', { body: { name: 'Pre Parer-Newname' } });
    expect((await detail(places)).release!.preparedBy).toBe('Pre Parer');
    await who.engineer.get('changeAccount', { body: { name: 'Pre Parer' } });
  });
});

describe('a comment', () => {
  it('stands on its run, and is removed by who wrote it alone', async () => {
    const places = await pushed(1.7);
    await who.engineer.get('addComment', { places, body: { text: ' tip is heavier ' } });
    const { comments } = await detail(places);
    expect(comments).toMatchObject([{ by: 'Pre Parer', text: 'tip is heavier', mine: false }]);
    const comment = String(comments[0]!.id);
    expect(await who.other.problem('removeComment', { places: { ...places, comment } })).toBe(
      '404 NOT_FOUND',
    );
    await who.engineer.get('removeComment', { places: { ...places, comment } });
    expect((await detail(places)).comments).toEqual([]);
  });
});
