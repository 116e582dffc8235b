import { contributionsTo, type Difference, type QuantityChange } from '../../core/difference/index.ts';
import {
  type DisplayUnits,
  decimalsFor,
  formatFixed,
  formatPercent,
  formatShort,
  formatSignificant,
  NO_FIGURE,
  PLAIN_ROOM,
  printAddingColumn,
  scaleFor,
  unitText,
} from '../../core/figures/index.ts';
import type { Column } from './sheet.ts';

/** A table of a difference, for the terminal and for a page alike. */
export interface DifferenceTable {
  readonly title: string;
  readonly qualifier: string;
  readonly columns: readonly Column[];
  readonly rows: readonly (readonly string[])[];
  /** How many rows at the end are sums. */
  readonly totals: number;
  readonly notes: readonly string[];
}

export interface DifferenceOptions {
  /** Whose change is attributed: a quantity's name, or `all` that changed. */
  quantity: string;
  /** How many parts are named for each quantity. */
  parts: number;
}

const right = (head: string): Column => ({ head, align: 'right' });
const left = (head: string): Column => ({ head, align: 'left' });

/** All tables of a difference, those with nothing to say left out. */
export function differenceTables(
  d: Difference,
  units: DisplayUnits,
  options: DifferenceOptions,
): DifferenceTable[] {
  return [
    totalsTable(d, units),
    principalTable(d, units),
    ...attributionTables(d, units, options),
    partsTable(d),
    parametersTable(d),
    limitsTable(d),
    textsTable(d),
    conventionsTable(d),
  ].filter((table) => table.rows.length > 0);
}

const unitOf = (quantity: Pick<QuantityChange, 'unit'>, units: DisplayUnits) =>
  quantity.unit === 'kg'
    ? units.mass
    : quantity.unit === 'm'
      ? units.length
      : quantity.unit === 'rad'
        ? units.angle
        : units.inertia;

/** `inertia.xy` → `Ixy`, `principal.x` → `principal, near x`. */
export function quantityWords(name: string): string {
  const [kind = '', which = ''] = name.split('.');
  if (kind === 'inertia') return `I${which} about the centre`;
  if (kind === 'origin') return `I${which} about the origin`;
  if (kind === 'principal') return `principal, near ${which.replaceAll('+', ' and ')}`;
  if (kind === 'gyration') return `radius of gyration ${which}`;
  return which === '' ? kind : `${kind} ${which}`;
}

const changeOf = (x: number | null, decimals: number): string =>
  x !== null && x > 0 ? `+${formatFixed(x, decimals)}` : formatFixed(x, decimals);

/** Rows of A, B, change. Quantities of one kind share scale and decimals, so that rounding noise prints as zero. */
function changeRows(quantities: readonly QuantityChange[], units: DisplayUnits): string[][] {
  return quantities.map((quantity) => {
    const kind = quantities.filter((q) => kindOf(q) === kindOf(quantity));
    const values = kind.flatMap((q) => [q.a ?? 0, q.b ?? 0]);
    const scale = scaleFor(unitOf(quantity, units), values, PLAIN_ROOM);
    const decimals = decimalsFor(
      values.map((x) => x / scale.factor),
      6,
    );
    const inScale = (x: number | null) => (x === null ? null : x / scale.factor);
    return [
      quantityWords(quantity.name),
      scale.head,
      formatFixed(inScale(quantity.a), decimals),
      formatFixed(inScale(quantity.b), decimals),
      changeOf(inScale(quantity.change), decimals),
      quantity.ofA === null ? '' : `${quantity.ofA > 0 ? '+' : ''}${formatPercent(quantity.ofA)} %`,
    ];
  });
}

const kindOf = ({ name }: QuantityChange): string => name.split('.')[0]!;

function totalsTable(d: Difference, units: DisplayUnits): DifferenceTable {
  const shown = d.quantities.filter((q) => /^(mass|centre|inertia|tilt)/.test(q.name));
  return {
    title: 'Totals',
    qualifier: `${d.on}, each about its own centre`,
    columns: [left(''), left(''), right('A'), right('B'), right('change'), right('of A')],
    rows: changeRows(shown, units),
    totals: 0,
    notes: [],
  };
}

function principalTable(d: Difference, units: DisplayUnits): DifferenceTable {
  const { principal } = d;
  const axes = principal?.axes ?? [];
  const figures = changeRows(
    axes.map(({ quantity, moment: { a, b } }) => ({
      name: quantity,
      unit: 'kg*m^2',
      a,
      b,
      change: b - a,
      ofA: null,
      remainder: null,
    })),
    units,
  );
  const rows = axes.map((axis, i) => {
    const [, head, a, b, change] = figures[i]!;
    const turned =
      axis.turned === null
        ? 'free'
        : `${formatSignificant(axis.turned / units.angle.factor, 3)} ${units.angle.text}`;
    const swapped = axis.swapped ? `rank ${axis.rank.a + 1} → ${axis.rank.b + 1}` : '';
    return [`near ${axis.nearest.b}`, head!, a!, b!, change!, turned, swapped];
  });
  return {
    title: 'Principal moments',
    qualifier: 'axes matched by direction, not by rank',
    columns: [left('axis'), left(''), right('A'), right('B'), right('change'), right('turned'), left('')],
    rows,
    totals: 0,
    notes: principal?.ranksSwapped ? ['two moments passed each other: their axes kept their directions'] : [],
  };
}

