import type { SolidDocument } from '../document/index.ts';
import type { KeyKind } from '../solids/dimensions.ts';
import { solidByName } from '../solids/registry.ts';
import { checkNames } from '../solids/twins.ts';
import { ANGLE, LENGTH, PLAIN_UNIT, parseUnit, TextError } from '../units/index.ts';
import type { FileReader, QuantityDocument } from './file-reader.ts';
import type { DimensionModel, ShapeModel } from './model.ts';
import { type Where, within } from './where.ts';

/** Dimensions may be nested lists: an outline is a list of points, holes a list of outlines. */
type Nested = QuantityDocument | readonly Nested[];

/** The solid, mesh or thin solid of a part. */
export function readSolid(solid: SolidDocument, reader: FileReader, partWhere: Where): ShapeModel {
  const where = within(partWhere, 'solid');
  const name = typeof solid === 'string' ? solid : Object.keys(solid)[0]!;
  const given =
    typeof solid === 'string' ? {} : ((solid as Record<string, Record<string, Nested>>)[name] ?? {});
  const at = typeof solid === 'string' ? where : within(where, name);
  if (name === 'mesh') return readMesh(given as Record<string, string>, reader, at);
  const kind = solidByName(name)!;
  const { thickness, ...dims } = given;
  const fault = checkNames(kind, Object.keys(dims));
  if (fault) {
    const place = Object.hasOwn(dims, fault.key) ? within(at, fault.key) : at;
    reader.fault(place, {
      code: fault.code,
      message: fault.message,
      ...(fault.hint ? { hint: fault.hint } : {}),
    });
  }
  const known = new Map<string, KeyKind>(
    kind.keys.flatMap((key) => [
      [key.name, key.kind] as const,
      ...(key.twins ?? []).map((twin) => [twin.name, 'length'] as const),
    ]),
  );
  const dimensions = new Map<string, DimensionModel>();
  for (const [key, value] of Object.entries(dims)) {
    const keyKind = known.get(key);
    if (keyKind) dimensions.set(key, readDimension(value, keyKind, reader, within(at, key)));
  }
  return {
    kind: 'solid',
    solid: kind,
    dimensions,
    thickness:
      thickness === undefined
        ? null
        : reader.quantity(thickness as QuantityDocument, reader.unitOf(LENGTH), within(at, 'thickness')),
    where: at,
  };
}

function readDimension(value: Nested, kind: KeyKind, reader: FileReader, where: Where): DimensionModel {
  if (Array.isArray(value))
    return value.map((v, i) => readDimension(v as Nested, kind, reader, within(where, i)));
  const field =
    kind === 'angle' ? reader.unitOf(ANGLE) : kind === 'faces' ? PLAIN_UNIT : reader.unitOf(LENGTH);
  return reader.quantity(value as QuantityDocument, field, where);
}

function readMesh(given: Record<string, string>, reader: FileReader, where: Where): ShapeModel {
  const length = reader.unitOf(LENGTH);
  const quantity = (key: 'thickness' | 'weld') =>
    given[key] === undefined || given[key] === 'exact'
      ? null
      : reader.quantity(given[key]!, length, within(where, key));
  return {
    kind: 'mesh',
    file: given.file!,
    unit: readLengthUnit(given.unit!, reader, within(where, 'unit')),
    fill: given.fill === 'shell' ? 'shell' : 'solid',
    thickness: quantity('thickness'),
    weld: quantity('weld'),
    where,
  };
}

function readLengthUnit(text: string, reader: FileReader, where: Where) {
  try {
    const unit = parseUnit(text);
    if (unit.dimension === LENGTH) return unit;
    reader.fault(where, {
      code: 'MESH_UNIT',
      message: `expected a unit of length for the mesh, found '${text}'`,
      hint: 'write the unit in which the file was exported, for instance mm',
    });
  } catch (error) {
    if (!(error instanceof TextError)) throw error;
    reader.fault(where, {
      code: error.code,
      message: error.message,
      ...(error.hint ? { hint: error.hint } : {}),
    });
  }
  return reader.unitOf(LENGTH);
}
