import fc from 'fast-check';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Pushed } from '#core/api/push.ts';
import type { Choices, RunPage, Trend } from '#core/api/runs.ts';
import { type Project, Run } from '#server/models/index.ts';
import { thin } from '#server/services/trend.ts';
import { machineText } from '../helpers/machine-text.ts';
import { pushBody, recordsOfText } from '../helpers/pushed-records.ts';
import { type Client, TestServer } from '../helpers/test-server.ts';

let server: TestServer;
let project: Project;
let client: Client;
const places = { project: 'rover' };

beforeAll(async () => {
  server = await TestServer.start();
  project = await server.project('rover');
  const person = await server.person('Reader One', 'engineer', project);
  client = await server.signIn(person);
  const ci = server.withToken(await server.token(person, project, 'push'));
  // 30 commits, two states each, on two branches; masses rise by 0.05 kg, so that the limit of 3.5 kg breaks on the way.
  for (let i = 0; i < 30; i++) {
    const provenance = { commit: i.toString(16).padStart(40, '0'), branch: i % 3 ? 'main' : 'study' };
    const body = pushBody(recordsOfText(machineText(1 + i / 20), provenance));
    await ci.get<Pushed>('pushRuns', { places, body });
  }
});
afterAll(() => server.stop());

const sets = (all: readonly string[]): string[] =>
  Array.from({ length: 2 ** all.length - 1 }, (_, bits) =>
    all.filter((__, i) => ((bits + 1) >> i) & 1).join(' AND '),
  );

async function walk(query: Record<string, string | number>): Promise<RunPage['rows']> {
  const rows: RunPage['rows'] = [];
  let cursor: string | undefined;
  do {
    const page: RunPage = await client.get('listRuns', { places, query: { ...query, limit: 7, cursor } });
    rows.push(...page.rows);
    cursor = page.next ?? undefined;
  } while (cursor);
  return rows;
}

describe('the history', () => {
  it('is walked page by page without a gap or a repeat, in every sort', async () => {
    for (const sort of ['newest', 'oldest', 'heaviest', 'lightest']) {
      const rows = await walk({ sort });
      expect(new Set(rows.map((r) => r.id)).size).toBe(60);
      const keys = rows.map((r) => (sort.endsWith('st') && /new|old/.test(sort) ? Date.parse(r.at) : r.mass));
      const way = sort === 'newest' || sort === 'heaviest' ? -1 : 1;
      for (let i = 1; i < keys.length; i++) expect(way * (keys[i]! - keys[i - 1]!)).toBeGreaterThanOrEqual(0);
    }
  });

  it('is walked whole also where many runs came in one instant', async () => {
    const at = new Date('2026-10-01T00:00:00.123Z');
    const before = await Run.findAll({ where: { projectId: project.id } });
    await Run.update({ at }, { where: { projectId: project.id } });
    expect(new Set((await walk({ sort: 'newest' })).map((r) => r.id)).size).toBe(60);
    for (const run of before) await Run.update({ at: run.at }, { where: { id: run.id } });
  });

  it('is filtered by every set of filters as a filter of the whole would', async () => {
    const all = await walk({});
    const option = (values: string[]) => fc.option(fc.constantFrom(...values), { nil: undefined });
    const filter = fc.record({
      assembly: option(['rover', 'none such']),
      state: option(['driving', 'parked']),
      branch: option(['main', 'study']),
      verdict: option(['within', 'outside', 'unlimited']),
    });
    await fc.assert(
      fc.asyncProperty(filter, async (asked) => {
        const query = Object.fromEntries(Object.entries(asked).filter(([, v]) => v !== undefined)) as Record<
          string,
          string
        >;
        const found = (await walk(query)).map((r) => r.id);
        const wanted = all.filter((row) => Object.entries(query).every(([k, v]) => row[k as 'state'] === v));
        expect(found).toEqual(wanted.map((r) => r.id));
      }),
      { numRuns: 24 },
    );
  });

  it('finds runs since a day, and refuses a cursor of another sort or of nobody’s', async () => {
    const tomorrow = new Date(Date.now() + 86_400_000).toISOString().slice(0, 10);
    expect(await walk({ since: tomorrow })).toEqual([]);
    const { next } = await client.get<RunPage>('listRuns', { places, query: { limit: 5 } });
    expect(await client.problem('listRuns', { places, query: { cursor: next!, sort: 'oldest' } })).toBe(
      '400 CURSOR',
    );
    expect(await client.problem('listRuns', { places, query: { cursor: 'bm8' } })).toBe('400 CURSOR');
  });

  it('walks along an index for every set of filters, at the first page and at a far one', async () => {
    const { sequelize } = server.running.deps;
    // Few rows are sorted faster than an index is walked; what counts is that every set has an index to walk.
    await sequelize.transaction(async (transaction) => {
      await sequelize.query('SET LOCAL enable_seqscan = off; SET LOCAL enable_sort = off', { transaction });
      for (const set of [
        'true',
        ...sets(["assembly = 'rover'", "state = 'parked'", "branch = 'main'", "verdict = 'within'"]),
      ]) {
        const plan = await sequelize.query<{ 'QUERY PLAN': string }>(
          `EXPLAIN SELECT * FROM runs WHERE project_id = ${project.id} AND ${set} AND (at, id) < (now(), 99)
           ORDER BY at DESC, id DESC LIMIT 51`,
          { type: QueryTypes.SELECT, transaction },
        );
        const text = plan.map((line) => line['QUERY PLAN']).join('\n');
        expect(text, set).toMatch(/Index Scan Backward using runs_by_at/);
        expect(text, set).not.toContain('Sort');
      }
    });
  });

  it('says what it can be filtered by', async () => {
    expect(await client.get<Choices>('listChoices', { places })).toEqual({
      assemblies: ['rover'],
      states: ['driving', 'parked'],
      branches: ['main', 'study'],
    });
  });

  it('goes out as CSV with units in the heads and the conventions in every row', async () => {
    const { body, headers } = await client.ask<string>('listRunsAsCsv', { places, query: { limit: 3 } });
    expect(headers.get('content-type')).toContain('text/csv');
    const [head, ...rows] = body.trim().split('\n');
    expect(head).toContain('mass_kg,centre_x_m');
    expect(rows).toHaveLength(3);
    for (const row of rows) expect(row).toContain(',SI,body,');
  });
});

