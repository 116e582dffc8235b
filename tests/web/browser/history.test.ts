import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RunPage } from '#core/api/runs.ts';
import { Person } from '#server/models/index.ts';
import { linkTo } from '#web/paths.ts';
import { cellsOf, eventually, hasFocus, oneBrowser, settled, tabTo, visit } from '../../helpers/browser.ts';
import { PETREL, signInOf, startDemo } from '../../helpers/demo-server.ts';
import type { Client, TestServer } from '../../helpers/test-server.ts';

let server: TestServer;
let client: Client;

const browser = oneBrowser(() => server.address);
beforeAll(async () => {
  server = await startDemo();
  const { email, password } = signInOf('lucia');
  client = await server.signIn((await Person.findOne({ where: { email } }))!, password);
});
afterAll(() => server.stop());

const HISTORY = linkTo.history(PETREL);

async function open(more = ''): Promise<Page> {
  const page = await browser.open({ as: signInOf('lucia') });
  await visit(page, HISTORY + more);
  return page;
}

const runsTable = (page: Page) => page.getByRole('table', { name: /^Runs, / });

/** The runs of the list by their identifiers, in their order. */
const shownRuns = (page: Page): Promise<string[]> =>
  runsTable(page)
    .locator('th a')
    .evaluateAll((links: unknown[]) =>
      (links as { pathname: string }[]).map(({ pathname }) => pathname.split('/').at(-1)!),
    );

const list = async (query: Record<string, string | number>) => {
  const { rows, next } = await client.get<RunPage>('listRuns', { places: { project: PETREL }, query });
  return { ids: rows.map(({ id }) => id), rows, next };
};

const parametersOf = (page: Page) => Object.fromEntries(new URL(page.url()).searchParams);

describe('the sentence of the history', () => {
  it('puts each choice into the address, lists what fits, and goes back step by step', async () => {
    const page = await open();
    const everything = await shownRuns(page);
    expect(everything).toEqual((await list({})).ids);
    await page.getByRole('button', { name: /^verdict: / }).click();
    await page.getByRole('option', { name: 'outside a limit' }).click();
    await page.waitForURL((url) => url.search === '?verdict=outside');
    const outside = (await list({ verdict: 'outside' })).ids;
    await eventually(() => shownRuns(page)).toEqual(outside);
    expect(outside.length).toBeGreaterThan(0);
    expect(outside.length).toBeLessThan(everything.length);
    await page.getByRole('button', { name: /^branch: / }).click();
    await page.getByRole('option', { name: 'short-booms' }).click();
    const both = (await list({ verdict: 'outside', branch: 'short-booms' })).ids;
    await eventually(() => shownRuns(page)).toEqual(both);
    expect(parametersOf(page)).toEqual({ verdict: 'outside', branch: 'short-booms' });
    await page.goBack();
    await eventually(() => shownRuns(page)).toEqual(outside);
    await page.goBack();
    await eventually(() => shownRuns(page)).toEqual(everything);
    expect(parametersOf(page)).toEqual({});
  });

  it('reads an address that another sent: the same filters, sort and quantity', async () => {
    const page = await open('?state=flight&sort=heaviest&quantity=inertia.zz');
    expect(await shownRuns(page)).toEqual((await list({ state: 'flight', sort: 'heaviest' })).ids);
    expect(await page.getByRole('button', { name: 'state: flight' }).count()).toBe(1);
    expect(await page.getByRole('columnheader', { name: /^mass/ }).getAttribute('aria-sort')).toBe(
      'descending',
    );
    await page.getByRole('heading', { name: 'Izz about the centre' }).waitFor();
    await page.getByRole('link', { name: 'Start over' }).click();
    await eventually(async () => shownRuns(page)).toEqual((await list({})).ids);
  });

  it('works by keyboard: arrows move, Enter takes, Escape leaves it as it was', async () => {
    const page = await open();
    const word = page.getByRole('button', { name: /^assembly: / });
    await tabTo(page, word);
    await page.keyboard.press('ArrowDown');
    const box = page.getByRole('listbox', { name: 'assembly' });
    await box.waitFor();
    await eventually(() => hasFocus(box)).toBe(true);
    const options = await box.getByRole('option').allTextContents();
    expect(options.length).toBe(4);
    const current = async () => page.locator(`[id="${await box.getAttribute('aria-activedescendant')}"]`);
    expect(await (await current()).textContent()).toContain('any assembly');
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('ArrowDown');
    expect(await (await current()).textContent()).toBe(options[2]);
    await page.keyboard.press('ArrowUp');
    expect(await (await current()).textContent()).toBe(options[1]);
    await page.keyboard.press('Escape');
    await box.waitFor({ state: 'detached' });
    expect(await hasFocus(word)).toBe(true);
    expect(parametersOf(page)).toEqual({});
    await page.keyboard.press('Enter');
    await box.waitFor();
    await page.keyboard.press('End');
    await page.keyboard.press('Enter');
    await box.waitFor({ state: 'detached' });
    expect(await hasFocus(word)).toBe(true);
    expect(parametersOf(page)).toEqual({ assembly: options[3] });
    await eventually(
      async () => new Set((await cellsOf(runsTable(page))).map((cells) => cells[2]!.split(',')[0])),
    ).toEqual(new Set([options[3]]));
  });
});

