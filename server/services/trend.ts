import { QueryTypes, type Sequelize } from 'sequelize';
import type * as z from 'zod';
import { TREND_QUANTITIES, type Trend, type TrendQuantity, type trendQuerySchema } from '#core/api/runs.ts';
import { displayUnits } from '#core/figures/index.ts';
import { StoredRecord } from '../models/index.ts';
import { conditionsOf } from './history.ts';
import { type RecordContent, unpackContent } from './record-content.ts';

type Query = z.output<typeof trendQuerySchema>;
type Point = Trend['points'][number];

/** Runs that a trend is taken from, the latest; and points that it has. */
const RUNS_AT_MOST = 20_000;
const POINTS_AT_MOST = 2000;

interface Row {
  id: string;
  record_id: string;
  at: Date;
  figures: number[];
  nearest: string[] | null;
  verdict: Point['verdict'];
  release: string | null;
  commit: string | null;
}

/** One quantity of one assembly in one state over time; of the latest run's where the filter names none. */
export async function findTrend(
  sequelize: Sequelize,
  projectId: number,
  query: Query,
): Promise<Trend | null> {
  const { where, bind } = conditionsOf(query, projectId);
  const select = <T extends object>(sql: string, values: unknown[]) =>
    sequelize.query<T>(sql, { bind: values, type: QueryTypes.SELECT });
  const [found] = await select<{ assembly: string; state: string; judged_on: string }>(
    `SELECT assembly, state, judged_on FROM runs WHERE ${where.join(' AND ')} ORDER BY at DESC, id DESC LIMIT 1`,
    bind,
  );
  if (!found) return null;
  const { judged_on, ...latest } = found;
  const one = conditionsOf({ ...query, ...latest }, projectId);
  // Basic and predicted figures do not make one line.
  one.bind.push(judged_on);
  one.where.push(`judged_on = $${one.bind.length}`);
  const rows = await select<Row>(
    `SELECT id, record_id, at, figures, nearest, verdict, release, commit FROM runs
     WHERE ${one.where.join(' AND ')} ORDER BY at DESC, id DESC LIMIT ${RUNS_AT_MOST}`,
    one.bind,
  );
  const record = await StoredRecord.findByPk(rows[0]!.record_id);
  const content = unpackContent(record!.content);
  const points = rows.reverse().flatMap((row) => pointOf(row, query.quantity));
  return {
    ...latest,
    quantity: query.quantity,
    ...unitsOf(query.quantity, content),
    limits: limitsOn(query.quantity, content),
    points: thin(points),
    of: points.length,
  };
}

function pointOf(row: Row, quantity: TrendQuantity): Point[] {
  const value = valueIn(row, quantity);
  if (value === null) return [];
  return [
    {
      run: String(row.id),
      at: row.at.toISOString(),
      value,
      verdict: row.verdict,
      released: row.release === 'released',
      label: row.commit?.slice(0, 7) ?? row.at.toISOString().slice(0, 10),
    },
  ];
}

/** From the columns of a run, in the order of `figures`; a principal moment by the body axis that names it. */
function valueIn({ figures, nearest }: Row, quantity: TrendQuantity): number | null {
  const place = TREND_QUANTITIES.indexOf(quantity);
  if (place < 7) return figures[place] ?? null;
  const rank = nearest?.indexOf(quantity.slice(-1)) ?? -1;
  return rank < 0 ? null : (figures[7 + rank] ?? null);
}

function unitsOf(quantity: TrendQuantity, content: RecordContent): Pick<Trend, 'unit' | 'shown' | 'on'> {
  const units = displayUnits(content);
  const kind = quantity === 'mass' ? 'mass' : quantity.startsWith('centre') ? 'length' : 'inertia';
  const { text, factor } = units[kind];
  return {
    unit: { mass: 'kg', length: 'm', inertia: 'kg*m^2' }[kind],
    shown: { unit: text, factor },
    on: content.conventions.growth ? 'predicted' : 'basic',
  };
}

/** Limits on exactly this quantity of the whole, in body axes, on the masses that the trend shows. */
function limitsOn(quantity: TrendQuantity, content: RecordContent): Trend['limits'] {
  const on = content.conventions.growth ? 'predicted' : 'basic';
  return content.limits
    .filter((l) => l.of === null && l.frame === null && l.on === on)
    .filter((l) => l.quantity.replace(/^(basic|predicted)\./, '').trim() === quantity)
    .map(({ name, min, max }) => ({ name, min, max }));
}

/**
 * At most 2,000 points: of each stretch of time the lowest, the highest, and whatever is released or outside while
 * there is room, so that no extreme is lost.
 */
export function thin(points: readonly Point[], most = POINTS_AT_MOST): Point[] {
  if (points.length <= most) return [...points];
  const kept = new Set<number>([0, points.length - 1]);
  points.forEach((p, i) => {
    if (p.released && kept.size < most / 4) kept.add(i);
  });
  const stretches = Math.floor((most - kept.size) / 2);
  for (let s = 0; s < stretches; s++) {
    const from = Math.floor((s * points.length) / stretches);
    const to = Math.floor(((s + 1) * points.length) / stretches);
    let low = from;
    let high = from;
    for (let i = from; i < to; i++) {
      if (points[i]!.value < points[low]!.value) low = i;
      if (points[i]!.value > points[high]!.value) high = i;
    }
    kept.add(low).add(high);
  }
  return [...kept].sort((a, b) => a - b).map((i) => points[i]!);
}
