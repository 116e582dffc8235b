import { decimalsFor, formatFixed, formatPercent, PLAIN_ROOM, scaleFor } from '../../core/figures/index.ts';
import type { BodyRecord } from '../../core/record/record.ts';
import { CAUTION } from './identification.ts';
import type { ReportContext } from './report-context.ts';
import type { Cell } from './sheet.ts';

const AXES = ['x', 'y', 'z'] as const;

/** Mass, centre and radii of gyration, basic and predicted, with the caution where they are read. */
export function writeTotals(
  context: ReportContext,
  title = 'Totals',
  both: { basic: BodyRecord; predicted: BodyRecord } & Gyrations = withGyration(context),
): void {
  const { sheet, units, digits, record } = context;
  const { growth } = record.conventions;
  sheet.head(
    title,
    growth ? 'basic · predicted with growth allowance' : 'basic; the file has no growth table',
  );
  const sides = growth ? [both.basic, both.predicted] : [both.basic];
  const rows: Cell[][] = [];
  const add = (name: string, unit: { text: string; factor: number }, groups: (number | null)[][]) => {
    const scale = scaleFor(
      unit,
      groups.flat().map((x) => x ?? 0),
      PLAIN_ROOM,
    );
    const decimals = decimalsFor(
      groups.flat().map((x) => (x ?? 0) / scale.factor),
      digits,
    );
    groups.forEach((values, k) => {
      const label = groups.length === 1 ? name : `${name} ${AXES[k]}`;
      const cells = values.map((x) => ({
        text: formatFixed(x === null ? null : x / scale.factor, decimals),
      }));
      rows.push([
        { text: label },
        { text: scale.head, paint: sheet.ink.soft },
        ...cells,
        { text: changeText(name, values) },
      ]);
    });
  };
  add('mass', units.mass, [sides.map((s) => s.mass)]);
  add(
    'centre',
    units.length,
    AXES.map((_, k) => sides.map((s) => s.centre?.[k] ?? null)),
  );
  if (both.gyration) {
    const [basic, predicted] = both.gyration;
    const radii = growth ? [basic, predicted] : [basic];
    add(
      'radius of gyration',
      units.length,
      AXES.map((_, k) => radii.map((g) => g?.[k] ?? null)),
    );
  }
  const figures = growth ? ['basic', 'predicted'] : ['basic'];
  sheet.table(
    [
      { head: '', align: 'left' },
      { head: '', align: 'left' },
      ...figures.map((head) => ({ head, align: 'right' as const })),
      { head: '', align: 'left' },
    ],
    rows,
  );
  if (sides.some((s) => s.centre === null))
    sheet.say('no mass remains: there is no centre, tensor or axis', { paint: sheet.ink.soft });
  if (title === 'Totals') sheet.say(CAUTION, { paint: sheet.ink.soft });
}

interface Gyrations {
  gyration?: readonly [number[] | null, number[] | null];
}

const withGyration = ({ record: { basic, predicted } }: ReportContext) => ({
  basic,
  predicted,
  gyration: [basic.gyration, predicted.gyration] as const,
});

/** How much of the basic mass the growth allowance adds. */
function changeText(name: string, values: (number | null)[]): string {
  const [basic, predicted] = values;
  if (name !== 'mass' || !basic || predicted === undefined || predicted === null) return '';
  return `growth ${formatPercent(predicted / basic - 1)} % of basic`;
}
