import type { Body } from '../inertia/body.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import type { Extent } from '../mesh/extent.ts';
import type { Vector2 } from './section-moments.ts';

/** A closed plane figure by its corners [m], in either turning sense; the last point need not repeat the first. */
export type Outline = readonly Vector2[];

/** Lengths and coordinates in metres, angles in radians, faces as 0-based vertex numbers. */
export type DimensionValue =
  | number
  | Vector2
  | Vector3
  | Outline
  | readonly Outline[]
  | readonly Vector3[]
  | readonly (readonly number[])[];

/** A solid's dimensions by key, twins resolved (`resolveTwins`). */
export type SolidDimensions = Readonly<Record<string, DimensionValue | undefined>>;

export type { Extent };

/**
 * What a key's value is: `length` one number [m], `size2`/`size3` two or three lengths, `angle` one number [rad],
 * `points2` an outline or profile, `outlines` a list of them, `points3` vertices, `faces` lists of vertex numbers.
 */
export type KeyKind = 'length' | 'size2' | 'size3' | 'angle' | 'points2' | 'outlines' | 'points3' | 'faces';

/** Another way to give a key: `radius` for `diameter`, `bore` for `wall`. */
export interface Twin {
  readonly name: string;
  readonly about: string;
  /** The key's value from the twin's [m]; `dims` has the keys that come before it, resolved. */
  resolve(value: number, dims: SolidDimensions): number;
}

/** One key of a solid. */
export interface SolidKey {
  readonly name: string;
  readonly kind: KeyKind;
  /** A few words for help and the published schema. */
  readonly about: string;
  readonly twins?: readonly Twin[];
  /** Used where the key is left out; a key without a default is required. */
  readonly default?: DimensionValue;
  /** Zero is a meaningful limit of this length. */
  readonly mayBeZero?: boolean;
  /** Number of points or faces. */
  readonly count?: { readonly min: number; readonly max?: number };
}

/** Impossible dimensions. `key` is the name to point at, as the user gave it. */
export interface SolidFault {
  readonly code: string;
  readonly message: string;
  readonly hint?: string;
  readonly key: string;
}

/** How a length is written in a message; the reader of a file passes its own unit. */
export type SayLength = (metres: number) => string;

/** `solid`: mass, or volume × density. `thin`: mass, or area × thickness × density. `line`: mass only. */
export type SolidFamily = 'solid' | 'thin' | 'line';

/** A solid as data: schema, reader, help and drawings are made from it. */
export interface SolidKind {
  readonly name: string;
  readonly family: SolidFamily;
  /** One line for help. */
  readonly about: string;
  /** Where the local origin lies, in the words of the file format. */
  readonly origin: string;
  readonly keys: readonly SolidKey[];
  /** A body of revolution about its z axis. */
  readonly round: boolean;
  /** Unit density, local axes, dimensions already checked: no validation here, a sweep calls it at every point. */
  make(dims: SolidDimensions): Body;
  /** Bounding box in local axes [m]. */
  extent(dims: SolidDimensions): Extent;
  /** Smallest size [m], against which a thickness is judged; infinite for a particle. */
  smallest(dims: SolidDimensions): number;
  /** What makes the dimensions impossible, or null. */
  check(dims: SolidDimensions, say?: SayLength): SolidFault | null;
}