describe('the list of the history', () => {
  it('is had as CSV with the same runs in the same order', async () => {
    const page = await open('?state=flight&sort=lightest');
    const shown = await shownRuns(page);
    const download = page.waitForEvent('download');
    await page.getByRole('link', { name: 'Download as CSV' }).click();
    const chunks: Buffer[] = [];
    for await (const chunk of await (await download).createReadStream()) chunks.push(chunk as Buffer);
    const lines = Buffer.concat(chunks).toString('utf8').trimEnd().split('\n');
    expect(lines[0]).toMatch(/^run,assembly,state,/);
    expect(lines.slice(1).map((line) => line.split(',')[0])).toEqual(shown);
    expect(shown.length).toBeGreaterThan(3);
  });

  it('goes on to older runs and back to its start, each place in the address', async () => {
    const page = await open();
    const first = await list({});
    expect(first.next).not.toBeNull();
    await page.getByRole('link', { name: 'Older runs' }).click();
    const second = await list({ cursor: first.next! });
    await eventually(() => shownRuns(page)).toEqual(second.ids);
    expect(parametersOf(page)).toEqual({ cursor: first.next });
    await page.goBack();
    await eventually(() => shownRuns(page)).toEqual(first.ids);
  });

  it('turns the order round at the head of a column', async () => {
    const page = await open('?state=flight');
    await page.getByRole('columnheader', { name: /^mass/ }).getByRole('button').click();
    await eventually(() => shownRuns(page)).toEqual((await list({ state: 'flight', sort: 'heaviest' })).ids);
    await page.getByRole('columnheader', { name: /^mass/ }).getByRole('button').click();
    await eventually(() => shownRuns(page)).toEqual((await list({ state: 'flight', sort: 'lightest' })).ids);
    expect(parametersOf(page)).toEqual({ state: 'flight', sort: 'lightest' });
  });
});

describe('the trend above the list', () => {
  it('has a link to the run at every point, one stop of the keyboard among them', async () => {
    const page = await open('?state=flight');
    const picture = page.getByRole('group', { name: /arrow keys move along the line/ });
    const points = picture.getByRole('link');
    expect(await points.count()).toBeGreaterThan(10);
    expect(await picture.locator('a[tabindex="0"]').count()).toBe(1);
    await tabTo(page, picture.locator('a[tabindex="0"]'));
    await page.keyboard.press('Home');
    const oldest = picture.locator('[data-point="0"]');
    await eventually(() => hasFocus(oldest)).toBe(true);
    await page.keyboard.press('ArrowRight');
    const second = picture.locator('[data-point="1"]');
    await eventually(() => hasFocus(second)).toBe(true);
    const address = (await second.getAttribute('href'))!;
    const named = (await second.getAttribute('aria-label'))!;
    await page.keyboard.press('Enter');
    await page.waitForURL((url) => url.pathname === address);
    await settled(page);
    expect(await page.getByRole('main').textContent()).toContain(named.split(',')[0]);
  });

  it('opens as a table with the same runs, values and limits', async () => {
    const page = await open('?state=flight&quantity=centre.x');
    const picture = page.getByRole('group', { name: /arrow keys move along the line/ });
    const points = await picture.getByRole('link').evaluateAll((links: unknown[]) =>
      (links as { getAttribute(name: string): string }[]).map((link) => ({
        href: link.getAttribute('href'),
        name: link.getAttribute('aria-label'),
      })),
    );
    await page.getByText('The same as a table').click();
    const table = page.getByRole('region', { name: /centre x as a table$/ }).locator('table');
    await table.waitFor();
    const rows = await cellsOf(table);
    expect(rows).toHaveLength(points.length);
    for (const [i, [label, , value]] of rows.toReversed().entries())
      expect(points[i]!.name).toMatch(new RegExp(`^${label}, .*, ${value} mm`));
    expect(await table.locator('tbody a').first().getAttribute('href')).toBe(points.at(-1)!.href);
    expect(await table.locator('caption').textContent()).toContain('limits: ');
  });
});
