import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RunPage } from '#core/api/runs.ts';
import type { Who } from '#server/demo/people.ts';
import { Person } from '#server/models/index.ts';
import { linkTo, PATHS } from '#web/paths.ts';
import { oneBrowser, visit } from '../../helpers/browser.ts';
import { PETREL, signInOf, startDemo } from '../../helpers/demo-server.ts';
import type { TestServer } from '../../helpers/test-server.ts';

let server: TestServer;
/** A run whose release is asked for and checked, and one whose release nobody asked for. */
let asked: string;
let plain: string;

const browser = oneBrowser(() => server.address);
beforeAll(async () => {
  server = await startDemo();
  const { email, password } = signInOf('lucia');
  const client = await server.signIn((await Person.findOne({ where: { email } }))!, password);
  const { rows } = await client.get<RunPage>('listRuns', { places: { project: PETREL } });
  asked = rows.find(({ release }) => release === 'asked')!.id;
  plain = rows.find(({ release, dirty }) => release === null && !dirty)!.id;
});
afterAll(() => server.stop());

async function openAs(who: Who, address: string): Promise<Page> {
  const page = await browser.open({ as: signInOf(who) });
  await visit(page, address);
  return page;
}

/** The names of what can be pressed or written in on a page, beside what only changes what is shown. */
async function controls(page: Page): Promise<string[]> {
  const main = page.getByRole('main');
  const named = async (role: 'button' | 'textbox' | 'combobox' | 'radio') =>
    main
      .getByRole(role)
      .evaluateAll((elements: unknown[]) =>
        (
          elements as { ariaLabel: string | null; textContent: string; labels?: { textContent: string }[] }[]
        ).map(
          ({ ariaLabel, textContent, labels }) =>
            ariaLabel ?? (textContent || labels?.[0]?.textContent || ''),
        ),
      );
  return (await Promise.all((['button', 'textbox', 'combobox', 'radio'] as const).map(named))).flat();
}

const RELEASING = ['Ask for release', 'Mark as checked', 'Release'];

describe('what a role may not do is not offered', () => {
  it.each<[Who, string[]]>([
    ['lucia', []],
    ['noor', ['Ask for release', 'Mark as checked']],
    ['ingrid', RELEASING],
  ])('to %s on a run that waits for its release', async (who, offered) => {
    const page = await openAs(who, linkTo.run(PETREL, asked));
    const found = await controls(page);
    expect(found.filter((name) => RELEASING.includes(name))).toEqual(offered);
    expect(found.includes('Your comment')).toBe(who !== 'lucia');
    expect(found.includes('Comment')).toBe(who !== 'lucia');
  });

  it('to an engineer stands what is not possible now, with its reason', async () => {
    const page = await openAs('noor', linkTo.run(PETREL, plain));
    const check = page.getByRole('button', { name: 'Mark as checked' });
    expect(await check.isDisabled()).toBe(true);
    expect(await page.getByText('Nobody has asked for its release yet.').count()).toBeGreaterThan(0);
    expect(await page.getByRole('button', { name: 'Ask for release' }).isDisabled()).toBe(false);
  });

  it.each<[Who, boolean]>([
    ['lucia', false],
    ['noor', true],
  ])('to %s on the pages for uploads and tokens', async (who, may) => {
    const upload = await openAs(who, linkTo.upload(PETREL));
    const choose = ['choose files', 'a whole folder', 'Roll it up'];
    expect((await controls(upload)).filter((name) => choose.includes(name))).toEqual(may ? choose : []);
    const tokens = await openAs(who, linkTo.tokens(PETREL));
    expect(await tokens.getByRole('form').or(tokens.locator('main form')).count()).toBe(may ? 1 : 0);
    if (!may) expect(await controls(tokens)).toEqual([]);
    const said = tokens.getByText('Tokens are made by engineers and approvers');
    expect(await said.count()).toBe(may ? 0 : 1);
  });

  it.each<[Who, boolean]>([
    ['lucia', false],
    ['noor', false],
    ['ingrid', false],
    ['bram', true],
  ])('to %s on the page of members, and in the masthead', async (who, administrator) => {
    const page = await openAs(who, linkTo.members(PETREL));
    const found = await controls(page);
    if (administrator) expect(found).toContain('Send the invitation');
    else expect(found).toEqual([]);
    const pages = page.getByRole('navigation', { name: 'Pages' });
    expect(await pages.getByRole('link', { name: 'Audit' }).count()).toBe(administrator ? 1 : 0);
    await page.getByRole('button', { name: 'Project Petrel: choose another' }).click();
    await page.getByRole('link', { name: 'All projects' }).waitFor();
    expect(await page.getByRole('link', { name: 'Settings of Petrel' }).count()).toBe(administrator ? 1 : 0);
    await visit(page, `${PATHS.projects}?all`);
    expect(await page.getByRole('button', { name: 'Start it' }).count()).toBe(administrator ? 1 : 0);
  });

  it('to one who is not signed in: every page of a project leads to the sign-in, and on from there', async () => {
    const page = await browser.open();
    const wanted = `${linkTo.run(PETREL, plain)}?about=origin`;
    await page.goto(wanted);
    await page.getByRole('heading', { level: 1, name: 'Sign in' }).waitFor();
    expect(await page.getByRole('navigation', { name: 'Pages' }).getByRole('link').count()).toBe(0);
    await page.getByRole('button', { name: `Fill in ${signInOf('lucia').email}` }).click();
    await page.keyboard.press('Enter');
    await page.getByText('About the origin').first().waitFor();
    expect(page.url()).toBe(server.address + wanted);
  });
});
