import type { Body } from '../inertia/body.ts';
import { scaleBody } from '../inertia/body.ts';
import type { MeshReport } from '../mesh/mesh-body.ts';
import { densityFault } from '../model/density-fault.ts';
import type { DimensionModel, PartModel, Quantity, ShapeModel } from '../model/model.ts';
import { within } from '../model/where.ts';
import type { DimensionValue, Extent, SolidDimensions } from '../solids/dimensions.ts';
import { resolveTwins } from '../solids/twins.ts';
import { formatQuantity, LENGTH, unitFor } from '../units/index.ts';
import { readMeshPart } from './read-mesh-part.ts';
import { refuseTooLong } from './refuse-too-large.ts';
import { evaluate, faultAt, type Scope } from './scope.ts';
import { vendorBody } from './vendor-body.ts';

/** What a part is by itself, without children: its body in local axes. */
export interface OwnBody {
  readonly body: Body;
  /** Mass over volume [kg/m³], which a cut in it takes; null where there is no volume. */
  readonly density: number | null;
  /** Bounding box in local axes [m], where known. */
  readonly extent: Extent | null;
  /** Dimensions with twins resolved, for drawings. */
  readonly dimensions: SolidDimensions | null;
  /** How far rounding in the digits given lets Q be from a body's [kg·m²]; absent where it needs none. */
  readonly slack?: number;
  /** What was found in reading a mesh. */
  readonly mesh?: MeshReport;
}

/** A thin solid thicker than this share of its smallest size is not thin. */
const THIN_AT_MOST = 0.05;

/**
 * The part's own body in its local axes, mass as the file says, growth not applied.
 *
 * @param hostDensity what a cut without its own material takes from its host [kg/m³]
 * @returns null for a group or an include
 */
export function ownBody(part: PartModel, hostDensity: number | null, scope: Scope): OwnBody | null {
  const { shape } = part;
  if (shape.kind === 'solid') return solidBody(part, shape, hostDensity, scope);
  if (shape.kind === 'mesh') return meshBody(part, shape, hostDensity, scope);
  if (shape.kind === 'body')
    return { ...vendorBody(shape.body, part, scope), density: null, extent: null, dimensions: null };
  return null;
}

function solidBody(
  part: PartModel,
  shape: ShapeModel & { kind: 'solid' },
  hostDensity: number | null,
  scope: Scope,
): OwnBody | null {
  const { solid } = shape;
  const given: Record<string, DimensionValue | undefined> = {};
  for (const [key, model] of shape.dimensions) given[key] = dimensionValue(model, scope);
  const dimensions = resolveTwins(solid, given);
  refuseTooLong(numbersIn(Object.values(dimensions)), part.name, shape.where, scope);
  const length = unitFor(LENGTH, scope.file.units);
  const fault = solid.check(dimensions, (metres) => formatQuantity(metres, length));
  if (fault) {
    const { key, ...rest } = fault;
    faultAt(scope, shape.dimensions.has(key) ? within(shape.where, key) : shape.where, rest);
    return null;
  }
  const unit = solid.make(dimensions);
  const extent = solid.extent(dimensions);
  const thickness = shape.thickness && evaluate(shape.thickness, scope);
  if (thickness !== null) checkThickness(part, shape, thickness, solid.smallest(dimensions), scope);
  const made = withMass(part, unit, thickness, solid.family, hostDensity, scope);
  return made && { ...made, extent, dimensions };
}

function meshBody(
  part: PartModel,
  shape: ShapeModel & { kind: 'mesh' },
  hostDensity: number | null,
  scope: Scope,
): OwnBody | null {
  const reading = readMeshPart(shape, scope);
  if (!reading) return null;
  for (const note of reading.notes)
    scope.run.warnings.push({
      code: note.code,
      message: `${scope.prefix}${part.name}: ${note.message}`,
      at: { file: scope.file.path, line: part.line },
    });
  const thickness = shape.thickness && evaluate(shape.thickness, scope);
  if (thickness !== null) {
    const size = [0, 1, 2].map((k) => reading.report.extent.max[k]! - reading.report.extent.min[k]!);
    checkThickness(part, shape, thickness, Math.max(...size), scope);
  }
  const family = shape.fill === 'shell' ? 'thin' : 'solid';
  const made = withMass(part, reading.body, thickness, family, hostDensity, scope);
  return made && { ...made, extent: reading.report.extent, dimensions: null, mesh: reading.report };
}

