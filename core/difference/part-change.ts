import type { PartBody, PartRecord } from '../record/record.ts';
import type { PartPair } from './match-parts.ts';
import type { PartChange, PartSide, PartStatus } from './types.ts';

/** Figures nearer than this share of their own size are the same but for rounding. For labels alone. */
const SAME = 64 * Number.EPSILON;

/** What became of a part; contributions are filled in by the caller. */
export function partChange({ a, b }: PartPair, on: 'basic' | 'predicted'): PartChange {
  const differs = a && b ? differences(a[on], b[on]) : { mass: false, place: false, shapeAndTurn: false };
  return {
    path: (b ?? a)!.path,
    was: a && b && a.path !== b.path ? a.path : null,
    status: statusOf(a, b, differs, on),
    differs,
    a: a && sideOf(a, on),
    b: b && sideOf(b, on),
    contributions: {},
  };
}

function statusOf(
  a: PartRecord | null,
  b: PartRecord | null,
  differs: PartChange['differs'],
  on: 'basic' | 'predicted',
): PartStatus {
  if (!a) return 'added';
  if (!b) return 'removed';
  if (a.path !== b.path) return 'renamed';
  if (differs.mass || differs.shapeAndTurn) return 'changed';
  if (differs.place) return 'moved';
  return sameBits(a[on], b[on]) ? 'unchanged' : 'changed';
}

const sameBits = (a: PartBody, b: PartBody): boolean =>
  a.mass === b.mass &&
  a.centre.every((x, k) => x === b.centre[k]) &&
  a.inertia.flat().every((x, k) => x === b.inertia.flat()[k]);

function differences(a: PartBody, b: PartBody): PartChange['differs'] {
  const shape = (part: PartBody) => part.inertia.flat().map((x) => (part.mass === 0 ? x : x / part.mass));
  return {
    mass: apart([a.mass], [b.mass]),
    place: apart(a.centre, b.centre),
    shapeAndTurn: apart(shape(a), shape(b)),
  };
}

function apart(a: readonly number[], b: readonly number[]): boolean {
  const size = Math.max(...a.map(Math.abs), ...b.map(Math.abs));
  return a.some((x, k) => Math.abs(x - b[k]!) > SAME * size);
}

const sideOf = (part: PartRecord, on: 'basic' | 'predicted'): PartSide => ({
  at: part.at,
  kind: part.kind,
  cut: part.cut,
  maturity: part.maturity,
  category: part.category,
  basis: part.basis,
  growth: part.growth,
  mass: part[on].mass,
  centre: [...part[on].centre],
});
