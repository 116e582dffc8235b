import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ROUTES, type Route, type RouteName } from '#core/api/routes.ts';
import type { Project } from '#server/models/index.ts';
import { machineText } from '../helpers/machine-text.ts';
import { pushBody, recordsOfText } from '../helpers/pushed-records.ts';
import { type Client, TestServer } from '../helpers/test-server.ts';

// Every route, asked by every role, by nobody, by people and tokens of another project: from the list of routes, so that
// a new one without a rule fails here.

const ASKERS = ['nobody', 'stranger', 'viewer', 'engineer', 'approver', 'administrator'] as const;
const TOKENS = ['read token', 'push token', "another project's token"] as const;
type Asker = (typeof ASKERS)[number] | (typeof TOKENS)[number];

const RANK = { viewer: 1, engineer: 2, approver: 3, administrator: 4 };

/** What the rule in core/api/routes.ts means for someone, as it is written in the design's table of roles. */
function expected({ who, token, path }: Route, asker: Asker): 'may' | 401 | 403 | 404 {
  if (who === 'anyone') return 'may';
  if (who === 'demo') return 404;
  if (asker === 'nobody') return 401;
  const inProject = path.startsWith('/projects/:project');
  if (asker === 'read token' || asker === 'push token' || asker === "another project's token") {
    if (!token) return 403;
    if (asker === "another project's token") return 404;
    return token === 'push' && asker === 'read token' ? 403 : 'may';
  }
  if (who === 'person') return 'may';
  if (asker === 'administrator') return 'may';
  if (inProject && asker === 'stranger') return 404;
  if (asker === 'stranger') return 403;
  return RANK[asker] >= RANK[who] ? 'may' : 403;
}

let server: TestServer;
let project: Project;
let clients: Record<Asker, () => Promise<Client>>;
let run: string;

beforeAll(async () => {
  server = await TestServer.start();
  project = await server.project('rover');
  const other = await server.project('other');
  const people = {
    stranger: await server.person('Stranger', 'approver', other),
    viewer: await server.person('Viewer', 'viewer', project),
    engineer: await server.person('Engineer', 'engineer', project),
    approver: await server.person('Approver', 'approver', project),
    administrator: await server.person('Administrator', 'administrator'),
  };
  const [read, push, foreign] = [
    await server.token(people.engineer, project, 'read'),
    await server.token(people.engineer, project, 'push'),
    await server.token(people.stranger, other, 'push'),
  ];
  const session = (who: keyof typeof people) => () => server.signIn(people[who]);
  clients = {
    nobody: async () => server.anyone(),
    stranger: session('stranger'),
    viewer: session('viewer'),
    engineer: session('engineer'),
    approver: session('approver'),
    administrator: session('administrator'),
    'read token': async () => server.withToken(read),
    'push token': async () => server.withToken(push),
    "another project's token": async () => server.withToken(foreign),
  };
  const pushed = await server.withToken(push).get<{ runs: { id: string }[] }>('pushRuns', {
    places: { project: 'rover' },
    body: pushBody(recordsOfText(machineText())),
  });
  run = pushed.runs[0]!.id;
});

afterAll(() => server.stop());

const signedIn = new Map<Asker, Client>();

/** One sign-in serves every route but those that end it. */
async function clientOf(asker: Asker, name: RouteName): Promise<Client> {
  if (name.startsWith('signOut')) {
    signedIn.clear();
    return clients[asker]();
  }
  const known = signedIn.get(asker) ?? (await clients[asker]());
  signedIn.set(asker, known);
  return known;
}

/** Whether the answer is that of someone who may: not signed in, not allowed and hidden are no such answer. */
const refusals = ['NOT_SIGNED_IN', 'NOT_ALLOWED', 'TOKEN_NOT_ENOUGH', 'TOKEN_SCOPE'];

describe.each(Object.keys(ROUTES) as RouteName[])('%s', (name) => {
  it.each([...ASKERS, ...TOKENS])('as its rule says for: %s', async (asker) => {
    const client = await clientOf(asker, name);
    const { status, body } = await client.ask<{ code?: string; detail?: string }>(name, {
      places: {
        project: 'rover',
        run,
        link: 'none',
        person: '999999',
        invitation: '999999',
        token: '999999',
        comment: '999999',
        sha256: '0'.repeat(64),
      },
      // Nothing that is right: whoever may is told so by another answer, and nothing is changed.
      ...(ROUTES[name].method !== 'GET' && { body: {} }),
    });
    const wanted = expected(ROUTES[name], asker);
    const found =
      status === 401 && body.code === 'NOT_SIGNED_IN'
        ? 401
        : refusals.includes(body?.code ?? '')
          ? 403
          : status === 404 && /project '|page of this server/.test(body.detail ?? '')
            ? 404
            : 'may';
    expect(found).toBe(wanted);
    expect(status, `${name} has a fault`).not.toBe(500);
  });
});

describe('a project', () => {
  it('shows nothing of its runs to another, not even by a number that is right', async () => {
    const client = await clients.stranger();
    for (const name of ['showRun', 'showInputs', 'downloadRecord'] as const)
      expect(await client.problem(name, { places: { project: 'rover', run } })).toBe('404 NOT_FOUND');
    expect(await client.problem('showRun', { places: { project: 'other', run } })).toBe('404 NOT_FOUND');
  });
});
