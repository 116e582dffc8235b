import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Person } from '#server/models/index.ts';
import { linkTo } from '#web/paths.ts';
import { cellsOf, oneBrowser, settled, tabTo, visit } from '../../helpers/browser.ts';
import { startDashboard } from '../../helpers/demo-server.ts';
import { machineText } from '../../helpers/machine-text.ts';
import { pushBody, recordsOfText } from '../../helpers/pushed-records.ts';
import { PASSWORD, type TestServer } from '../../helpers/test-server.ts';

let server: TestServer;
let people: Record<'engineer' | 'checker' | 'approver', Person>;
/** Of two commits, the older one first. */
let runs: string[];

const browser = oneBrowser(() => server.address);
beforeAll(async () => {
  server = await startDashboard();
  const project = await server.project('rover');
  people = {
    engineer: await server.person('Pre Parer', 'engineer', project),
    checker: await server.person('Check Er', 'engineer', project),
    approver: await server.person('Appro Ver', 'approver', project),
  };
  const ci = server.withToken(await server.token(people.engineer, project, 'push'));
  runs = [];
  for (const [i, tip] of [1, 1.2].entries()) {
    const commit = `${i + 1}`.repeat(40);
    const [record] = recordsOfText(machineText(tip), {
      commit,
      branch: 'main',
      author: 'Some One <some@example.org>',
    });
    const { text, sha256 } = record!.inputs[0]!;
    const places = { project: 'rover', sha256 };
    await ci.get('putInput', { places, body: new TextEncoder().encode(text) });
    const pushed = await ci.get<{ runs: { id: string }[] }>('pushRuns', {
      places,
      body: pushBody([record!], `key-of-${commit}`),
    });
    runs.push(pushed.runs[0]!.id);
  }
});
afterAll(() => server.stop());

const signInOf = ({ email }: Person) => ({ email, password: PASSWORD });

/** Comes to a button or link by Tab and presses Enter. */
async function press(page: Page, role: 'button' | 'link', name: string | RegExp) {
  await tabTo(page, page.getByRole(role, { name, exact: true }));
  await page.keyboard.press('Enter');
}

describe('by keyboard alone, one', () => {
  it('signs in, after being told what is missing', async () => {
    const page = await browser.open({ mayComplain: /401/ });
    await visit(page, linkTo.history('rover'));
    const [email, password] = [page.getByLabel('E-mail'), page.getByLabel('Password')];
    await tabTo(page, email);
    await page.keyboard.type(people.engineer.email);
    await page.keyboard.press('Enter');
    await page.getByText('Write your password.').waitFor();
    await tabTo(page, password);
    await page.keyboard.type('not the right one');
    await page.keyboard.press('Enter');
    const notice = page.getByRole('alert');
    await notice.waitFor();
    expect(await notice.textContent()).toContain('SIGN_IN_WRONG');
    await tabTo(page, password);
    await page.keyboard.press('Control+A');
    await page.keyboard.type(PASSWORD);
    await page.keyboard.press('Enter');
    await page.getByRole('heading', { name: 'Runs of Rover' }).waitFor();
  });

  it('uploads a file with a fault, sees it against the text, mends it and opens the run', async () => {
    const page = await browser.open({ as: signInOf(people.engineer) });
    await visit(page, linkTo.history('rover'));
    await press(page, 'link', 'Upload');
    await page.getByRole('heading', { name: 'Upload' }).waitFor();
    const choose = async (text: string) => {
      const chooser = page.waitForEvent('filechooser');
      await press(page, 'button', 'choose files');
      const file = { name: 'rover.yaml', mimeType: 'text/yaml', buffer: Buffer.from(text) };
      await (await chooser).setFiles([file]);
      await page.getByRole('cell', { name: 'rover.yaml' }).or(page.getByText('rover.yaml')).first().waitFor();
      await press(page, 'button', 'Roll it up');
    };
    await choose(machineText(1.3).replace('mass: 2,', 'mass: 2 mm,'));
    await page.getByRole('heading', { name: 'One fault; nothing is kept' }).waitFor();
    const excerpt = page.getByRole('region', { name: 'Line 5 in its place' });
    expect(await excerpt.textContent()).toContain('5 |   - { name: cube');
    expect(await excerpt.locator('mark').textContent()).toContain('2 mm');
    expect(await page.getByText('rover.yaml:5:').textContent()).toMatch(/^rover\.yaml:5:\d+$/);
    await choose(machineText(1.3));
    await page.getByRole('heading', { name: '2 runs are kept' }).waitFor();
    await press(page, 'link', 'rover, driving');
    await page.getByRole('heading', { level: 1, name: 'rover, driving' }).waitFor();
  });

  it('chooses two runs in the history and compares them', async () => {
    const page = await browser.open({ as: signInOf(people.checker) });
    await visit(page, linkTo.history('rover'));
    for (const commit of ['1111', '2222']) {
      await tabTo(page, page.getByRole('checkbox', { name: `choose ${commit}` }));
      await page.keyboard.press('Space');
    }
    await press(page, 'button', 'Compare the two chosen');
    await page.getByRole('heading', { name: 'What moved from A to B' }).waitFor();
    await settled(page);
    const address = new URL(page.url());
    expect([address.searchParams.get('a'), address.searchParams.get('b')]).toEqual(runs);
    // 0.2 kg more at the tip with 10 % of growth.
    const mass = page.getByRole('region', { name: 'Totals' }).getByRole('row', { name: /^mass/i });
    expect(await mass.textContent()).toContain('+0.2200');
  });

  it('asks for a release, checks it and releases it, each under their own name', async () => {
    const address = linkTo.run('rover', runs[1]!);
    const openAs = async (person: Person) => {
      const page = await browser.open({ as: signInOf(person) });
      await visit(page, address);
      await page.getByText('Recomputed here to the same bits.').waitFor();
      return page;
    };
    const engineer = await openAs(people.engineer);
    await press(engineer, 'button', 'Ask for release');
    await engineer.getByText('Release asked for', { exact: true }).waitFor();
    await engineer.getByText('Who prepared it does not check it.').waitFor();
    const checker = await openAs(people.checker);
    await press(checker, 'button', 'Mark as checked');
    await checker.getByText('asked for and checked').waitFor();
    const approver = await openAs(people.approver);
    await press(approver, 'button', 'Release');
    await approver.getByText('released as the baseline', { exact: true }).waitFor();
    const names = await cellsOf(approver.getByRole('table', { name: 'Prepared, checked and approved' }));
    expect(names.map(([step, who]) => `${step}: ${who}`)).toEqual([
      'Prepared: Pre Parer',
      'Checked: Check Er',
      'Approved: Appro Ver',
    ]);
  });
});