/** A contribution under this share of the largest is the rounding of an override's factor, not a part that moved. */
const ROUNDING = 1e-9;

const ATTRIBUTED = /^(mass|centre\.|principal\.)/;

function attributionTables(
  d: Difference,
  units: DisplayUnits,
  options: DifferenceOptions,
): DifferenceTable[] {
  const wanted = d.quantities.filter((q) =>
    options.quantity === 'all' ? ATTRIBUTED.test(q.name) && q.change !== 0 : q.name === options.quantity,
  );
  return wanted.flatMap((quantity) => attributionTable(d, quantity, units, options.parts) ?? []);
}

function attributionTable(
  d: Difference,
  quantity: QuantityChange,
  units: DisplayUnits,
  most: number,
): DifferenceTable | null {
  const told = contributionsTo(d, quantity.name, { onlyChanged: true });
  const largest = Math.max(0, ...told.map((c) => Math.abs(c.total)));
  const all = told.filter((c) => Math.abs(c.total) > ROUNDING * largest);
  if (quantity.change === null || all.length === 0) return null;
  const named = all.slice(0, most);
  const rest = all.slice(most);
  const size = Math.max(...all.map((c) => Math.abs(c.total)), Math.abs(quantity.change));
  const scale = scaleFor(unitOf(quantity, units), [size], PLAIN_ROOM);
  const decimals = decimalsFor([size / scale.factor], 4);
  const column = (pick: (c: (typeof all)[number]) => number) => {
    const values = named.map((c) => pick(c) / scale.factor);
    const others = rest.reduce((sum, c) => sum + pick(c), 0) / scale.factor;
    const items = rest.length > 0 ? [...values, others] : values;
    const total = items.reduce((sum, x) => sum + x, 0);
    return printAddingColumn(items, total, decimals);
  };
  const columns = [
    column((c) => c.mass),
    column((c) => c.place),
    column((c) => c.shapeAndTurn),
    column((c) => c.total),
  ];
  const names = [
    ...named.map((c) => (c.status === 'changed' ? c.path : `${c.path} (${c.status})`)),
    ...(rest.length > 0 ? [`${rest.length} others`] : []),
  ];
  return {
    title: `Who moved it: ${quantityWords(quantity.name)}`,
    qualifier: `${scale.head}; sums to the change`,
    columns: [left(''), right('mass'), right('place'), right('shape, turn'), right('sum')],
    rows: [
      ...names.map((name, i) => [name, ...columns.map((c) => signed(c.figures[i]!))]),
      ['change', ...columns.map((c) => signed(c.total))],
    ],
    totals: 1,
    notes: [...new Set(columns.flatMap((c) => (c.note ? [c.note] : [])))],
  };
}

const signed = (figure: string): string =>
  /^[−0.]*$|^−/.test(figure) || figure === NO_FIGURE ? figure : `+${figure}`;

function partsTable(d: Difference): DifferenceTable {
  const told = d.parts.filter(
    (p) => p.status === 'added' || p.status === 'removed' || p.status === 'renamed',
  );
  const place = (p: (typeof told)[number]) => {
    const side = p.b ?? p.a!;
    return `${side.at.file}:${side.at.line}`;
  };
  return {
    title: 'Parts',
    qualifier: `${d.parts.filter((p) => p.status === 'unchanged').length} did not change`,
    columns: [left(''), left(''), left('in the file')],
    rows: told.map((p) => [p.path, p.was === null ? p.status : `renamed from ${p.was}`, place(p)]),
    totals: 0,
    notes: [],
  };
}

function parametersTable(d: Difference): DifferenceTable {
  const value = (v: { value: number; unit: string } | null) =>
    v === null ? NO_FIGURE : `${formatShort(v.value)}${v.unit === '1' ? '' : ` ${unitText(v.unit)}`}`;
  return {
    title: 'Parameters',
    qualifier: 'SI',
    columns: [left(''), right('A'), right('B')],
    rows: d.parameters.map((p) => [p.name, value(p.a), value(p.b)]),
    totals: 0,
    notes: [],
  };
}

function limitsTable(d: Difference): DifferenceTable {
  const side = (s: Difference['limits'][number]['a']) =>
    s === null
      ? NO_FIGURE
      : s.value === null
        ? 'no value'
        : `${formatSignificant(s.value / s.shown.factor)}${s.shown.unit ? ` ${unitText(s.shown.unit)}` : ''}`;
  const told = d.limits.filter((l) => l.verdict !== 'same' || (l.valueChange ?? 0) !== 0);
  return {
    title: 'Limits',
    qualifier: 'values that moved',
    columns: [left(''), right('A'), right('B'), left('')],
    rows: told.map((l) => [
      l.name,
      side(l.a),
      side(l.b),
      l.verdict === 'same' ? (l.b?.verdict ?? '') : l.verdict,
    ]),
    totals: 0,
    notes: [],
  };
}

function textsTable(d: Difference): DifferenceTable {
  return {
    title: 'Files',
    qualifier: 'inputs by content',
    columns: [left(''), left('')],
    rows: d.inputs.map((i) => [i.path, i.change]),
    totals: 0,
    notes: [],
  };
}

function conventionsTable(d: Difference): DifferenceTable {
  return {
    title: 'Conventions that differ',
    qualifier: '',
    columns: [left(''), left('')],
    rows: d.conventions.map((c) => [
      c.sentence,
      c.bearing === 'figures' ? 'the figures may not mean the same' : 'only how figures are written',
    ]),
    totals: 0,
    notes: [],
  };
}
