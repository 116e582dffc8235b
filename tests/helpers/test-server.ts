import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { inject } from 'vitest';
import type { Problem } from '#core/api/problem.ts';
import { addressOf, ROUTES, type RouteName } from '#core/api/routes.ts';
import { type Config, configSchema } from '#server/config.ts';
import { readMailFolder } from '#server/mail/transport.ts';
import { Membership, Person, Project, Token } from '#server/models/index.ts';
import type { MemberRole } from '#server/models/membership.ts';
import { freePort } from '#server/postgres/cluster.ts';
import { type Running, startServer } from '#server/running.ts';
import { hashPassword } from '#server/services/passwords.ts';
import { hashSecret, newSecret } from '#server/services/secrets.ts';
import { createDatabase } from './test-database.ts';

export const PASSWORD = 'hairline rules on enamel';

/** A response with its body read. */
export interface Reply<T = unknown> {
  readonly status: number;
  readonly headers: Headers;
  readonly body: T;
}

/** A server of the test's own against a real database, and ways to ask it as someone. */
export class TestServer {
  readonly running: Running;
  readonly config: Config;
  readonly folder: string;

  private constructor(running: Running, config: Config, folder: string) {
    this.running = running;
    this.config = config;
    this.folder = folder;
  }

  static async start(more: Record<string, string> = {}, pages: string | null = null): Promise<TestServer> {
    const folder = mkdtempSync(join(tmpdir(), 'steelyard-server-'));
    const port = await freePort();
    const config = configSchema.parse({
      DATABASE_URL: await createDatabase(inject('postgres')),
      SECRET: 'a secret of the tests, long enough to sign with',
      PUBLIC_URL: `http://127.0.0.1:${port}`,
      PORT: String(port),
      MAIL_FOLDER: join(folder, 'mail'),
      LOG_LEVEL: 'silent',
      PASSWORD_COST: '4',
      ...more,
    });
    return new TestServer(await startServer(config, pages), config, folder);
  }

  async stop(): Promise<void> {
    await this.running.stop();
    rmSync(this.folder, { recursive: true, force: true });
  }

  get address(): string {
    return this.config.PUBLIC_URL;
  }

  /** Someone with an account, and with a role in a project where one is given. */
  async person(name: string, role?: MemberRole | 'administrator', project?: Project): Promise<Person> {
    const person = await Person.create({
      email: `${name.toLowerCase().replace(/\W+/g, '.')}@example.org`,
      name,
      passwordHash: await hashPassword(PASSWORD, 4),
      administrator: role === 'administrator',
    });
    if (project && role && role !== 'administrator')
      await Membership.create({ projectId: project.id, personId: person.id, role });
    return person;
  }

  project(slug: string): Promise<Project> {
    return Project.create({ slug, name: slug[0]!.toUpperCase() + slug.slice(1) });
  }

  async token(
    person: Person,
    project: Project,
    scope: 'read' | 'push',
    kind: 'person' | 'machine' = 'machine',
  ) {
    const secret = newSecret();
    const expiresAt = new Date(Date.now() + 86_400_000);
    const secretHash = hashSecret(secret);
    await Token.create({
      personId: person.id,
      projectId: project.id,
      kind,
      label: 'a token',
      scope,
      secretHash,
      expiresAt,
    });
    return secret;
  }

  /** Signs in and gives what asks under that session. */
  async signIn(person: Person, password = PASSWORD): Promise<Client> {
    const client = new Client(this.address);
    const reply = await client.ask('signIn', { body: { email: person.email, password } });
    if (reply.status !== 200) throw new Error(`sign-in answered ${reply.status}`);
    return client;
  }

  withToken(secret: string): Client {
    return new Client(this.address, { authorization: `Bearer ${secret}` });
  }

  anyone(): Client {
    return new Client(this.address);
  }

  mail() {
    return readMailFolder(this.config.MAIL_FOLDER);
  }

  /** Waits for the first letter to someone with some words in its subject. */
  async letter(to: string, subject: string) {
    return until(() => this.mail().find((mail) => mail.to === to && mail.subject.includes(subject)));
  }
}

export interface Ask {
  readonly places?: Readonly<Record<string, string>>;
  readonly query?: Readonly<Record<string, string | number | undefined>>;
  readonly body?: unknown;
  readonly headers?: Readonly<Record<string, string>>;
}

/** Asks the API as one browser or one program would: it keeps the cookie that it is given. */
export class Client {
  private readonly base: string;
  private readonly headers: Record<string, string>;
  private cookie: string | null = null;

  constructor(base: string, headers: Record<string, string> = {}) {
    this.base = base;
    this.headers = headers;
  }

  async ask<T = unknown>(
    name: RouteName,
    { places, query, body, headers = {} }: Ask = {},
  ): Promise<Reply<T>> {
    const raw = body instanceof Uint8Array || body instanceof FormData;
    const response = await fetch(this.base + addressOf(name, places, query), {
      method: ROUTES[name].method,
      headers: {
        ...(this.headers.authorization ? {} : { origin: this.base }),
        ...(this.cookie && { cookie: this.cookie }),
        ...(body !== undefined && !raw && { 'content-type': 'application/json' }),
        ...this.headers,
        ...headers,
      },
      ...(body !== undefined && { body: raw ? (body as FormData) : JSON.stringify(body) }),
    });
    const [set] = response.headers.getSetCookie();
    if (set) this.cookie = set.split(';')[0]!;
    const text = await response.text();
    const isJson = /json/.test(response.headers.get('content-type') ?? '');
    return {
      status: response.status,
      headers: response.headers,
      body: (isJson && text ? JSON.parse(text) : text) as T,
    };
  }

  /** The answer, which must be a good one. */
  async get<T>(name: RouteName, ask: Ask = {}): Promise<T> {
    const reply = await this.ask<T>(name, ask);
    if (reply.status >= 300)
      throw new Error(`${name} answered ${reply.status}: ${JSON.stringify(reply.body)}`);
    return reply.body;
  }

  /** `status CODE` of an answer that must be a problem. */
  async problem(name: RouteName, ask: Ask = {}): Promise<string> {
    const { status, body } = await this.ask<Problem>(name, ask);
    return `${status} ${body.code}`;
  }
}

/** Asks again and again until there is something; throws when it never comes. */
export async function until<T>(
  look: () => T | undefined | null | false | Promise<T | undefined | null | false>,
): Promise<T> {
  const end = Date.now() + 30_000;
  for (;;) {
    const found = await look();
    if (found) return found;
    if (Date.now() > end) throw new Error('waited for half a minute in vain');
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}
