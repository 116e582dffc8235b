import type { LimitDocument } from '../document/index.ts';
import { type Lookup, lookupIn } from '../expressions/index.ts';
import { QUANTITIES, type QuantityKind } from '../inertia/quantities.ts';
import { ANGLE, baseUnitText, type Dimension, INERTIA, LENGTH, MASS, unitFor } from '../units/index.ts';
import type { FileReader } from './file-reader.ts';
import type { LimitModel, ParameterModel, PartModel } from './model.ts';
import { findPart } from './part-paths.ts';
import { unknownName } from './read-part.ts';
import { type Where, within } from './where.ts';

const DIMENSIONS: Record<QuantityKind, Dimension> = {
  mass: MASS,
  length: LENGTH,
  inertia: INERTIA,
  angle: ANGLE,
};

/**
 * Slots of a limit's symbols: the quantities as judged, then `basic.` and `predicted.` ones, then the parameters.
 * `limitVector` in core/rollup fills a vector in this order.
 */
export function limitLookup(parameters: readonly ParameterModel[]): Lookup {
  const slots = new Map<string, { dimension: Dimension; slot: number }>();
  let slot = 0;
  for (const prefix of ['', 'basic.', 'predicted.'])
    for (const q of QUANTITIES) slots.set(prefix + q.name, { dimension: DIMENSIONS[q.kind], slot: slot++ });
  for (const p of parameters) slots.set(p.name, { dimension: p.value.expression.dimension, slot: slot++ });
  return lookupIn(slots);
}

export interface LimitContext {
  readonly parameters: readonly ParameterModel[];
  readonly parts: readonly PartModel[];
  readonly states: readonly string[];
  readonly frames: readonly string[];
}

export function readLimits(
  limits: readonly LimitDocument[] | undefined,
  reader: FileReader,
  context: LimitContext,
): LimitModel[] {
  if (!limits) return [];
  const lookupOfFile = reader.lookup;
  const lookup = limitLookup(context.parameters);
  const read = limits.map((limit, i) => {
    const where = within(within(null, 'limits'), i);
    reader.lookup = lookup;
    const quantity = reader.quantity(limit.quantity, null, within(where, 'quantity'));
    reader.lookup = lookupOfFile;
    return readLimit(limit, quantity, reader, context, where);
  });
  return read;
}

function readLimit(
  limit: LimitDocument,
  quantity: LimitModel['quantity'],
  reader: FileReader,
  context: LimitContext,
  where: Where,
): LimitModel {
  const { dimension } = quantity.expression;
  const unit = unitFor(dimension, reader.units);
  const stop = (key: 'min' | 'max') =>
    limit[key] === undefined ? null : reader.quantity(limit[key]!, unit, within(where, key));
  const min = stop('min');
  const max = stop('max');
  if (!min && !max)
    reader.fault(where, {
      code: 'LIMIT_WITHOUT_STOP',
      message: `expected \`min\`, \`max\` or both on limit '${limit.name}', found neither`,
      hint: 'add, for instance, `max: 250 g`',
    });
  const a = min?.expression.constant;
  const b = max?.expression.constant;
  if (a !== undefined && b !== undefined && a > b)
    reader.fault(within(where, 'min'), {
      code: 'LIMIT_EMPTY',
      message: `expected min to be below max on limit '${limit.name}', found ${limit.min} above ${limit.max}`,
      hint: 'swap the two, or mend the wrong one',
    });
  if (limit.of !== undefined) {
    const found = findPart(context.parts, limit.of);
    if ('unknown' in found)
      reader.fault(within(where, 'of'), {
        code: 'MODEL_UNKNOWN_PART',
        message: `expected the path of a part, found '${limit.of}', in which '${found.unknown}' is not one`,
        hint: found.nearest
          ? `did you mean '${found.nearest}'?`
          : 'paths join names with /, such as boom/access hole',
      });
  }
  if (limit.frame !== undefined && !context.frames.includes(limit.frame))
    unknownName(reader, within(where, 'frame'), 'frame', limit.frame, context.frames);
  limit.states?.forEach((name, i) => {
    if (!context.states.includes(name))
      unknownName(reader, within(within(where, 'states'), i), 'state', name, context.states);
  });
  return {
    name: limit.name,
    id: limit.id ?? null,
    text: limit.quantity,
    quantity,
    min,
    max,
    shown: { unit: unit.name, factor: unit.factor, si: baseUnitText(dimension) || '1' },
    of: limit.of ?? null,
    frame: limit.frame ?? null,
    on: limit.on ?? null,
    states: limit.states ?? null,
    waiver: limit.waiver ?? null,
    source: limit.source ?? null,
    owner: limit.owner ?? null,
    note: limit.note ?? null,
    where,
    line: reader.places.lineOf(limit),
  };
}
