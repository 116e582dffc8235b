import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RunPage } from '#core/api/runs.ts';
import type { Who } from '#server/demo/people.ts';
import { stopLink } from '#server/mail/stop-link.ts';
import { Person } from '#server/models/index.ts';
import { linkTo, PATHS } from '#web/paths.ts';
import {
  beyondEdge,
  eventually,
  faultsInBothThemes,
  hasFocus,
  oneBrowser,
  styleOf,
  visit,
} from '../../helpers/browser.ts';
import { PETREL, signInOf, startDemo } from '../../helpers/demo-server.ts';
import type { TestServer } from '../../helpers/test-server.ts';

let server: TestServer;
/** What the addresses of some pages need. */
let run: string;
let invitation: string;
let mailStop: string;

const browser = oneBrowser(() => server.address);
beforeAll(async () => {
  server = await startDemo();
  const person = async (who: Who) => {
    const { email, password } = signInOf(who);
    return server.signIn((await Person.findOne({ where: { email } }))!, password);
  };
  const administrator = await person('bram');
  const places = { project: PETREL };
  const { rows } = await administrator.get<RunPage>('listRuns', { places, query: { state: 'flight' } });
  run = rows.find(({ release }) => release === 'asked')!.id;
  await administrator.get('invite', { places, body: { email: 'new@petrel.example', role: 'viewer' } });
  const letter = await server.letter('new@petrel.example', 'invites you');
  invitation = /\/invitation\/\S+/.exec(letter.text)![0];
  const { email } = signInOf('tomas');
  mailStop = new URL(stopLink((await Person.findOne({ where: { email } }))!, server.config)).pathname;
});
afterAll(() => server.stop());

interface Visited {
  /** Whoever has most to do there; nobody where the page is for those without an account. */
  readonly as: Who | null;
  readonly address: () => string;
}

const VISITED: Record<keyof typeof PATHS, Visited> = {
  projects: { as: 'bram', address: () => `${PATHS.projects}?all` },
  signIn: { as: null, address: () => PATHS.signIn },
  askReset: { as: null, address: () => PATHS.askReset },
  reset: { as: null, address: () => PATHS.reset.replace(':link', 'some-link') },
  invitation: { as: null, address: () => invitation },
  mailStop: { as: null, address: () => mailStop },
  history: { as: 'lucia', address: () => linkTo.history(PETREL) },
  run: { as: 'ingrid', address: () => linkTo.run(PETREL, run) },
  compare: { as: 'lucia', address: () => linkTo.compare(PETREL, 'baseline', run) },
  upload: { as: 'noor', address: () => linkTo.upload(PETREL) },
  members: { as: 'bram', address: () => linkTo.members(PETREL) },
  tokens: { as: 'noor', address: () => linkTo.tokens(PETREL) },
  settings: { as: 'bram', address: () => linkTo.settings(PETREL) },
  people: { as: 'bram', address: () => PATHS.people },
  audit: { as: 'bram', address: () => PATHS.audit },
  account: { as: 'noor', address: () => PATHS.account },
  mail: { as: null, address: () => PATHS.mail },
};

const PAGES = Object.keys(PATHS) as (keyof typeof PATHS)[];
const titles: string[] = [];

describe.each(PAGES)('the page %s', (name) => {
  let page: Page;
  beforeAll(async () => {
    const { as, address } = VISITED[name];
    page = await browser.open({ stays: true, ...(as && { as: signInOf(as) }) });
    await visit(page, address());
  });
  afterAll(() => page?.context().close());

  it('says what it is: a title of its own, one head, a main landmark', async () => {
    const title = await page.title();
    expect(title).toMatch(/^\S.* · Steelyard$/);
    expect(titles).not.toContain(title);
    titles.push(title);
    expect(await page.getByRole('heading', { level: 1 }).count()).toBe(1);
    expect(await page.getByRole('main').count()).toBe(1);
    expect(await page.getByRole('navigation', { name: 'Pages' }).count()).toBe(1);
  });

  it('shows where the keyboard is, from the first link on, which leads past the masthead', async () => {
    await page.keyboard.press('Tab');
    const skip = page.getByRole('link', { name: 'Skip to the page' });
    expect(await hasFocus(skip)).toBe(true);
    expect((await skip.boundingBox())!.x).toBeGreaterThanOrEqual(0);
    await page.keyboard.press('Tab');
    const home = page.getByRole('link', { name: 'Steelyard', exact: true });
    expect(await hasFocus(home)).toBe(true);
    expect(await styleOf(home, 'outlineStyle')).toBe('solid');
    expect(Number.parseFloat(await styleOf(home, 'outlineWidth'))).toBeGreaterThanOrEqual(2);
    await page.keyboard.press('Shift+Tab');
    await page.keyboard.press('Enter');
    await eventually(() => hasFocus(page.getByRole('main'))).toBe(true);
  });

  it('has nothing against WCAG 2.2 AA that axe finds, in light and in dark', async () => {
    expect(await faultsInBothThemes(page)).toEqual([]);
  });

  it('fits a screen of 320 pixels', async () => {
    await page.setViewportSize({ width: 320, height: 640 });
    await eventually(() => beyondEdge(page)).toBe(0);
  });
});
