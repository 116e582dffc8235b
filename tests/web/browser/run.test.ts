import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { InputTexts, RunDetail, RunPage } from '#core/api/runs.ts';
import {
  displayUnits,
  inUnit,
  type ProductsSign,
  printTensor,
  readFigure,
  scaleFor,
  tensorRows,
} from '#core/figures/index.ts';
import { fromRows } from '#core/linalg/symmetric3.ts';
import { Person } from '#server/models/index.ts';
import { linkTo } from '#web/paths.ts';
import { cellsOf, eventually, hasFocus, oneBrowser, visit } from '../../helpers/browser.ts';
import { PETREL, signInOf, startDemo } from '../../helpers/demo-server.ts';
import type { TestServer } from '../../helpers/test-server.ts';

let server: TestServer;
/** The latest released run of the drone in flight. */
let detail: RunDetail;
let inputs: InputTexts;

const browser = oneBrowser(() => server.address);
beforeAll(async () => {
  server = await startDemo();
  const { email, password } = signInOf('lucia');
  const client = await server.signIn((await Person.findOne({ where: { email } }))!, password);
  const query = { state: 'flight', limit: 200 };
  const { rows } = await client.get<RunPage>('listRuns', { places: { project: PETREL }, query });
  const places = { project: PETREL, run: rows.find(({ release }) => release === 'released')!.id };
  detail = await client.get<RunDetail>('showRun', { places });
  inputs = await client.get<InputTexts>('showInputs', { places });
});
afterAll(() => server.stop());

async function open(more = ''): Promise<Page> {
  const page = await browser.open({ as: signInOf('lucia') });
  await visit(page, linkTo.run(PETREL, detail.run.id) + more);
  return page;
}

interface View {
  readonly about: 'centre' | 'origin';
  readonly products: ProductsSign;
  readonly units: string;
  readonly on: 'basic' | 'predicted';
}

const AS_OPENED: View = { about: 'centre', products: 'negative', units: 'file', on: 'predicted' };

/** The tensor of the record as core prints it, with its unit. */
function printed({ about, products, units, on }: View): { head: string; rows: string[][] } {
  const { aboutCentre, aboutOrigin } = detail.record[on].inertia!;
  const tensor = fromRows(about === 'centre' ? aboutCentre : aboutOrigin);
  const scale = scaleFor(displayUnits(detail.record, units).inertia, tensor);
  return { head: scale.head, rows: tensorRows(printTensor(inUnit(tensor, scale), 6), products) };
}

/** The tensor of the page with its unit. */
async function shown(page: Page, { about, products }: View): Promise<{ head: string; rows: string[][] }> {
  const point = about === 'centre' ? 'about the centre of mass' : 'about the origin';
  const table = page.getByRole('table', { name: `Inertia tensor ${point}, ` }).first();
  const [caption = 'none'] = await table.locator('caption').allTextContents();
  const head = new RegExp(`^Inertia tensor ${point}, (.+), products ${products}$`).exec(caption)?.[1];
  return { head: head ?? caption, rows: await cellsOf(table) };
}

describe("the tensor on a run's page", () => {
  let shared: Page;
  beforeAll(async () => {
    shared = await browser.open({ as: signInOf('lucia'), stays: true });
  });
  afterAll(() => shared?.context().close());

  it.each<Partial<View>>([
    {},
    { about: 'origin' },
    { products: 'positive' },
    { units: 'si' },
    { units: 'lb,in' },
    { on: 'basic' },
    { about: 'origin', products: 'positive', units: 'kg,mm', on: 'basic' },
  ])('is the one that core prints for the address %o', async (asked) => {
    const view = { ...AS_OPENED, ...asked };
    const search = new URLSearchParams(asked as Record<string, string>);
    await visit(shared, `${linkTo.run(PETREL, detail.run.id)}?${search}`);
    expect(await shown(shared, view)).toEqual(printed(view));
  });

  it('changes with the sentence above it, and so does the address', async () => {
    const page = await open();
    const choose = async (word: RegExp, option: string) => {
      await page.getByRole('button', { name: word }).click();
      await page.getByRole('option', { name: option }).click();
    };
    await choose(/^reference point: /, 'the origin');
    await choose(/^sign of the products: /, 'positive');
    await choose(/^units: /, 'SI');
    const view: View = { ...AS_OPENED, about: 'origin', products: 'positive', units: 'si' };
    await eventually(() => shown(page, view)).toEqual(printed(view));
    expect(Object.fromEntries(new URL(page.url()).searchParams)).toEqual({
      about: 'origin',
      products: 'positive',
      units: 'si',
    });
    const line = (await page.getByRole('main').locator('header').textContent())!;
    expect(line).toContain('About the origin');
    expect(line).toContain('products positive (Pxy = +∫xy dm)');
  });

  it('is in units that are written by hand, and says what is wrong with those that are none', async () => {
    const page = await open();
    await page.getByRole('button', { name: /^units: / }).click();
    await page.getByRole('option', { name: 'other units' }).click();
    const field = page.getByRole('textbox', { name: 'units of mass, length, angle and moment of inertia' });
    await field.fill('oz,ft');
    await field.press('Enter');
    const view: View = { ...AS_OPENED, units: 'oz,ft' };
    await eventually(() => shown(page, view)).toEqual(printed(view));
    await visit(page, `${linkTo.run(PETREL, detail.run.id)}?units=furlong`);
    const notice = page.getByRole('alert');
    expect(await notice.textContent()).toContain('furlong');
    expect(await shown(page, AS_OPENED)).toEqual(printed(AS_OPENED));
  });
});

