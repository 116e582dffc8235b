import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RunPage } from '#core/api/runs.ts';
import type { Who } from '#server/demo/people.ts';
import { Person } from '#server/models/index.ts';
import { linkTo, PATHS } from '#web/paths.ts';
import {
  beyondEdge,
  eventually,
  faultsInBothThemes,
  oneBrowser,
  settled,
  visit,
} from '../../helpers/browser.ts';
import { PETREL, signInOf, startDemo } from '../../helpers/demo-server.ts';
import { machineText } from '../../helpers/machine-text.ts';
import type { TestServer } from '../../helpers/test-server.ts';

let server: TestServer;
/** Runs of the drone in flight: with a broken limit, and released. */
let broken: string;
let released: string;

const browser = oneBrowser(() => server.address);
beforeAll(async () => {
  server = await startDemo();
  const { email, password } = signInOf('lucia');
  const client = await server.signIn((await Person.findOne({ where: { email } }))!, password);
  const query = { state: 'flight', limit: 200 };
  const { rows } = await client.get<RunPage>('listRuns', { places: { project: PETREL }, query });
  broken = rows.find(({ verdict }) => verdict === 'outside')!.id;
  released = rows.find(({ release }) => release === 'released')!.id;
});
afterAll(() => server.stop());

const press = (page: Page, name: string | RegExp) => page.getByRole('button', { name }).first().click();

interface Opened {
  readonly what: string;
  readonly as: Who | null;
  readonly address: () => string;
  /** Opens it, and comes back when it is there. */
  readonly act: (page: Page) => Promise<unknown>;
}

const OPENED: Opened[] = [
  {
    what: 'a list of the sentence and the table behind the trend',
    as: 'lucia',
    address: () => `${linkTo.history(PETREL)}?verdict=outside`,
    act: async (page) => {
      await page.getByText('The same as a table').click();
      await page.getByRole('region', { name: /as a table$/ }).waitFor();
      await press(page, /^since: /);
      await page.getByRole('listbox').waitFor();
    },
  },
  {
    what: 'the menu of the account',
    as: 'bram',
    address: () => PATHS.account,
    act: async (page) => {
      await press(page, /: your account$/);
      await page.getByRole('button', { name: 'Sign out', exact: true }).waitFor();
    },
  },
  {
    what: 'a run with a broken limit, a group of its parts and a line of its file',
    as: 'noor',
    address: () => linkTo.run(PETREL, broken),
    act: async (page) => {
      await page
        .getByRole('region', { name: 'Parts, table' })
        .locator('[aria-expanded=false]')
        .first()
        .click();
      await page.getByRole('region', { name: 'Limits' }).getByRole('link').first().click();
      await page.getByRole('region', { name: /^Text of / }).waitFor();
    },
  },
  {
    what: 'the reason for a withdrawal that is still missing',
    as: 'ingrid',
    address: () => linkTo.run(PETREL, released),
    act: async (page) => {
      await press(page, 'Withdraw …');
      await press(page, 'Withdraw the release');
      await page.getByText('Give the reason in a few words.').waitFor();
    },
  },
  {
    what: 'a comparison by groups, with what did not change',
    as: 'lucia',
    address: () => `${linkTo.compare(PETREL, 'baseline', broken)}&by=group&show=all&quantity=inertia.xz`,
    act: (page) => page.getByRole('region', { name: /^Who moved the Ixz.*as a table/ }).waitFor(),
  },
  {
    what: 'the faults of an upload',
    as: 'noor',
    address: () => linkTo.upload(PETREL),
    act: async (page) => {
      const buffer = Buffer.from(`${machineText().replace('mass: 2,', 'mass: 2 mm,')}oddity: 1\n`);
      await page.getByLabel('Files of the assembly').setInputFiles({ name: 'a.yaml', mimeType: '', buffer });
      await page.getByText('a.yaml').first().waitFor();
      await press(page, 'Roll it up');
      await page.getByRole('heading', { name: /nothing is kept/ }).waitFor();
    },
  },
  {
    what: 'a token that is shown once',
    as: 'noor',
    address: () => linkTo.tokens(PETREL),
    act: async (page) => {
      await page.getByLabel('What for').fill('bench');
      await press(page, /^Make/);
      await page.getByText('STEELYARD_TOKEN').first().waitFor();
    },
  },
  {
    what: 'a question before somebody is taken out of a project',
    as: 'bram',
    address: () => linkTo.members(PETREL),
    act: async (page) => {
      await page.getByRole('table').getByRole('button').last().click();
      await page.getByRole('button', { name: 'Leave it' }).waitFor();
    },
  },
  {
    what: 'a sign-in with nothing filled in',
    as: null,
    address: () => PATHS.signIn,
    act: async (page) => {
      await press(page, 'Sign in');
      await page.getByText('Write your password.').waitFor();
    },
  },
];

describe.each(OPENED)('$what', ({ as, address, act }) => {
  it('has nothing that axe finds, in light and in dark, and fits 320 pixels', async () => {
    const page = await browser.open({ ...(as && { as: signInOf(as) }) });
    await visit(page, address());
    await act(page);
    await settled(page);
    expect(await faultsInBothThemes(page)).toEqual([]);
    await page.setViewportSize({ width: 320, height: 640 });
    await eventually(() => beyondEdge(page)).toBe(0);
  });
});
