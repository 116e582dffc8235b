import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Account, Invitation, Member, Person as PersonAnswer, Session } from '#core/api/people.ts';
import { AuditEntry, type Person, type Project, SignInFailure } from '#server/models/index.ts';
import { PASSWORD, TestServer } from '../helpers/test-server.ts';

let server: TestServer;
let project: Project;
let administrator: Person;

beforeAll(async () => {
  server = await TestServer.start();
  project = await server.project('rover');
  administrator = await server.person('Admin One', 'administrator');
});
afterAll(() => server.stop());

const lastAudit = async () => (await AuditEntry.findOne({ order: [['id', 'DESC']] }))!;
const linkIn = (text: string, path: string) => new RegExp(`/${path}/(\\S+)`).exec(text)![1]!;

describe('a session', () => {
  it('is a cookie that no script can read and no other site can send', async () => {
    const reply = await server
      .anyone()
      .ask('signIn', { body: { email: administrator.email, password: PASSWORD } });
    expect(reply.headers.get('set-cookie')).toMatch(/^steelyard_session=[^;]+; .*HttpOnly; SameSite=Strict/);
  });

  it('ends at once when signed out here, everywhere, or when the account is shut', async () => {
    const person = await server.person('Short Lived', 'viewer', project);
    const [here, there, third] = [
      await server.signIn(person),
      await server.signIn(person),
      await server.signIn(person),
    ];
    await here.get('signOut');
    expect(await here.problem('showAccount')).toBe('401 NOT_SIGNED_IN');
    expect((await there.get<Account>('showAccount')).sessions).toHaveLength(2);
    await there.get('signOutEverywhere');
    expect(await third.problem('showAccount')).toBe('401 NOT_SIGNED_IN');
    const again = await server.signIn(person);
    const admin = await server.signIn(administrator);
    await admin.get('changePerson', { places: { person: String(person.id) }, body: { active: false } });
    expect(await again.problem('showAccount')).toBe('401 NOT_SIGNED_IN');
    expect(
      await server.anyone().problem('signIn', { body: { email: person.email, password: PASSWORD } }),
    ).toBe('401 SIGN_IN_WRONG');
  });

  it('ends when the role changes', async () => {
    const person = await server.person('Role Changed', 'viewer', project);
    const client = await server.signIn(person);
    const admin = await server.signIn(administrator);
    const places = { project: 'rover', person: String(person.id) };
    await admin.get('setMember', { places, body: { role: 'engineer' } });
    expect(await client.problem('showAccount')).toBe('401 NOT_SIGNED_IN');
    expect(await lastAudit()).toMatchObject({
      who: 'Admin One',
      action: 'member.role',
      project: 'rover',
      what: 'made Role Changed engineer',
    });
  });

  it('changes nothing for a page of another site, nor for a program that says no origin', async () => {
    const client = await server.signIn(administrator);
    const foreign = { headers: { origin: 'https://elsewhere.example' } };
    expect(await client.problem('signOutEverywhere', foreign)).toBe('403 CROSS_SITE');
    expect(await client.problem('signOut', { headers: { origin: 'null' } })).toBe('403 CROSS_SITE');
    expect((await client.get<Session>('showSession')).person?.name).toBe('Admin One');
  });

  it('is not made by a cookie that someone else signed', async () => {
    const forged = server.anyone();
    const headers = { cookie: 'steelyard_session=eyJhbGciOiJub25lIn0.eyJzaWQiOiIxIn0.' };
    expect(await forged.problem('showAccount', { headers })).toBe('401 NOT_SIGNED_IN');
  });
});