/** Scales a body of unit density (or unit mass per area) to the part's mass. */
function withMass(
  part: PartModel,
  unit: Body,
  thickness: number | null,
  family: 'solid' | 'thin' | 'line',
  hostDensity: number | null,
  scope: Scope,
): { body: Body; density: number | null } | null {
  const volume =
    family === 'solid' ? unit.mass : family === 'thin' && thickness !== null ? unit.mass * thickness : null;
  if (part.mass) {
    const mass = massOf(part.mass, part, scope);
    if (volume !== null && mass > 0) warnIfDoubtful(part, mass / volume, scope);
    // A particle's or a line's own measure may be 1 or a length; anything but zero scales.
    return { body: scaleBody(unit, mass / unit.mass), density: volume === null ? null : mass / volume };
  }
  const density = part.density ? evaluate(part.density, scope) : hostDensity;
  if (density === null || volume === null) {
    faultAt(scope, part.where, {
      code: 'MODEL_MASS_MISSING',
      message: `expected a density for '${part.name}', found none here nor on a host that it could take it from`,
      hint: 'add `material`, `density` or `mass`; a cut takes its material from the solid whose `parts:` it stands in',
    });
    return null;
  }
  const fault = densityFault(density);
  if (fault) {
    faultAt(scope, part.density?.where ?? part.where, fault);
    return null;
  }
  return { body: scaleBody(unit, (density * volume) / unit.mass), density };
}

/** Lighter than air [kg/m³]: the size is then too large for the mass by powers of ten. */
const DENSITY_AT_LEAST = 1;

/** A stated mass in a stated shape implies a density; one that nothing has is a slip of units in either. */
function warnIfDoubtful(part: PartModel, density: number, scope: Scope): void {
  const heavy = densityFault(density) !== null;
  if (!heavy && density >= DENSITY_AT_LEAST) return;
  scope.run.warnings.push({
    code: 'SOLID_DENSITY_DOUBTFUL',
    message: `${scope.prefix}${part.name}: this mass in this shape is ${Number((density / 1000).toPrecision(3))} g/cm^3, ${heavy ? 'denser than any material' : 'lighter than air'}; look for a slip of units`,
    at: { file: scope.file.path, line: part.line },
  });
}

/** A mass that is stated: not negative; zero only with a warning. */
export function massOf(quantity: Quantity, part: PartModel, scope: Scope): number {
  const mass = evaluate(quantity, scope);
  if (mass < 0) {
    faultAt(scope, quantity.where, {
      code: 'MODEL_MASS_NEGATIVE',
      message: `expected a mass of zero or more, found ${formatQuantity(mass, unitFor(quantity.expression.dimension, scope.file.units))}`,
      hint: 'to take material away, write the piece with `cut: true` and a positive mass',
    });
    return 0;
  }
  if (mass === 0)
    scope.run.warnings.push({
      code: 'MODEL_NO_MASS',
      message: `${scope.prefix}${part.name} has geometry but no mass`,
      at: { file: scope.file.path, line: part.line },
    });
  return mass;
}

function checkThickness(
  part: PartModel,
  shape: ShapeModel & { kind: 'solid' | 'mesh' },
  thickness: number,
  smallest: number,
  scope: Scope,
): void {
  const length = unitFor(LENGTH, scope.file.units);
  if (!(thickness > 0))
    faultAt(scope, shape.thickness!.where, {
      code: 'SOLID_NOT_POSITIVE',
      message: `expected a thickness above zero, found ${formatQuantity(thickness, length)}`,
      hint: 'write the thickness of the wall',
    });
  else if (thickness > THIN_AT_MOST * smallest)
    scope.run.warnings.push({
      code: 'SOLID_NOT_THIN',
      message: `${scope.prefix}${part.name} is ${formatQuantity(thickness, length)} thick, more than 5 % of its smallest size (${formatQuantity(Number(smallest.toPrecision(12)), length)}): a thin solid is wrong by about that share, use a solid one`,
      at: { file: scope.file.path, line: part.line },
    });
}

const numbersIn = (values: readonly unknown[]): number[] =>
  values.flat(Number.POSITIVE_INFINITY).filter((x): x is number => typeof x === 'number');

function dimensionValue(model: DimensionModel, scope: Scope): DimensionValue {
  if (Array.isArray(model)) return model.map((m) => dimensionValue(m, scope)) as unknown as DimensionValue;
  return evaluate(model as Quantity, scope);
}
