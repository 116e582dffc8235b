import type { Totals } from '../record/record.ts';
import type { QuantityChange } from './types.ts';

const XYZ = ['x', 'y', 'z'] as const;
const SIX = ['xx', 'yy', 'zz', 'xy', 'xz', 'yz'] as const;
const PLACES = [
  [0, 0],
  [1, 1],
  [2, 2],
  [0, 1],
  [0, 2],
  [1, 2],
] as const;

export const CENTRE_NAMES = XYZ.map((k) => `centre.${k}`);
export const INERTIA_NAMES = SIX.map((k) => `inertia.${k}`);

/** One change; `ofA` only where a share of A means something. */
export function quantityChange(
  name: string,
  unit: QuantityChange['unit'],
  a: number | null,
  b: number | null,
  shared: boolean,
): QuantityChange {
  const change = a === null || b === null ? null : b - a + 0;
  const ofA = shared && change !== null && a !== null && a !== 0 ? change / Math.abs(a) : null;
  return { name, unit, a, b, change, ofA, remainder: null };
}

/** Totals A, B and their change, but for the principal moments, which need their axes matched. */
export function quantityChanges(a: Totals, b: Totals): QuantityChange[] {
  const of = (totals: Totals): [string, QuantityChange['unit'], number | null, boolean][] =>
    [
      ['mass', 'kg', totals.mass, true],
      ...CENTRE_NAMES.map((name, k) => [name, 'm', totals.centre?.[k] ?? null, false] as const),
      ...(['aboutCentre', 'aboutOrigin'] as const).flatMap((about) =>
        PLACES.map(([i, j], k) => {
          const name = about === 'aboutCentre' ? INERTIA_NAMES[k]! : `origin.${SIX[k]!}`;
          return [name, 'kg*m^2', totals.inertia?.[about][i]?.[j] ?? null, i === j] as const;
        }),
      ),
      ...XYZ.map((name, k) => [`gyration.${name}`, 'm', totals.gyration?.[k] ?? null, true] as const),
      ...XYZ.map((name, k) => [`tilt.${name}`, 'rad', totals.principal?.tilt[k] ?? null, false] as const),
    ] as [string, QuantityChange['unit'], number | null, boolean][];
  const after = of(b);
  return of(a).map(([name, unit, value, shared], i) =>
    quantityChange(name, unit, value, after[i]![2], shared),
  );
}
