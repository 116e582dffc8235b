import { existsSync } from 'node:fs';
import { AxeBuilder } from '@axe-core/playwright';
import {
  type Browser,
  type BrowserContext,
  type BrowserContextOptions,
  chromium,
  type Locator,
  type Page,
} from 'playwright-core';
import { afterAll, afterEach, beforeAll, expect } from 'vitest';
import { addressOf } from '#core/api/routes.ts';
import { installPackages } from '#server/postgres/programs.ts';

const CHROMIUM = '/usr/bin/chromium';
const ARGS = [
  '--no-sandbox',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];
/** Of the one page that a test waits for, on a busy machine. */
const PATIENCE_MS = 15_000;

export interface Visitor extends BrowserContextOptions {
  /** Who is signed in; nobody where left out. */
  readonly as?: { readonly email: string; readonly password: string };
  /** What the console may say in this test; all else fails it. */
  readonly mayComplain?: RegExp;
  /** For several tests: stays until whoever opened it closes its context. */
  readonly stays?: boolean;
}

/** Debian's Chromium, installed where missing. */
async function launch(): Promise<Browser> {
  if (!existsSync(CHROMIUM)) installPackages(['chromium'], (line) => console.error(line));
  return chromium.launch({ executablePath: CHROMIUM, args: ARGS });
}

/**
 * One browser for a file of tests. Every page is in a context of its own, which ends with its test; an error in a page
 * or on its console, a breach of the content security policy too, fails the test.
 *
 * @param address of the server
 */
export function oneBrowser(address: () => string): { open: (visitor?: Visitor) => Promise<Page> } {
  let browser: Browser;
  const contexts: BrowserContext[] = [];
  const complaints: string[] = [];
  const signedIn = new Map<string, Cookies>();
  beforeAll(async () => {
    browser = await launch();
  });
  afterEach(async () => {
    await Promise.all(contexts.splice(0).map((context) => context.close()));
    expect(complaints.splice(0), 'what pages complained of').toEqual([]);
  });
  afterAll(() => browser?.close());
  const open = async ({ as, mayComplain, stays, ...options }: Visitor = {}): Promise<Page> => {
    const context = await browser.newContext({
      baseURL: address(),
      locale: 'en-GB',
      timezoneId: 'UTC',
      reducedMotion: 'reduce',
      viewport: { width: 1280, height: 900 },
      ...options,
    });
    if (!stays) contexts.push(context);
    context.setDefaultTimeout(PATIENCE_MS);
    const note = (text: string) => mayComplain?.test(text) || complaints.push(text);
    context.on('console', (message) => message.type() === 'error' && note(message.text()));
    context.on('weberror', (error) => note(String(error.error())));
    if (as) {
      const known = signedIn.get(as.email);
      if (known) await context.addCookies(known);
      else signedIn.set(as.email, await signIn(context, as, address()));
    }
    return context.newPage();
  };
  return { open };
}

type Cookies = Awaited<ReturnType<BrowserContext['cookies']>>;

/** Gives a context the cookie of a session without showing the sign-in page; it serves other contexts too. */
async function signIn(
  context: BrowserContext,
  data: NonNullable<Visitor['as']>,
  origin: string,
): Promise<Cookies> {
  const answer = await context.request.post(addressOf('signIn'), { data, headers: { origin } });
  if (!answer.ok()) throw new Error(`sign-in answered ${answer.status()}`);
  return context.cookies();
}

/** Opens an address and waits until nothing on the page is still loading. */
export async function visit(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await settled(page);
}

export async function settled(page: Page): Promise<void> {
  await page.locator('main h1').first().waitFor();
  await page.locator('.waiting').first().waitFor({ state: 'detached' });
}

/** As `expect.poll`, with patience for a busy machine. */
export const eventually = <T>(look: () => T) => expect.poll(look, { timeout: PATIENCE_MS });

/** What axe finds against WCAG 2.2 AA as a page stands: the rule and where, a line each. */
export async function faultsOfAxe(page: Page): Promise<string[]> {
  const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
  return linesOf(axeOn(page).withTags(tags));
}

/** The same in light, then, for the rules that another theme can break, in dark. */
export async function faultsInBothThemes(page: Page): Promise<string[]> {
  const paper = () => styleOf(page.locator('body'), 'backgroundColor');
  const light = await paper();
  const found = await faultsOfAxe(page);
  await page.emulateMedia({ colorScheme: 'dark' });
  if ((await paper()) === light) throw new Error('the dark theme has the paper of the light one');
  return [...found, ...(await linesOf(axeOn(page).withRules(RULES_OF_COLOUR)))];
}

const RULES_OF_COLOUR = ['color-contrast', 'link-in-text-block'];

/** Only what is wrong is worked out in full. */
const axeOn = (page: Page): AxeBuilder =>
  new AxeBuilder({ page }).options({ resultTypes: ['violations'] }).setLegacyMode();

async function linesOf(axe: AxeBuilder): Promise<string[]> {
  const { violations } = await axe.analyze();
  return violations.flatMap(({ id, nodes }) =>
    nodes.map(({ target, failureSummary }) => `${id}: ${target.join(' ')}: ${failureSummary}`),
  );
}

/** How many pixels of a page lie beyond its right edge. */
export const beyondEdge = (page: Page): Promise<number> =>
  page.evaluate('document.documentElement.scrollWidth - document.documentElement.clientWidth');

/** What these tests ask of an element; the library that knows the rest is the dashboard's alone. */
interface Element {
  readonly ownerDocument: {
    readonly activeElement: unknown;
    readonly defaultView: { getComputedStyle(element: unknown): Record<string, string> };
  };
}

export const hasFocus = (locator: Locator): Promise<boolean> =>
  locator.evaluate((element) => (element as unknown as Element).ownerDocument.activeElement === element);

/** One property of the style that an element has come to. */
export const styleOf = (locator: Locator, property: string): Promise<string> =>
  locator.evaluate((element, name) => {
    const { defaultView } = (element as unknown as Element).ownerDocument;
    return defaultView.getComputedStyle(element)[name]!;
  }, property);

const STOPS_AT_MOST = 300;

/** Presses Tab until something has the focus, as one without a mouse would. */
export async function tabTo(page: Page, goal: Locator, key: 'Tab' | 'Shift+Tab' = 'Tab'): Promise<void> {
  await goal.waitFor();
  for (let i = 0; i < STOPS_AT_MOST; i++) {
    if (await hasFocus(goal)) return;
    await page.keyboard.press(key);
  }
  throw new Error(`${STOPS_AT_MOST} × ${key} did not come to ${goal}`);
}

/** The cells of a table's body as text, row by row. */
export const cellsOf = (table: Locator): Promise<string[][]> =>
  table
    .locator('tbody tr')
    .evaluateAll((rows: unknown[]) =>
      (rows as { cells: Iterable<{ textContent: string }> }[]).map((row) =>
        [...row.cells].map((cell) => cell.textContent.replace(/\s+/g, ' ').trim()),
      ),
    );
