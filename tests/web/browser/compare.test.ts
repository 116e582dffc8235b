import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RunPage, RunRow } from '#core/api/runs.ts';
import { contributionsTo, type Difference, difference, type QuantityChange } from '#core/difference/index.ts';
import {
  type DisplayUnits,
  displayUnits,
  formatFixed,
  PLAIN_ROOM,
  readFigure,
  scaleFor,
  TENSOR_ROOM,
} from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { Person } from '#server/models/index.ts';
import { linkTo } from '#web/paths.ts';
import { cellsOf, eventually, oneBrowser, settled, visit } from '../../helpers/browser.ts';
import { PETREL, signInOf, startDemo } from '../../helpers/demo-server.ts';
import type { Client, TestServer } from '../../helpers/test-server.ts';

let server: TestServer;
let client: Client;
/** The two runs between which the drone's wings grew, and its smaller principal axes passed each other. */
let sides: Record<'a' | 'b', { row: RunRow; record: RollUpRecord }>;
let moved: Difference;
let units: DisplayUnits;

const browser = oneBrowser(() => server.address);
beforeAll(async () => {
  server = await startDemo();
  const { email, password } = signInOf('lucia');
  client = await server.signIn((await Person.findOne({ where: { email } }))!, password);
  const places = { project: PETREL };
  const query = { sort: 'oldest', state: 'flight', branch: 'main', limit: 200 };
  const { rows } = await client.get<RunPage>('listRuns', { places, query });
  const side = async (row: RunRow) => ({
    row,
    record: (await client.get<RollUpRecord[]>('downloadRecord', { places: { ...places, run: row.id } }))[0]!,
  });
  const drone = await Promise.all(rows.filter((row) => row.assembly === rows[0]!.assembly).map(side));
  const longer = drone.findIndex(
    ({ record }) => record.parameters.half_span!.value !== drone[0]!.record.parameters.half_span!.value,
  );
  sides = { a: drone[longer - 1]!, b: drone[longer]! };
  moved = difference(sides.a.record, sides.b.record, 'predicted');
  units = displayUnits(sides.b.record);
});
afterAll(() => server.stop());

async function openCompared(more = ''): Promise<Page> {
  const page = await browser.open({ as: signInOf('lucia') });
  await visit(page, linkTo.compare(PETREL, sides.a.row.id, sides.b.row.id) + more);
  return page;
}

const table = (page: Page, label: string) =>
  page.getByRole('region', { name: `${label}, table` }).locator('table');

const decimalsOf = (figure: string): number => figure.split('.')[1]?.length ?? 0;

/** A figure in units of its last digit, whole and without rounding. */
const lastDigits = (figure: string): bigint => BigInt(figure.replace('−', '-').replace(/[.+]/g, ''));

const unitOf = ({ unit }: QuantityChange) =>
  ({ kg: units.mass, m: units.length, rad: units.angle, 'kg*m^2': units.inertia })[unit];

/** The scale of a kind of quantities that share one. */
function scaleOf(quantities: readonly { a: number | null; b: number | null }[], like: QuantityChange) {
  const values = quantities.flatMap(({ a, b }) => [a ?? 0, b ?? 0]);
  return scaleFor(unitOf(like), values, like.unit === 'kg*m^2' ? TENSOR_ROOM : PLAIN_ROOM);
}

