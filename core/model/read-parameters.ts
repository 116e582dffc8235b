import type { ParameterDocument } from '../document/index.ts';
import {
  composedName,
  ExpressionError,
  isParameterName,
  isReservedName,
  lookupIn,
  orderParameters,
  parseExpression,
  type SymbolInfo,
} from '../expressions/index.ts';
import type { FileReader } from './file-reader.ts';
import type { ParameterModel, Quantity } from './model.ts';
import { type Where, within } from './where.ts';

export interface Parameters {
  readonly list: readonly ParameterModel[];
  readonly slots: ReadonlyMap<string, SymbolInfo>;
}

/**
 * Reads `parameters:` in any order: names checked, circles reported with their path, each expression compiled when
 * all that it reads are known, so that its dimension is known too. Sets the reader's look-up.
 */
export function readParameters(
  document: Readonly<Record<string, ParameterDocument>> | undefined,
  reader: FileReader,
): Parameters {
  const slots = new Map<string, SymbolInfo>();
  const names = Object.keys(document ?? {});
  const root = within(null, 'parameters');
  reader.lookup = lookupIn(slots);
  const valid = names.filter((name) => checkName(name, reader, within(root, name)));
  const parsed = valid.flatMap((name) => {
    const given = document![name]!;
    const text = typeof given === 'string' ? given : given.value;
    const where = typeof given === 'string' ? within(root, name) : within(within(root, name), 'value');
    try {
      return [{ name: composedName(name), key: name, ast: parseExpression(text), where }];
    } catch (error) {
      if (!(error instanceof ExpressionError)) throw error;
      reader.expressionFault(error, where);
      return [];
    }
  });
  reader.faults.check();
  const order = orderOrFault(parsed, reader);
  const values = new Map<string, Quantity>();
  const keys = valid.map(composedName);
  for (const name of order) {
    const key = valid[keys.indexOf(name)]!;
    const value = reader.quantity(document![key]!, null, within(root, key));
    values.set(name, value);
    slots.set(name, { dimension: value.expression.dimension, slot: keys.indexOf(name) });
  }
  reader.faults.check();
  const list = valid.map((key): ParameterModel => {
    const given = document![key]!;
    const value = values.get(composedName(key))!;
    const bound = (which: 'min' | 'max') => {
      const text = typeof given === 'string' ? undefined : given[which];
      return text === undefined ? null : boundQuantity(reader, text, value, within(within(root, key), which));
    };
    return { name: composedName(key), value, min: bound('min'), max: bound('max') };
  });
  return { list, slots };
}

/** A parameter by its name as someone wrote it: accents may be typed composed or not. */
export const parameterNamed = (
  slots: ReadonlyMap<string, SymbolInfo>,
  name: string,
): SymbolInfo | undefined => slots.get(composedName(name));

/** A quantity that stands for a parameter's: of its dimension, a bare number in this file's unit for it. */
export const boundQuantity = (reader: FileReader, text: string, like: Quantity, where: Where): Quantity =>
  reader.quantity(text, reader.unitOf(like.expression.dimension), where);

function checkName(name: string, reader: FileReader, where: Where): boolean {
  if (isParameterName(name) && !isReservedName(name)) return true;
  reader.keyFault(where, {
    code: 'PARAMETER_NAME',
    message: isParameterName(name)
      ? `expected a parameter name of your own, found '${name}', which is a unit, a function or a quantity`
      : `expected a parameter name of letters, digits and _ that starts with a letter, found '${name}'`,
    hint: `rename it, for instance '${isParameterName(name) ? `${name}_1` : 'my_parameter'}', here and where it is used`,
  });
  return false;
}

function orderOrFault(
  parsed: readonly { name: string; ast: ReturnType<typeof parseExpression>; where: Where }[],
  reader: FileReader,
): readonly string[] {
  try {
    return orderParameters(parsed);
  } catch (error) {
    if (!(error instanceof ExpressionError)) throw error;
    const about = parsed.find((p) => error.message.includes(p.name)) ?? parsed[0]!;
    reader.fault(about.where, {
      code: error.code,
      message: error.message,
      ...(error.hint ? { hint: error.hint } : {}),
    });
    reader.faults.check();
    throw error;
  }
}