describe('signing in', () => {
  const wrong = (email: string) => ({ body: { email, password: 'not the password' } });

  it('is slowed for the pair of account and address after five wrong passwords, and only for it', async () => {
    const [guessed, other] = [await server.person('Often Guessed'), await server.person('Office Mate')];
    for (let i = 0; i < 5; i++)
      expect(await server.anyone().problem('signIn', wrong(guessed.email))).toBe('401 SIGN_IN_WRONG');
    const slowed = await server
      .anyone()
      .ask('signIn', { body: { email: guessed.email, password: PASSWORD } });
    expect(slowed.status).toBe(429);
    expect(Number(slowed.headers.get('retry-after'))).toBeGreaterThan(60);
    // A colleague behind the same address gets in.
    await server.signIn(other);
    // So does the owner from elsewhere: a proxy that is trusted says from where.
    const elsewhere = await server.anyone().ask('signIn', {
      body: { email: guessed.email, password: PASSWORD },
      headers: { 'x-forwarded-for': '203.0.113.7' },
    });
    expect(elsewhere.status).toBe(200);
  });

  it('is slowed for an address after a hundred wrong passwords in all', async () => {
    const person = await server.person('Of A Big Office');
    const address = '198.51.100.20';
    await SignInFailure.bulkCreate(
      Array.from({ length: 100 }, (_, i) => ({ account: `account ${i}`, address })),
    );
    const body = { email: person.email, password: PASSWORD };
    expect(await server.anyone().problem('signIn', { body, headers: { 'x-forwarded-for': address } })).toBe(
      '429 SIGN_IN_SLOWED',
    );
    await server.signIn(person);
  });

  it('counts guesses that come all at once', async () => {
    const person = await server.person('Guessed At Once');
    const answers = await Promise.all(
      Array.from({ length: 30 }, () => server.anyone().problem('signIn', wrong(person.email))),
    );
    expect(answers.filter((a) => a === '401 SIGN_IN_WRONG').length).toBeLessThanOrEqual(5);
  });

  it('says the same of an account that is not there', async () => {
    expect(await server.anyone().problem('signIn', wrong('nobody@example.org'))).toBe('401 SIGN_IN_WRONG');
  });
});

describe('an invitation', () => {
  it('goes by mail, makes an account with its role, and works once', async () => {
    const admin = await server.signIn(administrator);
    const invited = { email: 'New.Hand@example.org', role: 'engineer' };
    await admin.get<Invitation>('invite', { places: { project: 'rover' }, body: invited });
    const { text } = await server.letter('new.hand@example.org', 'invites you');
    const places = { link: linkIn(text, 'invitation') };
    const guest = server.anyone();
    expect(await guest.get('showInvitation', { places })).toEqual({
      email: 'new.hand@example.org',
      project: 'Rover',
      role: 'engineer',
      hasAccount: false,
    });
    const account = { name: 'New Hand', password: 'three grams of brass' };
    const session = await guest.get<Session>('acceptInvitation', { places, body: account });
    expect(session.person).toMatchObject({
      name: 'New Hand',
      email: 'new.hand@example.org',
      administrator: false,
    });
    const members = await guest.get<Member[]>('listMembers', { places: { project: 'rover' } });
    expect(members).toContainEqual(expect.objectContaining({ name: 'New Hand', role: 'engineer' }));
    expect(await server.anyone().problem('acceptInvitation', { places, body: account })).toBe(
      '404 LINK_USED_UP',
    );
  });

  it('gives someone with an account the role, and leaves the password as it is', async () => {
    const known = await server.person('Known Already');
    const admin = await server.signIn(administrator);
    await admin.get('invite', { places: { project: 'rover' }, body: { email: known.email, role: 'viewer' } });
    const { text } = await server.letter(known.email, 'invites you');
    const places = { link: linkIn(text, 'invitation') };
    const body = { name: 'Someone Else', password: 'a password of their own' };
    const session = await server.anyone().get<Session>('acceptInvitation', { places, body });
    expect(session.person).toBeNull();
    const client = await server.signIn(known);
    expect((await client.get<Session>('showSession')).person?.name).toBe('Known Already');
  });

  it('can be withdrawn, and is taken over by a second one', async () => {
    const admin = await server.signIn(administrator);
    const body = { email: 'twice@example.org', role: 'viewer' };
    const places = { project: 'rover' };
    await admin.get('invite', { places, body });
    const first = await server.letter('twice@example.org', 'invites you');
    const second = await admin.get<Invitation>('invite', { places, body: { ...body, role: 'approver' } });
    const open = (): Promise<string> =>
      server.anyone().problem('showInvitation', { places: { link: linkIn(first.text, 'invitation') } });
    expect(await open()).toBe('404 LINK_USED_UP');
    const invitation = String(second.id);
    await admin.get('withdrawInvitation', { places: { ...places, invitation } });
    const left = await admin.get<Invitation[]>('listInvitations', { places });
    expect(left.map((i) => i.email)).not.toContain('twice@example.org');
  });

  it('does not take a password that is short, common, or made of one’s own name', async () => {
    const admin = await server.signIn(administrator);
    const email = 'weak.secret@example.org';
    await admin.get('invite', { places: { project: 'rover' }, body: { email, role: 'viewer' } });
    const { text } = await server.letter(email, 'invites you');
    const accept = (password: string) =>
      server.anyone().problem('acceptInvitation', {
        places: { link: linkIn(text, 'invitation') },
        body: { name: 'Weak Secret', password },
      });
    expect(await accept('short')).toBe('400 BODY_NOT_RIGHT');
    expect(await accept('Password1234')).toBe('400 PASSWORD_COMMON');
    expect(await accept('aaaaaaaaaaaaaa')).toBe('400 PASSWORD_COMMON');
    expect(await accept('weak.secret2026')).toBe('400 PASSWORD_COMMON');
    expect(await accept('ü'.repeat(40))).toBe('400 PASSWORD_TOO_LONG');
  });
});

