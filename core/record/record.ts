/**
 * The record of one roll-up of one assembly in one state, exactly as `steelyard run --format json` prints it.
 *
 * SI units (kg, m, kg·m², rad). Tensors are rows of nine with the tensor's own elements as products
 * (I_xy = −∫ x y dm). Principal moments ascend; axes are rows, unit, right-handed, in body axes. Every −0 is 0.
 * Where no mass remains there is no centre, tensor about it, gyration or axis: null, not zero.
 */
export interface RollUpRecord {
  schema: 'steelyard-record/1';
  /** Hash of the canonical inputs, state, parameter values and core version; not of provenance. */
  stamp: string;
  assembly: string;
  state: string;
  conventions: Conventions;
  basic: Totals;
  predicted: Totals;
  frames: Record<string, FrameTotals>;
  byCategory: GroupTotals[];
  byBasis: GroupTotals[];
  /** Propagated later; null until then. */
  uncertainty: null;
  limits: LimitResult[];
  /** The leaves of the tree in file order: every solid, body and cut-out by its path. */
  parts: PartRecord[];
  overrides: OverrideRecord[];
  warnings: WarningRecord[];
  parameters: Record<string, ParameterRecord>;
  inputs: InputRecord[];
  provenance: Provenance;
}

export interface Conventions {
  /** In the words of the file; null where the file names none. */
  frame: { origin: string; x: string; y: string; z: string } | null;
  products: 'negative';
  units: 'SI';
  coreVersion: string;
  /** The units in which the file writes bare numbers, for faces that show figures in them. */
  fileUnits: { length: string; mass: string; angle: string; density: string; inertia: string };
  /** Whether the file has a growth table: limits are then judged on predicted unless they say otherwise. */
  growth: boolean;
}

export type Rows3 = [number[], number[], number[]];

export interface InertiaRecord {
  /** About the centre of mass [kg·m²]. */
  aboutCentre: Rows3;
  /** About the origin of the axes in which it is written [kg·m²]. */
  aboutOrigin: Rows3;
}

export interface Totals {
  mass: number;
  centre: number[] | null;
  inertia: InertiaRecord | null;
  principal: PrincipalRecord | null;
  /** Radii of gyration about the body axes through the centre [m]. */
  gyration: number[] | null;
}

export interface PrincipalRecord {
  /** Ascending [kg·m²]. */
  moments: number[];
  /** Row i is the axis of moment i, in body axes. */
  axes: Rows3;
  /** The body axis that names axis i. */
  nearest: ('x' | 'y' | 'z')[];
  /** Indices of axes free to turn, because their moments are one. */
  free: number[];
  /** Angle between body axis x, y, z and the principal axis it names [rad]. */
  tilt: number[];
  /** Rotation that turns body axes into principal axes, [w, x, y, z], w not negative. */
  quaternion: number[];
}

export interface FrameTotals {
  note: string | null;
  /** Frame origin in body axes [m]. */
  at: number[];
  /** Row i is the frame's axis i in body axes. */
  axes: Rows3;
  basic: BodyRecord;
  predicted: BodyRecord;
}

/** Mass, centre and tensors in the axes of the context. */
export interface BodyRecord {
  mass: number;
  centre: number[] | null;
  inertia: InertiaRecord | null;
}

export interface GroupTotals {
  /** The category or basis; null for parts that state none. */
  name: string | null;
  basic: BodyRecord;
  predicted: BodyRecord;
  /** Share of the total mass, basic and predicted. */
  share: { basic: number; predicted: number };
}

export interface LimitResult {
  name: string;
  id: string | null;
  quantity: string;
  of: string | null;
  frame: string | null;
  on: 'basic' | 'predicted';
  /** SI unit of value, min, max and margin, such as `kg`, `m`, `kg*m^2`, `rad`, `1`. */
  unit: string;
  /** The unit in which the file writes this quantity, and how many SI units one of it is. */
  shown: { unit: string; factor: number };
  /** The judged value; null where it does not exist (no mass, say), which counts as outside. */
  value: number | null;
  /** The same quantity on both, so that the growth allowance is seen. */
  values: { basic: number | null; predicted: number | null };
  min: number | null;
  max: number | null;
  /** Which stop the margin is measured to. */
  nearest: 'min' | 'max';
  /** Distance to the nearest stop, negative outside; null where there is no value. */
  margin: number | null;
  /** margin / |limit|; null where the limit is zero or there is no value. */
  marginOfLimit: number | null;
  verdict: 'within' | 'outside';
  waiver: { until: string; reason: string; by: string } | null;
  source: string | null;
  owner: string | null;
  note: string | null;
  at: { file: string; line: number };
  /** The parts that weigh most in the value, largest first, by path; for the message of a broken limit. */
  heaviest: { path: string; at: { file: string; line: number }; value: number }[];
}

export interface PartRecord {
  /** Identity in differences: `boom/access hole`, copies `servo[1]`, `servo[2]`. */
  path: string;
  at: { file: string; line: number };
  /** `box`, `mesh`, `body`, `particle` … */
  kind: string;
  /** A cut-out: its mass, moments and shares are negative. */
  cut: boolean;
  /** The part has children; these figures are of its own solid alone. */
  own: boolean;
  maturity: string | null;
  category: string | null;
  basis: string | null;
  /** Growth allowance applied to this part, predicted/basic − 1. */
  growth: number;
  basic: PartBody;
  predicted: PartBody;
  /** Of the predicted total: of mass, and of each central moment (the part about the assembly's centre). */
  share: { mass: number; xx: number; yy: number; zz: number };
  note: string | null;
  source: string | null;
  /** What was found in a mesh file; absent for other parts. */
  mesh?: MeshRecord;
}

/** A mesh as it was read: nothing is mended or hulled in silence. */
export interface MeshRecord {
  format: string;
  triangles: number;
  vertices: number;
  /** Triangles left out because two of their corners are one point. */
  collapsed: number;
  /** Closed surfaces, those that bound a void included. */
  shells: number;
  voids: number;
  /** Edges without a neighbour; more than none only in a thin mesh. */
  openEdges: number;
  /** [m³], 0 for a thin mesh. */
  volume: number;
  /** [m²] */
  area: number;
  /** Size of its bounding box along its own axes [m]: the check of its unit. */
  size: number[];
}

/** A part's own ten numbers in the assembly's body axes; inertia about the part's own centre, products negative. */
export interface PartBody {
  mass: number;
  centre: number[];
  inertia: Rows3;
}

export interface OverrideRecord {
  path: string;
  reason: string;
  at: { file: string; line: number };
  /** Net mass before and after [kg], basic. */
  from: number;
  to: number;
}

export interface WarningRecord {
  code: string;
  message: string;
  at: { file: string; line: number } | null;
}

export interface ParameterRecord {
  /** SI. */
  value: number;
  unit: string;
}

export interface InputRecord {
  path: string;
  sha256: string;
  /** Raw text with LF; absent for meshes. */
  text?: string;
  /** Size of a mesh file. */
  bytes?: number;
}

export interface Provenance {
  tool: string;
  node?: string;
  commit?: string;
  branch?: string;
  tag?: string;
  remote?: string;
  author?: string;
  dirty?: boolean;
  ci?: { name: string; run?: string; url?: string; request?: string };
  at: string;
}
