import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { API_ROOT } from '#core/api/routes.ts';
import type { Person, Project } from '#server/models/index.ts';
import { linkTo, PATHS } from '#web/paths.ts';
import { faultsOfAxe, oneBrowser, visit } from '../../helpers/browser.ts';
import { startDashboard } from '../../helpers/demo-server.ts';
import { machineText } from '../../helpers/machine-text.ts';
import { pushBody, recordsOfText } from '../../helpers/pushed-records.ts';
import { PASSWORD, type TestServer } from '../../helpers/test-server.ts';

let server: TestServer;
let project: Project;
let viewer: Person;
let run: string;

const browser = oneBrowser(() => server.address);
beforeAll(async () => {
  server = await startDashboard();
  project = await server.project('rover');
  await server.project('elsewhere');
  viewer = await server.person('View Er', 'viewer', project);
  const token = await server.token(await server.person('Pre Parer', 'engineer', project), project, 'push');
  const pushed = await server.withToken(token).get<{ runs: { id: string }[] }>('pushRuns', {
    places: { project: 'rover' },
    body: pushBody(recordsOfText(machineText()).slice(0, 1)),
  });
  run = pushed.runs[0]!.id;
});
afterAll(() => server.stop());

const signInOf = ({ email }: Person) => ({ email, password: PASSWORD });
const openAsViewer = (mayComplain: RegExp): Promise<Page> =>
  browser.open({ as: signInOf(viewer), mayComplain });

const UNDER_API = `**${API_ROOT}/**`;
const LOST = /net::ERR_/;

describe('where the server is away', () => {
  it('a page that comes says so and comes back with a retry', async () => {
    const page = await openAsViewer(LOST);
    await page.route(UNDER_API, (route) => route.abort());
    await page.goto(linkTo.history('rover'));
    await page.getByRole('heading', { level: 1, name: 'The server is away' }).waitFor();
    const message = page.getByRole('alert');
    expect(await message.textContent()).toContain('The server could not be reached.');
    expect(await message.textContent()).toContain('SERVER_AWAY');
    expect(await faultsOfAxe(page)).toEqual([]);
    await page.unroute(UNDER_API);
    await page.getByRole('button', { name: 'Try again' }).click();
    await page.getByRole('heading', { level: 1, name: 'Runs of Rover' }).waitFor();
  });

  it('a page that is open keeps what it has, and what is opened next comes with a retry', async () => {
    const page = await openAsViewer(LOST);
    await visit(page, linkTo.history('rover'));
    await page.route(UNDER_API, (route) => route.abort());
    await page
      .locator(`tbody a[href="${linkTo.run('rover', run)}"]`)
      .first()
      .click();
    await page.getByText('The server does not answer').waitFor();
    expect(await page.getByRole('navigation', { name: 'Pages' }).isVisible()).toBe(true);
    await page.unroute(UNDER_API);
    await page.getByRole('button', { name: 'Try again' }).click();
    await page.getByRole('heading', { level: 1, name: 'rover, driving' }).waitFor();
  });

  it('a proxy that answers in its place is told from the server', async () => {
    const page = await openAsViewer(/503|502/);
    await page.route(UNDER_API, (route) => route.fulfill({ status: 502, body: '<h1>Bad gateway</h1>' }));
    await page.goto(linkTo.history('rover'));
    await page.getByRole('heading', { level: 1, name: 'The server is away' }).waitFor();
    expect(await page.getByText('Bad gateway').count()).toBe(0);
  });

  it('a comment that cannot be sent stays in its field', async () => {
    const engineer = await server.person('Keep Er', 'engineer', project);
    const page = await browser.open({ as: signInOf(engineer), mayComplain: LOST });
    await visit(page, linkTo.run('rover', run));
    const field = page.getByRole('textbox', { name: 'Your comment' });
    await field.fill('Where does the tip end?');
    await page.route(UNDER_API, (route) => route.abort());
    await page.getByRole('button', { name: 'Comment', exact: true }).click();
    await page.getByText('Nothing that you entered is lost.').waitFor();
    expect(await field.inputValue()).toBe('Where does the tip end?');
    await page.unroute(UNDER_API);
    await page.getByRole('button', { name: 'Comment', exact: true }).click();
    await page.getByRole('article').getByText('Where does the tip end?').waitFor();
    expect(await field.inputValue()).toBe('');
  });
});

describe('what is not there, or not for everybody', () => {
  it.each([
    ['no page', () => '/nothing/of/the/kind'],
    ['no project', () => linkTo.history('never-started')],
    ['no run', () => linkTo.run('rover', '999999')],
    ['a project of others', () => linkTo.history('elsewhere')],
  ])('%s: not found, with a way on', async (_, address) => {
    const page = await openAsViewer(/404/);
    await page.goto(address());
    await page.getByRole('heading', { level: 1, name: 'Nothing hangs here' }).waitFor();
    await page.getByRole('link', { name: 'To your projects' }).click();
    await page.getByRole('heading', { level: 1, name: 'Runs of Rover' }).waitFor();
  });

  it.each([
    ['settings', () => linkTo.settings('rover')],
    ['everybody', () => PATHS.people],
    ['the audit trail', () => PATHS.audit],
  ])('%s: no permission, with a way on', async (_, address) => {
    const page = await openAsViewer(/403/);
    await page.goto(address());
    await page.getByRole('heading', { level: 1, name: 'Not yours to see' }).waitFor();
    expect(await page.getByText('administrators of the server').count()).toBe(1);
    await page.getByRole('link', { name: 'To your projects' }).click();
    await page.getByRole('heading', { level: 1, name: 'Runs of Rover' }).waitFor();
  });

  it('is said on pages as sound as the others', async () => {
    const page = await openAsViewer(/40[34]/);
    for (const address of [linkTo.run('rover', '999999'), PATHS.audit]) {
      await visit(page, address);
      expect(await faultsOfAxe(page)).toEqual([]);
      expect(await page.title()).toMatch(/^(Nothing hangs here|Not yours to see) · Steelyard$/);
    }
  });
});
