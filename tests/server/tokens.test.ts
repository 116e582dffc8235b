import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { CreatedToken, Token as TokenAnswer } from '#core/api/people.ts';
import { AuditEntry, Membership, type Person, type Project, Token } from '#server/models/index.ts';
import { machineText } from '../helpers/machine-text.ts';
import { pushBody, recordsOfText } from '../helpers/pushed-records.ts';
import { type Client, TestServer } from '../helpers/test-server.ts';

let server: TestServer;
let project: Project;
let people: Record<'engineer' | 'other' | 'viewer' | 'administrator', Person>;
let engineer: Client;
const places = { project: 'rover' };
const push = (client: Client) =>
  client.ask('pushRuns', { places, body: pushBody(recordsOfText(machineText(1))) });
const wanted = (more: Partial<Record<'kind' | 'scope' | 'label', string>> = {}) => ({
  kind: 'machine',
  scope: 'push',
  label: 'CI of the rover',
  days: 30,
  ...more,
});

beforeAll(async () => {
  server = await TestServer.start();
  project = await server.project('rover');
  people = {
    engineer: await server.person('Tok En', 'engineer', project),
    other: await server.person('Oth Er', 'engineer', project),
    viewer: await server.person('View Er', 'viewer', project),
    administrator: await server.person('Admin One', 'administrator'),
  };
  engineer = await server.signIn(people.engineer);
});
afterAll(() => server.stop());

describe('a token', () => {
  it('is shown once, kept as a hash, pushes, and says when it was last used', async () => {
    const { token, secret } = await engineer.get<CreatedToken>('createToken', { places, body: wanted() });
    expect(token).toMatchObject({
      label: 'CI of the rover',
      kind: 'machine',
      scope: 'push',
      lastUsedAt: null,
    });
    const kept = (await Token.findByPk(token.id))!;
    expect(JSON.stringify(kept)).not.toContain(secret);
    expect((await push(server.withToken(secret))).status).toBe(201);
    const listed = await engineer.get<TokenAnswer[]>('listTokens', { places });
    expect(JSON.stringify(listed)).not.toContain(secret);
    expect(Date.parse(listed.find((t) => t.id === token.id)!.lastUsedAt!)).toBeGreaterThan(
      Date.now() - 60_000,
    );
  });

  it('ends when it is revoked, when it expires, and when its person’s account is shut or role is taken', async () => {
    const make = (more = {}) => engineer.get<CreatedToken>('createToken', { places, body: wanted(more) });
    const revoked = await make();
    await engineer.get('revokeToken', { places: { ...places, token: String(revoked.token.id) } });
    expect(await server.withToken(revoked.secret).problem('showProject', { places })).toBe(
      '401 TOKEN_NOT_VALID',
    );
    const expired = await make();
    await Token.update({ expiresAt: new Date(Date.now() - 1000) }, { where: { id: expired.token.id } });
    expect(await server.withToken(expired.secret).problem('showProject', { places })).toBe(
      '401 TOKEN_NOT_VALID',
    );

    const leaver = await server.person('Leav Er', 'engineer', project);
    const own = await server.token(leaver, project, 'push', 'person');
    const machine = await server.token(leaver, project, 'push', 'machine');
    expect((await push(server.withToken(own))).status).toBeLessThan(300);
    await Membership.destroy({ where: { personId: leaver.id } });
    expect((await push(server.withToken(own))).status).toBe(404);
    const admin = await server.signIn(people.administrator);
    await admin.get('changePerson', { places: { person: String(leaver.id) }, body: { active: false } });
    expect((await push(server.withToken(own))).status).toBe(401);
    // A machine's token is the project's: the CI goes on when someone leaves.
    expect((await push(server.withToken(machine))).status).toBe(200);
    const trail = (await AuditEntry.findAll()).map((e) => e.action);
    for (const action of ['token.made', 'token.revoked', 'account.shut']) expect(trail).toContain(action);
  });

  it('of a person is seen by them and an administrator; a machine’s by engineers; revoked by its owner or an administrator', async () => {
    const mine = await engineer.get<CreatedToken>('createToken', {
      places,
      body: wanted({ kind: 'person', label: 'laptop' }),
    });
    const labels = async (person: Person) =>
      (await (await server.signIn(person)).get<TokenAnswer[]>('listTokens', { places })).map((t) => t.label);
    expect(await labels(people.other)).not.toContain('laptop');
    expect(await labels(people.other)).toContain('CI of the rover');
    expect(await labels(people.viewer)).toEqual([]);
    expect(await labels(people.administrator)).toContain('laptop');
    const token = String(mine.token.id);
    const other = await server.signIn(people.other);
    expect(await other.problem('revokeToken', { places: { ...places, token } })).toBe('404 NOT_FOUND');
    const admin = await server.signIn(people.administrator);
    await admin.get('revokeToken', { places: { ...places, token } });
    expect(await server.withToken(mine.secret).problem('showProject', { places })).toBe(
      '401 TOKEN_NOT_VALID',
    );
  });

  it('reads or pushes as its scope says, and does nothing else', async () => {
    const read = server.withToken(await server.token(people.engineer, project, 'read'));
    expect((await read.ask('listRuns', { places })).status).toBe(200);
    expect(await read.problem('pushRuns', { places, body: {} })).toBe('403 TOKEN_SCOPE');
    const pusher = server.withToken(await server.token(people.administrator, project, 'push'));
    expect(await pusher.problem('listPeople')).toBe('403 TOKEN_NOT_ENOUGH');
    expect(await pusher.problem('createToken', { places, body: wanted() })).toBe('403 TOKEN_NOT_ENOUGH');
    expect(await server.withToken('made up').problem('showProject', { places })).toBe('401 TOKEN_NOT_VALID');
  });
});
