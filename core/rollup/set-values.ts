import { InputError } from '../errors.ts';
import { compileExpression, ExpressionError } from '../expressions/index.ts';
import type { FileModel } from '../model/model.ts';
import { parameterNamed } from '../model/read-parameters.ts';
import { nearestName } from '../nearest-name.ts';
import { unitFor } from '../units/index.ts';

/**
 * `--set name=value` for the top file: a bare number takes the dimension of the parameter, in the file's unit for it.
 *
 * @returns by slot [SI]
 * @throws InputError SET_UNKNOWN_PARAMETER, or the expression's own fault
 */
export function setValues(file: FileModel, set: Readonly<Record<string, string>>): Map<number, number> {
  const values = new Map<number, number>();
  for (const [name, text] of Object.entries(set)) {
    const symbol = parameterNamed(file.slots, name);
    if (!symbol) {
      const nearest = nearestName(name, file.slots.keys());
      throw new InputError([
        {
          code: 'SET_UNKNOWN_PARAMETER',
          message: `expected a parameter of ${file.path} to set, found '${name}'`,
          hint: nearest
            ? `did you mean '${nearest}'?`
            : `known: ${[...file.slots.keys()].join(', ') || 'none'}`,
        },
      ]);
    }
    values.set(symbol.slot, readValue(name, text, unitFor(symbol.dimension, file.units), file));
  }
  return values;
}

function readValue(
  name: string,
  text: string,
  unit: Parameters<typeof compileExpression>[1],
  file: FileModel,
): number {
  try {
    const { constant } = compileExpression(text, unit, () => undefined, file.units);
    if (constant !== undefined && Number.isFinite(constant)) return constant;
  } catch (error) {
    if (!(error instanceof ExpressionError)) throw error;
    throw new InputError([
      {
        code: error.code,
        message: `--set ${name}=${text}: ${error.message}`,
        ...(error.hint ? { hint: error.hint } : {}),
      },
    ]);
  }
  throw new InputError([
    {
      code: 'EXPRESSION_NOT_FINITE',
      message: `--set ${name}=${text}: expected a finite number`,
      hint: 'write a number with its unit',
    },
  ]);
}
