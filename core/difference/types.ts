import type { LimitResult } from '../record/record.ts';

/**
 * What moved between two records, as plain data (survives JSON). SI units: kg, m, kg·m², rad. Tensors are about each
 * record's own centre in body axes unless a name says `origin`; products negative (I_xy = −∫ x y dm). A is the earlier
 * side, B the later one; every change is B − A.
 */
export interface Difference {
  schema: 'steelyard-difference/1';
  on: 'basic' | 'predicted';
  a: SideLabel;
  b: SideLabel;
  /** Mass, centre, six about the centre, six about the origin, gyration, tilts, then the principal moments. */
  quantities: QuantityChange[];
  /** The matched principal axes; null where one side has none. */
  principal: PrincipalChange | null;
  /** In the order of A, then what B added in its order. */
  parts: PartChange[];
  parameters: ValueChange[];
  limits: LimitChange[];
  inputs: InputChange[];
  /** What the two sides do not say alike: states, frames, units, versions. */
  conventions: ConventionChange[];
}

export interface SideLabel {
  assembly: string;
  state: string;
  stamp: string;
  coreVersion: string;
  commit: string | null;
  branch: string | null;
  at: string;
}

export interface QuantityChange {
  /** `mass`, `centre.x`, `inertia.xy`, `origin.zz`, `gyration.x`, `tilt.z`, `principal.x`, `principal.x+y`. */
  name: string;
  unit: 'kg' | 'm' | 'kg*m^2' | 'rad';
  /** Null where that side has no such value (no mass). */
  a: number | null;
  b: number | null;
  change: number | null;
  /** change / |a|; null for places, products and angles, and where a is zero or missing. */
  ofA: number | null;
  /** change − Σ contributions; null where the change is not attributed to parts. */
  remainder: number | null;
}

export interface PrincipalChange {
  axes: AxisChange[];
  /** True where an axis changed its place in the ascending order: a swap, not a jump. */
  ranksSwapped: boolean;
}

export interface AxisChange {
  /** Its quantity in `quantities` and in the contributions of parts. */
  quantity: string;
  /** Place in the ascending order, 0 … 2. */
  rank: { a: number; b: number };
  /** The body axis that names it. */
  nearest: { a: string; b: string };
  moment: { a: number; b: number };
  /** Unit, in body axes, signs aligned; the true eigenvectors. */
  axis: { a: number[]; b: number[] };
  /** Angle between the two [rad], 0 … π/2; null where the axis is free to turn on either side. */
  turned: number | null;
  free: boolean;
  swapped: boolean;
}

/** One part's contribution to one change, by cause; the three sum to it. */
export interface Split {
  mass: number;
  place: number;
  shapeAndTurn: number;
}

export type PartStatus = 'unchanged' | 'renamed' | 'moved' | 'changed' | 'added' | 'removed';

export interface PartChange {
  /** In B, or in A where it was removed. */
  path: string;
  /** In A, where a part was renamed. */
  was: string | null;
  status: PartStatus;
  /** What differs of the body, beyond rounding; all false for parts on one side only. */
  differs: { mass: boolean; place: boolean; shapeAndTurn: boolean };
  a: PartSide | null;
  b: PartSide | null;
  /** Contributions by quantity; empty where nothing changed. Quantities without a value on one side are absent. */
  contributions: Record<string, Split>;
}

export interface PartSide {
  at: { file: string; line: number };
  kind: string;
  cut: boolean;
  maturity: string | null;
  category: string | null;
  basis: string | null;
  growth: number;
  mass: number;
  centre: number[];
}

export interface ValueChange {
  name: string;
  a: { value: number; unit: string } | null;
  b: { value: number; unit: string } | null;
  change: number | null;
}

export interface LimitChange {
  name: string;
  id: string | null;
  quantity: string;
  a: LimitSide | null;
  b: LimitSide | null;
  valueChange: number | null;
  marginChange: number | null;
  verdict: 'same' | 'now outside' | 'now within' | 'added' | 'removed';
}

export type LimitSide = Pick<
  LimitResult,
  'on' | 'unit' | 'shown' | 'value' | 'min' | 'max' | 'margin' | 'verdict' | 'at'
>;

export interface InputChange {
  path: string;
  change: 'changed' | 'added' | 'removed';
  a: string | null;
  b: string | null;
}

export interface ConventionChange {
  what: string;
  a: string | null;
  b: string | null;
  /** `figures`: the numbers may not mean the same; `display`: only how they are written differs. */
  bearing: 'figures' | 'display';
  sentence: string;
}
