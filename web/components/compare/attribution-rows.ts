import {
  type Contribution,
  contributionsTo,
  type Difference,
  groupedContributionsTo,
  type QuantityChange,
  type Split,
} from '#core/difference/index.ts';
import {
  type DisplayUnits,
  decimalsFor,
  PLAIN_ROOM,
  printAddingColumn,
  readFigure,
  scaleFor,
} from '#core/figures/index.ts';
import { signed, unitOfQuantity } from './change-rows.ts';
import type { CompareView } from './compare-view.ts';

/** A contribution under this share of the largest is the rounding of an override's factor, not a part that moved. */
const ROUNDING = 1e-9;

export const CAUSES = ['mass', 'place', 'shapeAndTurn'] as const satisfies readonly (keyof Split)[];

export interface AttributionRow {
  readonly path: string;
  readonly contribution: Contribution;
  /** As printed: the three causes and their sum. */
  readonly figures: Record<keyof Split | 'total', string>;
}

export interface Attribution {
  readonly unit: string;
  readonly rows: AttributionRow[];
  readonly totals: Record<keyof Split | 'total', string>;
  /** How many parts or groups did not change, or only by rounding. */
  readonly still: number;
  readonly notes: string[];
}

/** Who moved one quantity, largest first; every printed column adds up to its total, the last one to the change. */
export function attributionOf(
  difference: Difference,
  quantity: QuantityChange,
  units: DisplayUnits,
  { by, show }: Pick<CompareView, 'by' | 'show'>,
): Attribution {
  const list = by === 'group' ? groupedContributionsTo : contributionsTo;
  const all = list(difference, quantity.name);
  const largest = Math.max(0, ...all.map((c) => Math.abs(c.total)));
  const moved = all.filter((c) => CAUSES.some((cause) => Math.abs(c[cause]) > ROUNDING * largest));
  const shown = show === 'all' ? all : moved;
  const size = Math.max(largest, Math.abs(quantity.change ?? 0));
  const scale = scaleFor(unitOfQuantity(quantity, units), [size], PLAIN_ROOM);
  const decimals = decimalsFor([size / scale.factor], 4);
  const column = (key: keyof Split | 'total') => {
    const values = shown.map((c) => c[key] / scale.factor);
    return printAddingColumn(
      values,
      values.reduce((sum, x) => sum + x, 0),
      decimals,
    );
  };
  const columns = {
    mass: column('mass'),
    place: column('place'),
    shapeAndTurn: column('shapeAndTurn'),
    total: column('total'),
  };
  const at = (i: number) => ({
    mass: signed(columns.mass.figures[i]!),
    place: signed(columns.place.figures[i]!),
    shapeAndTurn: signed(columns.shapeAndTurn.figures[i]!),
    total: signed(columns.total.figures[i]!),
  });
  const rows = shown.map((contribution, i) => ({ path: contribution.path, contribution, figures: at(i) }));
  const totals = {
    mass: signed(columns.mass.total),
    place: signed(columns.place.total),
    shapeAndTurn: signed(columns.shapeAndTurn.total),
    total: signed(columns.total.total),
  };
  const notes = new Set(Object.values(columns).flatMap((c) => c.note ?? []));
  if ([...rows.map((r) => r.figures), totals].some((f) => !adds(f, decimals)))
    notes.add('figures are rounded so that every column adds up; a row may differ in its last digit');
  return { unit: scale.head, rows, totals, still: all.length - moved.length, notes: [...notes] };
}

function adds(figures: Record<keyof Split | 'total', string>, decimals: number): boolean {
  const read = (text: string) => readFigure(text.replace('+', ''));
  const sum = CAUSES.reduce((total, cause) => total + read(figures[cause]), 0);
  return Math.abs(sum - read(figures.total)) < 0.5 * 0.1 ** decimals;
}