describe('a reset', () => {
  it('goes by mail, sets a password once, and ends every session', async () => {
    const person = await server.person('Forgot It');
    const before = await server.signIn(person);
    await server.anyone().get('askReset', { body: { email: person.email.toUpperCase() } });
    const { text } = await server.letter(person.email, 'new password');
    const places = { link: linkIn(text, 'reset') };
    const password = 'another one, and longer';
    await server.anyone().get('resetPassword', { places, body: { password } });
    expect(await before.problem('showAccount')).toBe('401 NOT_SIGNED_IN');
    await server.signIn(person, password);
    expect(await server.anyone().problem('resetPassword', { places, body: { password } })).toBe(
      '404 LINK_USED_UP',
    );
    expect((await lastAudit()).action).toBe('password.reset');
  });

  it('says nothing of whether there is an account', async () => {
    expect((await server.anyone().ask('askReset', { body: { email: 'nobody@example.org' } })).status).toBe(
      204,
    );
  });

  it('is asked for three times an hour and no more', async () => {
    const person = await server.person('Often Asking');
    for (let i = 0; i < 5; i++) await server.anyone().get('askReset', { body: { email: person.email } });
    await server.letter(person.email, 'new password');
    const { Reset } = await import('#server/models/index.ts');
    expect(await Reset.count({ where: { personId: person.id } })).toBe(3);
  });
});

describe('administrators', () => {
  it('cannot remove the last one, neither the right nor the account', async () => {
    const only = await TestServer.start();
    try {
      const last = await only.person('The Last', 'administrator');
      const client = await only.signIn(last);
      const places = { person: String(last.id) };
      expect(await client.problem('changePerson', { places, body: { administrator: false } })).toBe(
        '409 LAST_ADMINISTRATOR',
      );
      expect(await client.problem('changePerson', { places, body: { active: false } })).toBe(
        '409 LAST_ADMINISTRATOR',
      );
      const second = await only.person('A Second', 'administrator');
      await client.get('changePerson', {
        places: { person: String(second.id) },
        body: { administrator: false },
      });
      const people = await client.get<PersonAnswer[]>('listPeople');
      expect(people.filter((p) => p.administrator).map((p) => p.name)).toEqual(['The Last']);
    } finally {
      await only.stop();
    }
  });

  it('leave an audit trail that nobody can change', async () => {
    const { sequelize } = server.running.deps;
    for (const sql of [
      "UPDATE audit_entries SET what = ''",
      'DELETE FROM audit_entries',
      'TRUNCATE audit_entries',
    ])
      await expect(sequelize.query(sql)).rejects.toThrow('audit entries stay as they are');
  });
});
