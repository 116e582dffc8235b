import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RunPage } from '#core/api/runs.ts';
import { seedDemo } from '#server/demo/seed.ts';
import { AuditEntry, Comment, Person, Project, Release, Run } from '#server/models/index.ts';
import { DEMO_PASSWORD, DEMO_SIGN_INS } from '#server/services/demo-sign-ins.ts';
import { type Client, TestServer } from '../helpers/test-server.ts';

// What the demo promises: a history that the core computed from edits, with everything in it that a page can show.

let server: TestServer;
let client: Client;
const places = { project: 'petrel' };

beforeAll(async () => {
  server = await TestServer.start({ DEMO: 'yes' });
  await seedDemo(server.running.deps, () => {});
  const person = await Person.findOne({ where: { email: DEMO_SIGN_INS[0]!.email } });
  client = await server.signIn(person!, DEMO_PASSWORD);
});
afterAll(() => server.stop());

describe('the demo', () => {
  it('is sixty runs of three assemblies over five months, every one computed here', async () => {
    const { rows } = await client.get<RunPage>('listRuns', { places, query: { limit: 200 } });
    expect(rows).toHaveLength(60);
    expect(new Set(rows.map((r) => r.assembly)).size).toBe(3);
    expect(new Set(rows.map((r) => r.recomputation.status))).toEqual(new Set(['recomputed']));
    const days = (Date.parse(rows[0]!.at) - Date.parse(rows.at(-1)!.at)) / 86_400_000;
    expect(days).toBeGreaterThan(140);
  });

  it('has a redesign that swaps two principal axes, a limit broken and mended, and a branch that came to nothing', async () => {
    const list = (query: Record<string, string>) =>
      client.get<RunPage>('listRuns', { places, query: { ...query, limit: 200 } });
    const flight = (
      await list({ assembly: 'Sandpiper survey drone', state: 'flight', branch: 'main', sort: 'oldest' })
    ).rows;
    expect(flight[0]!.nearest).toEqual(['x', 'y', 'z']);
    expect(flight.at(-1)!.nearest).toEqual(['y', 'x', 'z']);
    expect(flight.map((r) => r.verdict).join(' ')).toMatch(/within outside within/);
    expect((await list({ branch: 'short-booms' })).rows.map((r) => r.verdict)).toContain('outside');
    expect((await list({ branch: 'long-reach' })).rows.every((r) => r.dirty)).toBe(true);
  });

  it('has releases made, withdrawn and asked for, comments, mail, and an audit trail in the order of time', async () => {
    const states = (await Release.findAll()).map((r) => r.state);
    for (const state of ['asked', 'released', 'withdrawn'] as const) expect(states).toContain(state);
    expect(await Run.count({ where: { release: 'released' } })).toBe(
      states.filter((s) => s === 'released').length,
    );
    expect(await Comment.count()).toBeGreaterThan(5);
    const trail = await AuditEntry.findAll({ order: ['id'] });
    expect(trail.length).toBeGreaterThan(20);
    for (let i = 1; i < trail.length; i++)
      expect(trail[i]!.at.getTime()).toBeGreaterThanOrEqual(trail[i - 1]!.at.getTime());
    const letter = await server.letter('lucia@petrel.example', 'outside on main');
    expect(letter.text).toContain('/projects/petrel/runs/');
  });

  it('is made once, and begun anew where a start broke off', async () => {
    await seedDemo(server.running.deps, () => {});
    expect(await Run.count()).toBe(60);
    await Project.update({ slug: 'petrel-in-the-making' }, { where: { slug: 'petrel' } });
    await seedDemo(server.running.deps, () => {});
    expect(await Run.count()).toBe(60);
    expect(await Person.count()).toBe(5);
  });
});