describe('a trend', () => {
  it('is of one assembly and state, oldest first, with its limits', async () => {
    const trend = await client.get<Trend>('showTrend', { places, query: { state: 'driving' } });
    expect(trend).toMatchObject({
      assembly: 'rover',
      state: 'driving',
      quantity: 'mass',
      unit: 'kg',
      of: 30,
    });
    expect(trend.limits).toEqual([{ name: 'all up', min: null, max: 3.5 }]);
    // 2 kg and a tip of 1 kg to 2.45 kg with 10 %.
    expect(trend.points[0]!.value).toBeCloseTo(3.1, 12);
    expect(trend.points.at(-1)!.value).toBeCloseTo(4.695, 12);
    expect(trend.points.map((p) => p.verdict)).toContain('outside');
  });

  it('follows a principal moment by the axis that names it', async () => {
    const trend = await client.get<Trend>('showTrend', {
      places,
      query: { state: 'driving', quantity: 'principal.x' },
    });
    // The tip lies on x: about x only the cube's own moment stays, m (b² + c²) / 12.
    for (const { value } of trend.points) expect(value).toBeCloseTo((2 * (0.12 ** 2 + 0.14 ** 2)) / 12, 12);
  });

  it('is thinned to at most 2,000 points without losing an extreme, an end or a release', () => {
    const point = fc.record({
      value: fc.double({ noNaN: true, min: -1e6, max: 1e6 }),
      released: fc.boolean(),
    });
    fc.assert(
      fc.property(fc.array(point, { minLength: 1, maxLength: 400 }), (some) => {
        const points = some.map((p, i) => ({
          ...p,
          released: p.released && i % 40 === 0,
          run: String(i),
          at: '',
          verdict: 'within' as const,
          label: '',
        }));
        const kept = thin(points, 60);
        expect(kept.length).toBeLessThanOrEqual(60);
        expect(kept[0]).toBe(points[0]);
        expect(kept.at(-1)).toBe(points.at(-1));
        const values = points.map((p) => p.value);
        expect(kept.map((p) => p.value)).toContain(Math.max(...values));
        expect(kept.map((p) => p.value)).toContain(Math.min(...values));
        for (const p of points.filter((q) => q.released)) expect(kept).toContain(p);
        const order = kept.map((p) => Number(p.run));
        expect(order).toEqual([...order].sort((a, b) => a - b));
      }),
    );
  });
});