describe("the rest of a run's page", () => {
  it('has parts that add up to the total at the top level, as printed', async () => {
    const rows = await cellsOf((await open()).getByRole('region', { name: 'Parts, table' }).locator('table'));
    const masses = rows.map((cells) => cells[2]!);
    const [total] = masses.slice(-1);
    const digits = (figure: string) => BigInt(figure.replace('−', '-').replace('.', ''));
    expect(masses.length).toBeGreaterThan(3);
    expect(masses.slice(0, -1).reduce((sum, figure) => sum + digits(figure), 0n)).toBe(digits(total!));
    const { mass } = displayUnits(detail.record, 'file');
    expect(readFigure(total!)).toBeCloseTo(detail.record.predicted.mass / mass.factor, 1);
  });

  it('leads from a limit to its line in the file, which is marked and takes the focus', async () => {
    const page = await open('?units=si');
    const { at } = detail.record.limits[0]!;
    await page.getByRole('region', { name: 'Limits' }).locator(`a[title="${at.file}:${at.line}"]`).click();
    const line = page.getByRole('region', { name: `Text of ${at.file}` }).locator(`[data-line="${at.line}"]`);
    await eventually(() => hasFocus(line)).toBe(true);
    const text = inputs.find(({ path }) => path === at.file)!.text!.split('\n')[at.line - 1]!;
    expect(await line.textContent()).toBe(`${at.line}${text}`);
    const [{ y }, height] = [(await line.boundingBox())!, page.viewportSize()!.height];
    expect(y).toBeGreaterThan(0);
    expect(y).toBeLessThan(height);
    expect(new URL(page.url()).search).toBe('?units=si');
  });

  it('opens at the line that an address names', async () => {
    const { at } = detail.record.limits.at(-1)!;
    const page = await open(`#line:${at.file}:${at.line}`);
    const line = page.getByRole('region', { name: `Text of ${at.file}` }).locator(`[data-line="${at.line}"]`);
    await eventually(() => hasFocus(line)).toBe(true);
  });

  it('prints as a report: no navigation, nothing to choose or to write in, the three names and the caution', async () => {
    const page = await open();
    await page.emulateMedia({ media: 'print' });
    expect(await page.getByRole('navigation').count()).toBe(0);
    expect(await page.getByRole('link', { name: /Steelyard|^Skip|JSON|CSV/ }).count()).toBe(0);
    expect(await page.getByRole('button', { name: /Report|open all|reference point/ }).count()).toBe(0);
    expect(await page.getByRole('textbox').count()).toBe(0);
    const names = page.getByRole('table', { name: 'Prepared, checked and approved' });
    expect(await names.isVisible()).toBe(true);
    expect((await cellsOf(names)).map(([step, who]) => [step, who])).toEqual([
      ['Prepared', 'Noor Haddad'],
      ['Checked', 'Tomas Lind'],
      ['Approved', 'Ingrid Moreau'],
    ]);
    expect(await page.getByText('do not replace licensed engineering judgement').first().isVisible()).toBe(
      true,
    );
    expect((await shown(page, AS_OPENED)).rows).toEqual(printed(AS_OPENED).rows);
  });

  it('gives its record, parts and inertial element as files', async () => {
    const page = await open();
    const read = async (name: string | RegExp) => {
      const download = page.waitForEvent('download');
      await page.getByRole('link', { name }).click();
      const chunks: Buffer[] = [];
      for await (const chunk of await (await download).createReadStream()) chunks.push(chunk as Buffer);
      return Buffer.concat(chunks).toString('utf8');
    };
    expect(JSON.parse(await read('record JSON'))[0].stamp).toBe(detail.record.stamp);
    expect((await read('parts CSV')).trimEnd().split('\n').length).toBeGreaterThan(
      detail.record.parts.length,
    );
    expect(await read(/^URDF/)).toContain('<inertial>');
  });
});
