import type { Places } from '../document/index.ts';
import type { Expression, SymbolInfo } from '../expressions/index.ts';
import type { SolidKind } from '../solids/dimensions.ts';
import type { FileUnits, Unit } from '../units/index.ts';
import type { Where } from './where.ts';

/** A quantity of the file: its compiled expression (SI), where it stands, and the uncertainty it declares. */
export interface Quantity {
  readonly expression: Expression;
  readonly where: Where;
  /** Standard uncertainty, or half-width of a rectangular distribution; kept here, propagated later. */
  readonly uncertainty: Uncertainty | null;
}

export interface Uncertainty {
  readonly kind: 'u' | 'tol';
  /** Relative to the value, or in its unit. */
  readonly relative: boolean;
  readonly expression: Expression;
}

export type Vector3Quantity = readonly [Quantity, Quantity, Quantity];

/** One assembly file, read and checked: names resolved, dimensions checked, expressions compiled. */
export interface FileModel {
  readonly path: string;
  readonly text: string;
  readonly sha256: string;
  readonly assembly: string;
  readonly places: Places;
  readonly units: FileUnits;
  readonly frame: { origin: string; x: string; y: string; z: string } | null;
  /** In the order of the file; index = slot in the parameter vector. */
  readonly parameters: readonly ParameterModel[];
  readonly slots: ReadonlyMap<string, SymbolInfo>;
  readonly frames: readonly FrameModel[];
  readonly growth: GrowthModel | null;
  readonly states: readonly StateModel[];
  readonly parts: readonly PartModel[];
  readonly limits: readonly LimitModel[];
  readonly sweeps: readonly SweepModel[];
}

export interface ParameterModel {
  readonly name: string;
  readonly value: Quantity;
  readonly min: Quantity | null;
  readonly max: Quantity | null;
}

export interface StateModel {
  readonly name: string;
  /** Slot → the expression that replaces the parameter's. */
  readonly parameters: ReadonlyMap<number, Quantity>;
  readonly omit: readonly string[];
  readonly where: Where | null;
}

export interface FrameModel {
  readonly name: string;
  readonly at: Vector3Quantity;
  readonly rotate: readonly RotateStep[];
  readonly note: string | null;
  readonly where: Where;
}

/** Allowances by maturity; `null` category is the table for parts of any other. Values are plain ratios. */
export interface GrowthModel {
  readonly tables: ReadonlyMap<string | null, ReadonlyMap<string, Quantity>>;
}

export type RotateStep =
  | { readonly kind: 'axis'; readonly axis: 'x' | 'y' | 'z'; readonly angle: Quantity }
  | {
      readonly kind: 'vector';
      readonly axis: Vector3Quantity;
      readonly angle: Quantity;
      readonly where: Where;
    }
  | { readonly kind: 'quaternion'; readonly items: readonly Quantity[]; readonly where: Where }
  | { readonly kind: 'matrix'; readonly rows: readonly Vector3Quantity[]; readonly where: Where };

export type RepeatModel =
  | { readonly kind: 'line'; readonly count: Quantity; readonly step: Vector3Quantity }
  | {
      readonly kind: 'ring';
      readonly count: Quantity;
      readonly axis: 'x' | 'y' | 'z';
      readonly through: Vector3Quantity | null;
      readonly angle: Quantity | null;
    }
  | { readonly kind: 'mirror'; readonly plane: 'xy' | 'xz' | 'yz' };

export interface PlacingModel {
  readonly at: Vector3Quantity | null;
  readonly anchor: 'origin' | 'centroid';
  readonly rotate: readonly RotateStep[];
  readonly image: 'xy' | 'xz' | 'yz' | null;
  readonly repeat: readonly RepeatModel[];
}

/** A dimension of a solid: a quantity, or lists of them. */
export type DimensionModel = Quantity | readonly DimensionModel[];

export type ShapeModel =
  | { readonly kind: 'group' }
  | {
      readonly kind: 'solid';
      readonly solid: SolidKind;
      readonly dimensions: ReadonlyMap<string, DimensionModel>;
      readonly thickness: Quantity | null;
      readonly where: Where;
    }
  | {
      readonly kind: 'mesh';
      readonly file: string;
      readonly unit: Unit;
      readonly fill: 'solid' | 'shell';
      readonly thickness: Quantity | null;
      readonly weld: Quantity | null;
      readonly where: Where;
    }
  | { readonly kind: 'body'; readonly body: BodyModel; readonly where: Where }
  | {
      readonly kind: 'include';
      readonly file: FileModel;
      /** Slot in the included file → expression in this file's parameters. */
      readonly with: ReadonlyMap<number, Quantity>;
      /** One state for all, or by this file's state. */
      readonly state: string | ReadonlyMap<string, string> | null;
      readonly where: Where;
    };

export interface BodyModel {
  readonly mass: Quantity;
  readonly centre: Vector3Quantity | null;
  readonly inertia: {
    /** xx yy zz xy xz yz as written. */
    readonly six: readonly Quantity[];
    /** Rounding of each as written: half a unit of its last digit [kg·m²]. */
    readonly halfUnits: readonly number[];
    /** Elements below the diagonal of a matrix, to be equal to those above: yx, zx, zy. */
    readonly mirrored: readonly Quantity[] | null;
    readonly about: 'centre' | 'origin' | Vector3Quantity;
    readonly products: 'negative' | 'positive' | null;
    readonly where: Where;
  };
}

export interface PartModel {
  readonly name: string;
  readonly where: Where;
  /** 1-based line of the part in its file. */
  readonly line: number;
  readonly shape: ShapeModel;
  readonly mass: Quantity | null;
  /** From `density` or `material`. */
  readonly density: Quantity | null;
  readonly cut: boolean;
  readonly maturity: string | null;
  readonly category: string | null;
  readonly basis: string | null;
  readonly states: readonly string[] | null;
  readonly placing: PlacingModel;
  readonly override: {
    readonly mass: Quantity;
    readonly reason: string;
    readonly where: Where;
    readonly line: number;
  } | null;
  readonly parts: readonly PartModel[];
  readonly note: string | null;
  readonly source: string | null;
}

export interface LimitModel {
  readonly name: string;
  readonly id: string | null;
  readonly text: string;
  readonly quantity: Quantity;
  readonly min: Quantity | null;
  readonly max: Quantity | null;
  readonly shown: { unit: string; factor: number; si: string };
  readonly of: string | null;
  readonly frame: string | null;
  readonly on: 'basic' | 'predicted' | null;
  readonly states: readonly string[] | null;
  readonly waiver: { until: string; reason: string; by: string } | null;
  readonly source: string | null;
  readonly owner: string | null;
  readonly note: string | null;
  readonly where: Where;
  readonly line: number;
}

/** A trade study, read and checked; run later. */
export interface SweepModel {
  readonly name: string;
  readonly vary: readonly {
    readonly slot: number;
    readonly range:
      | { readonly kind: 'list'; readonly values: readonly Quantity[] }
      | { readonly kind: 'step'; readonly from: Quantity; readonly to: Quantity; readonly step: Quantity }
      | { readonly kind: 'count'; readonly from: Quantity; readonly to: Quantity; readonly count: Quantity };
  }[];
  readonly states: readonly string[] | null;
  readonly keep: readonly string[];
}
