import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { describe, expect, it } from 'vitest';
import { Mail, Person } from '#server/models/index.ts';
import { freePort } from '#server/postgres/cluster.ts';
import { PASSWORD, TestServer, until } from '../helpers/test-server.ts';

interface Received {
  readonly to: string;
  readonly from: string;
  readonly subject: string;
  readonly text: string;
  readonly unsubscribe: string | undefined;
}

/** A mail server that refuses the first deliveries, as many as asked. */
async function mailServer(refusals: number) {
  const received: Received[] = [];
  let left = refusals;
  const smtp = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    disableReverseLookup: true,
    onData(stream, session, done) {
      void simpleParser(stream).then((mail) => {
        if (left-- > 0) return done(Object.assign(new Error('try again'), { responseCode: 451 }));
        received.push({
          to: session.envelope.rcptTo.map((r) => r.address).join(),
          from: mail.from!.text,
          subject: mail.subject!,
          text: mail.text!,
          unsubscribe: mail.headers.get('list-unsubscribe-post') as string | undefined,
        });
        done();
      });
    },
  });
  const port = await freePort();
  await new Promise<void>((resolve) => smtp.listen(port, '127.0.0.1', resolve));
  return { received, url: `smtp://127.0.0.1:${port}`, close: () => smtp.close() };
}

describe('mail', () => {
  it('goes out over SMTP, once, also where the mail server refuses at first', async () => {
    const post = await mailServer(1);
    const server = await TestServer.start({ SMTP_URL: post.url, MAIL_FROM: 'Steelyard <scale@example.org>' });
    try {
      await server.project('rover');
      const admin = await server.signIn(await server.person('Admin One', 'administrator'));
      const body = { email: 'new@example.org', role: 'viewer' };
      await admin.get('invite', { places: { project: 'rover' }, body });
      const mail = await until(() => post.received[0]);
      expect(mail).toMatchObject({ to: 'new@example.org', from: '"Steelyard" <scale@example.org>' });
      expect(mail.subject).toBe('Admin One invites you to Rover on Steelyard');
      expect(mail.text).toContain(`${server.address}/invitation/`);
      await until(async () => (await Mail.findOne({ where: { recipient: 'new@example.org' } }))?.sentAt);
      expect(post.received).toHaveLength(1);
    } finally {
      await server.stop();
      post.close();
    }
  });
});

describe('the log', () => {
  it('has a line a request with its id, and no password, cookie, token or link', async () => {
    const server = await TestServer.start();
    const person = await server.person('Log Ged', 'viewer', await server.project('rover'));
    const port = await freePort();
    const origin = `http://127.0.0.1:${port}`;
    const child = spawn(
      process.execPath,
      [join(import.meta.dirname, '..', '..', 'dist', 'server', 'main.js')],
      {
        env: {
          PATH: process.env.PATH,
          DATABASE_URL: server.config.DATABASE_URL,
          SECRET: server.config.SECRET,
          PUBLIC_URL: origin,
          PORT: String(port),
          MAIL_FOLDER: server.config.MAIL_FOLDER,
          LOG_LEVEL: 'debug',
        },
        stdio: ['ignore', 'pipe', 'pipe'],
      },
    );
    let log = '';
    for (const stream of [child.stdout, child.stderr])
      stream.on('data', (data: Buffer) => {
        log += data;
      });
    try {
      await until(() =>
        fetch(`${origin}/api/ready`).then(
          (r) => r.ok,
          () => false,
        ),
      );
      const headers = { origin, 'content-type': 'application/json' };
      const ask = (path: string, body: object, more = {}) =>
        fetch(origin + path, {
          method: 'POST',
          headers: { ...headers, ...more },
          body: JSON.stringify(body),
        });
      const signedIn = await ask('/api/session', { email: person.email, password: PASSWORD });
      const cookie = signedIn.headers.getSetCookie()[0]!.split(';')[0]!;
      await ask('/api/resets/a-link-that-is-secret', { password: 'a new one, quite long' });
      await fetch(`${origin}/api/account?word=of-the-query`, { headers: { cookie } });
      await fetch(`${origin}/api/projects`, { headers: { authorization: 'Bearer the-token-itself' } });
      await fetch(`${origin}/reset/another-secret-link`);
      await until(() => log.includes('/api/projects'));
      await until(() => (log.match(/"req":/g) ?? []).length >= 6);
      expect(log).toMatch(/"id":"[0-9a-f-]{36}"/);
      const secrets = [PASSWORD, cookie.split('=')[1]!, 'a-link-that-is-secret', 'a new one, quite long'];
      for (const secret of [
        ...secrets,
        'the-token-itself',
        'another-secret-link',
        'of-the-query',
        person.email,
      ])
        expect(log, secret).not.toContain(secret);
      expect(await Person.count()).toBe(1);
    } finally {
      child.kill('SIGTERM');
      await server.stop();
    }
  });
});
