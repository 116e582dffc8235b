import type { RunRow } from '#core/api/runs.ts';
import {
  type DisplayUnits,
  decimalsFor,
  displayUnits,
  formatFixed,
  NO_FIGURE,
  PLAIN_ROOM,
  type Scale,
  scaleFor,
  TENSOR_ROOM,
} from '#core/figures/index.ts';

/** The units in which rows are shown: their files' own, or SI where the files do not agree. */
export function unitsOfRows(rows: readonly Pick<RunRow, 'fileUnits'>[]): {
  units: DisplayUnits;
  mixed: boolean;
} {
  const first = rows[0]?.fileUnits;
  const mixed = rows.some(
    ({ fileUnits: u }) =>
      u.length !== first!.length || u.mass !== first!.mass || u.inertia !== first!.inertia,
  );
  return { units: unitsOfRow(rows[0], mixed ? 'si' : 'file'), mixed };
}

/** The display units of one row; angles in degrees, which a row does not say. */
export function unitsOfRow(row: Pick<RunRow, 'fileUnits'> | undefined, override: string): DisplayUnits {
  const file = row?.fileUnits ?? { length: 'm', mass: 'kg', inertia: 'kg*m^2' };
  return displayUnits(
    { conventions: { fileUnits: { ...file, angle: 'deg', density: 'kg/m^3' } } as never },
    override,
  );
}

/** A column of figures with one scale and one number of decimals. */
export interface FigureColumn {
  readonly scale: Scale;
  readonly text: (value: number | null | undefined) => string;
}

/** The columns of the history; figures in one column share their unit and their decimals. */
export function columnsOf(rows: readonly RunRow[], units: DisplayUnits) {
  const column = (scale: Scale, values: readonly number[]): FigureColumn => {
    const decimals = decimalsFor(values.map((x) => x / scale.factor));
    return {
      scale,
      text: (x) => (x === null || x === undefined ? NO_FIGURE : formatFixed(x / scale.factor, decimals)),
    };
  };
  const masses = rows.map((r) => r.mass);
  const centres = rows.flatMap((r) => r.centre?.[0] ?? []);
  const moments = rows.flatMap((r) => r.moments ?? []);
  return {
    mass: column(scaleFor(units.mass, masses, PLAIN_ROOM), masses),
    centre: column(scaleFor(units.length, centres, PLAIN_ROOM), centres),
    moments: column(scaleFor(units.inertia, moments, TENSOR_ROOM), moments),
  };
}