describe('the page that compares two runs', () => {
  it('shows the totals that core gives for the same two records, and changes that a reader finds by subtracting', async () => {
    const rows = await cellsOf(table(await openCompared(), 'Totals'));
    const names = ['mass', 'centre.x', 'centre.y', 'centre.z'].concat(
      ['xx', 'yy', 'zz', 'xy', 'xz', 'yz'].map((axes) => `inertia.${axes}`),
    );
    expect(rows).toHaveLength(names.length);
    for (const [i, name] of names.entries()) {
      const [head = '', a = '', b = '', change = ''] = rows[i]!;
      const quantity = moved.quantities.find((q) => q.name === name)!;
      const kind = moved.quantities.filter((q) => q.name.split('.')[0] === name.split('.')[0]);
      const scale = scaleOf(kind, quantity);
      expect(head, name).toMatch(new RegExp(`${name.split('.')[1] ?? 'mass'} `, 'i'));
      expect(head.endsWith(` ${scale.head}`), `${head} is in ${scale.head}`).toBe(true);
      expect([a, b], name).toEqual(
        [quantity.a!, quantity.b!].map((x) => formatFixed(x / scale.factor, decimalsOf(a))),
      );
      expect(lastDigits(b) - lastDigits(a), name).toBe(lastDigits(change));
    }
    const [mass] = rows;
    expect(readFigure(mass![3]!.replace('+', ''))).toBeGreaterThan(0);
  });

  it('matches principal moments by their axes, and says which passed each other', async () => {
    const page = await openCompared();
    const rows = await cellsOf(table(page, 'Principal moments'));
    const { axes, ranksSwapped } = moved.principal!;
    const like = moved.quantities.find((q) => q.name === 'inertia.xx')!;
    const scale = scaleOf(
      axes.map(({ moment }) => moment),
      like,
    );
    expect(rows.map(([head, a, b]) => [head, a, b])).toEqual(
      axes.map(({ nearest, moment }, i) => [
        `Near ${nearest.b} ${scale.head}`,
        ...[moment.a, moment.b].map((x) => formatFixed(x / scale.factor, decimalsOf(rows[i]![1]!))),
      ]),
    );
    expect(ranksSwapped).toBe(true);
    expect(await page.getByText('Two moments passed each other').count()).toBe(1);
    expect(rows.filter(([, , , , , axis]) => axis!.includes('place 1 → 2'))).toHaveLength(1);
    expect(rows.filter(([, , , , , axis]) => axis!.includes('place 2 → 1'))).toHaveLength(1);
  });

  it.each(['mass', 'centre.x', 'inertia.xx', 'principal.z'])(
    'shows what each part gave to the change of %s; every column sums to its foot, the last one to the change',
    async (name) => {
      const page = await openCompared(`&quantity=${name}`);
      const region = page.getByRole('region', { name: /^Who moved the .*as a table/ });
      const unit = /in (.+)$/.exec((await region.locator('caption').textContent())!)![1]!;
      const rows = await cellsOf(region.locator('table'));
      const parts = rows.slice(0, -1);
      const foot = rows.at(-1)!;
      const quantity = moved.quantities.find((q) => q.name === name)!;
      const given = contributionsTo(moved, name);
      const scale = scaleFor(
        unitOf(quantity),
        [quantity.change!, ...given.map(({ total }) => total)],
        PLAIN_ROOM,
      );
      expect(unit).toBe(scale.head);
      expect(parts.length).toBeGreaterThan(2);
      for (const column of [2, 3, 4, 5]) {
        const sum = parts.reduce((total, cells) => total + lastDigits(cells[column]!), 0n);
        expect(sum, `column ${column}`).toBe(lastDigits(foot[column]!));
      }
      const decimals = decimalsOf(foot[5]!);
      expect(foot[5]!.replace('+', '')).toBe(formatFixed(quantity.change! / scale.factor, decimals));
      const unitOfLastDigit = 0.1 ** decimals;
      for (const [path, , ...figures] of parts) {
        const { mass, place, shapeAndTurn, total } = given.find((part) => part.path === path)!;
        for (const [k, x] of [mass, place, shapeAndTurn, total].entries()) {
          const shown = readFigure(figures[k]!.replace('+', ''));
          expect(Math.abs(shown - x / scale.factor), `${path} ${k}`).toBeLessThan(unitOfLastDigit);
        }
      }
      expect(await page.getByText(`sums to ${foot[5]} ${unit}`).count()).toBe(1);
    },
  );

  it('draws the sums that its table shows', async () => {
    const page = await openCompared('&quantity=mass');
    const region = page.getByRole('region', { name: /^Who moved the mass as a table/ });
    const rows = await cellsOf(region.locator('table'));
    const bars = await page
      .getByRole('figure', { name: 'Who moved the mass' })
      .locator('svg text')
      .allTextContents();
    expect(bars.length).toBeGreaterThan(2);
    expect(bars).toEqual(rows.slice(0, bars.length).map((cells) => cells[5]));
  });

  it('swaps its sides by a link, and every change turns its sign', async () => {
    const page = await openCompared();
    const before = await cellsOf(table(page, 'Totals'));
    await page.getByRole('link', { name: 'Swap sides' }).click();
    await page.waitForURL((url) => url.searchParams.get('a') === sides.b.row.id);
    const turned = (figure: string) =>
      /^[0.]+$/.test(figure)
        ? figure
        : figure.startsWith('−')
          ? figure.replace('−', '+')
          : figure.replace('+', '−');
    await eventually(async () =>
      (await cellsOf(table(page, 'Totals'))).map(([, a, b, change]) => [a, b, change]),
    ).toEqual(before.map(([, a, b, change]) => [b, a, turned(change!)]));
  });

  it('is reproduced by its address: the same masses, quantity and split', async () => {
    const page = await openCompared();
    await page.getByRole('button', { name: 'masses: predicted' }).click();
    await page.getByRole('option', { name: 'basic' }).click();
    await page.getByRole('button', { name: /^quantity: / }).click();
    await page.getByRole('option', { name: 'Izz about the centre' }).click();
    await page.getByRole('button', { name: 'split by: part and cause' }).click();
    await page.getByRole('option', { name: 'group and cause' }).click();
    await page.waitForURL((url) => url.searchParams.get('by') === 'group');
    await settled(page);
    const shown = async (on: Page) =>
      cellsOf(on.getByRole('region', { name: /^Who moved the Izz.*as a table/ }).locator('table'));
    const rows = await shown(page);
    const other = await browser.open({ as: signInOf('tomas') });
    await visit(other, page.url());
    expect(await shown(other)).toEqual(rows);
    expect(await other.getByRole('button', { name: 'masses: basic' }).count()).toBe(1);
    const basic = difference(sides.a.record, sides.b.record, 'basic');
    const change = basic.quantities.find(({ name }) => name === 'inertia.zz')!.change!;
    expect(Math.sign(readFigure(rows.at(-1)![5]!.replace('+', '')))).toBe(Math.sign(change));
  });

  it('shows which lines of the inputs changed, and the parameter with both values', async () => {
    const page = await openCompared();
    const texts = page.getByRole('region', { name: 'Text of the inputs' });
    expect(await texts.getByText('half_span: { value: 780 mm').count()).toBe(1);
    expect(await texts.getByText('half_span: { value: 900 mm').count()).toBe(1);
    const parameters = await cellsOf(table(page, 'Parameters'));
    expect(parameters.map(([name]) => name)).toEqual(moved.parameters.map(({ name }) => name));
    const span = parameters.find(([name]) => name!.includes('half_span'))!;
    expect(span.map((cell) => cell.split(' ')[0])).toEqual([span[0], '0.78', '0.9', '+0.12']);
  });
});
