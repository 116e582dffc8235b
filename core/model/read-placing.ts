import type { PartDocument } from '../document/index.ts';
import { ANGLE, LENGTH, PLAIN_UNIT, unitFor } from '../units/index.ts';
import type { FileReader, QuantityDocument } from './file-reader.ts';
import type { PlacingModel, RepeatModel, RotateStep, Vector3Quantity } from './model.ts';
import { type Where, within } from './where.ts';

export function readPlacing(part: PartDocument, reader: FileReader, where: Where): PlacingModel {
  const length = unitFor(LENGTH, reader.units);
  return {
    at: part.at ? reader.vector3(part.at, length, within(where, 'at')) : null,
    anchor: part.anchor === 'centroid' ? 'centroid' : 'origin',
    rotate: readRotate(part.rotate, reader, within(where, 'rotate')),
    image: part.image ?? null,
    repeat: readRepeats(part.repeat, reader, within(where, 'repeat')),
  };
}

type RotateDocument = NonNullable<PartDocument['rotate']>;
type RepeatDocument = NonNullable<PartDocument['repeat']>;

/** `rotate:` is a list done in order about the parent's fixed axes. */
export function readRotate(list: RotateDocument | undefined, reader: FileReader, where: Where): RotateStep[] {
  const angle = unitFor(ANGLE, reader.units);
  const numbers = (items: readonly QuantityDocument[], at: Where) =>
    items.map((item, i) => reader.quantity(item, PLAIN_UNIT, within(at, i)));
  return (list ?? []).map((step, i): RotateStep => {
    const here = within(where, i);
    if ('quaternion' in step && step.quaternion)
      return {
        kind: 'quaternion',
        items: numbers(step.quaternion, within(here, 'quaternion')),
        where: within(here, 'quaternion'),
      };
    if ('matrix' in step && step.matrix) {
      const at = within(here, 'matrix');
      const rows = step.matrix.map(
        (row: readonly QuantityDocument[], r: number) =>
          numbers(row, within(at, r)) as unknown as Vector3Quantity,
      );
      return { kind: 'matrix', rows, where: at };
    }
    if ('axis' in step && step.axis) {
      const axis = numbers(step.axis, within(here, 'axis')) as unknown as Vector3Quantity;
      return {
        kind: 'vector',
        axis,
        angle: reader.quantity(step.angle!, angle, within(here, 'angle')),
        where: within(here, 'axis'),
      };
    }
    const axis = (['x', 'y', 'z'] as const).find((k) => (step as Record<string, unknown>)[k] !== undefined)!;
    const given = (step as Record<string, QuantityDocument>)[axis]!;
    return { kind: 'axis', axis, angle: reader.quantity(given, angle, within(here, axis)) };
  });
}

function readRepeats(given: RepeatDocument | undefined, reader: FileReader, where: Where): RepeatModel[] {
  if (given === undefined) return [];
  const list = Array.isArray(given) ? given : [given];
  return list.map((repeat, i) => readRepeat(repeat, reader, Array.isArray(given) ? within(where, i) : where));
}

function readRepeat(
  repeat: Exclude<RepeatDocument, readonly unknown[]>,
  reader: FileReader,
  where: Where,
): RepeatModel {
  const length = unitFor(LENGTH, reader.units);
  if (repeat.line) {
    const at = within(where, 'line');
    return {
      kind: 'line',
      count: reader.quantity(repeat.line.count, PLAIN_UNIT, within(at, 'count')),
      step: reader.vector3(repeat.line.step, length, within(at, 'step')),
    };
  }
  if (repeat.ring) {
    const at = within(where, 'ring');
    const { count, axis, through, angle } = repeat.ring;
    return {
      kind: 'ring',
      count: reader.quantity(count, PLAIN_UNIT, within(at, 'count')),
      axis,
      through: through ? reader.vector3(through, length, within(at, 'through')) : null,
      angle:
        angle === undefined
          ? null
          : reader.quantity(angle, unitFor(ANGLE, reader.units), within(at, 'angle')),
    };
  }
  return { kind: 'mirror', plane: repeat.mirror! };
}
