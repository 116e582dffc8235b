import { csvCell as cell } from './csv-cell.ts';
import type { BodyRecord, GroupTotals, LimitResult, PartRecord, RollUpRecord, Rows3 } from './record.ts';
import type { PartSelection } from './select-part.ts';

/** The columns, in an order that only ever grows at its end. SI units in the heads; figures to the last bit. */
export const CSV_COLUMNS = [
  'stamp',
  'assembly',
  'state',
  'kind',
  'name',
  'on',
  'units',
  'products',
  'about',
  'axes',
  'mass_kg',
  'centre_x_m',
  'centre_y_m',
  'centre_z_m',
  'inertia_xx_kg_m2',
  'inertia_yy_kg_m2',
  'inertia_zz_kg_m2',
  'inertia_xy_kg_m2',
  'inertia_xz_kg_m2',
  'inertia_yz_kg_m2',
  'share_of_mass',
  'maturity',
  'category',
  'basis',
  'growth',
  'cut',
  'id',
  'quantity',
  'of',
  'unit',
  'value',
  'min',
  'max',
  'margin',
  'margin_of_limit',
  'verdict',
  'waived_until',
  'file',
  'line',
  'commit',
] as const;

type Row = Partial<Record<(typeof CSV_COLUMNS)[number], string | number | boolean | null>>;

/**
 * Rows of kind total, frame, category, basis, part and limit under one set of columns, so that a sheet can filter. The
 * conventions stand in every row (`units`, `products`, `about`, `axes`), where no tool can lose them.
 *
 * @param selections one part or group of each record, in place of all those rows: its own rows, of kind part
 */
export function formatCsv(
  records: readonly RollUpRecord[],
  selections: readonly PartSelection[] | null = null,
): string {
  const rows = records.flatMap((record, i) =>
    selections ? selectionRows(record, selections[i]!) : rowsOf(record),
  );
  const lines = [CSV_COLUMNS.join(','), ...rows.map((row) => CSV_COLUMNS.map((c) => cell(row[c])).join(','))];
  return lines.map((line) => `${line}\n`).join('');
}

const headOf = (record: RollUpRecord): Row => ({
  stamp: record.stamp,
  assembly: record.assembly,
  state: record.state,
  units: 'SI',
  commit: record.provenance.commit ?? '',
});

const selectionRows = (record: RollUpRecord, part: PartSelection): Row[] =>
  (['basic', 'predicted'] as const).flatMap((on) =>
    bothTensors({ ...headOf(record), kind: 'part', name: part.path, on, axes: 'body' }, part[on]),
  );

function rowsOf(record: RollUpRecord): Row[] {
  const head = headOf(record);
  const rows: Row[] = [];
  for (const on of ['basic', 'predicted'] as const) {
    rows.push(...bothTensors({ ...head, kind: 'total', name: '', on, axes: 'body' }, record[on]));
    for (const [name, frame] of Object.entries(record.frames))
      rows.push(...bothTensors({ ...head, kind: 'frame', name, on, axes: `frame ${name}` }, frame[on]));
    for (const [kind, groups] of [
      ['category', record.byCategory],
      ['basis', record.byBasis],
    ] as const)
      for (const group of groups) rows.push(groupRow({ ...head, kind, on }, group, on));
    for (const part of record.parts) rows.push(partRow({ ...head, kind: 'part', on }, part, on));
  }
  for (const limit of record.limits) rows.push(limitRow({ ...head, kind: 'limit' }, limit));
  return rows;
}

function bothTensors(head: Row, body: BodyRecord): Row[] {
  const base = { ...head, ...placeOf(body) };
  if (!body.inertia) return [base];
  return [
    { ...base, about: 'centre', ...tensorOf(body.inertia.aboutCentre) },
    { ...base, about: 'origin', ...tensorOf(body.inertia.aboutOrigin) },
  ];
}

const placeOf = (body: { mass: number; centre: number[] | null }): Row => ({
  mass_kg: body.mass,
  centre_x_m: body.centre?.[0] ?? null,
  centre_y_m: body.centre?.[1] ?? null,
  centre_z_m: body.centre?.[2] ?? null,
});

const tensorOf = ([x, y, z]: Rows3): Row => ({
  products: 'negative',
  inertia_xx_kg_m2: x[0]!,
  inertia_yy_kg_m2: y[1]!,
  inertia_zz_kg_m2: z[2]!,
  inertia_xy_kg_m2: x[1]!,
  inertia_xz_kg_m2: x[2]!,
  inertia_yz_kg_m2: y[2]!,
});

function groupRow(head: Row, group: GroupTotals, on: 'basic' | 'predicted'): Row {
  const { inertia } = group[on];
  const tensor = inertia ? { about: 'centre', axes: 'body', ...tensorOf(inertia.aboutCentre) } : {};
  return {
    ...head,
    name: group.name ?? '',
    ...placeOf(group[on]),
    ...tensor,
    share_of_mass: group.share[on],
  };
}

function partRow(head: Row, part: PartRecord, on: 'basic' | 'predicted'): Row {
  return {
    ...head,
    name: part.path,
    ...placeOf(part[on]),
    about: 'centre',
    axes: 'body',
    ...tensorOf(part[on].inertia),
    share_of_mass: on === 'predicted' ? part.share.mass : null,
    maturity: part.maturity,
    category: part.category,
    basis: part.basis,
    growth: part.growth,
    cut: part.cut,
    file: part.at.file,
    line: part.at.line,
  };
}

const limitRow = (head: Row, limit: LimitResult): Row => ({
  ...head,
  name: limit.name,
  on: limit.on,
  axes: limit.frame === null ? 'body' : `frame ${limit.frame}`,
  id: limit.id,
  quantity: limit.quantity,
  of: limit.of,
  unit: limit.unit,
  value: limit.value,
  min: limit.min,
  max: limit.max,
  margin: limit.margin,
  margin_of_limit: limit.marginOfLimit,
  verdict: limit.verdict,
  waived_until: limit.waiver?.until ?? null,
  file: limit.at.file,
  line: limit.at.line,
});
