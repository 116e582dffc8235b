import type { FileModel, Quantity, StateModel } from '../model/model.ts';
import { evaluate, faultAt, type Scope, say } from './scope.ts';

/** A parameter's value from outside its file (`--set`, `with`) [SI]. */
export type SetValues = ReadonlyMap<number, number>;

/**
 * Fills a file's parameter vector. Precedence: what is set from outside, then the state, then the file. Each is
 * evaluated after all that it reads; a value outside its own `min`/`max` is a fault.
 */
export function fillParameters(scope: Scope, set: SetValues): void {
  const { file, state, values } = scope;
  const done = new Uint8Array(file.parameters.length);
  // A stack of its own, for a chain of parameters may be longer than the engine's.
  const waiting: number[] = [];
  for (const first of file.parameters.keys()) {
    waiting.push(first);
    while (waiting.length > 0) {
      const slot = waiting.at(-1)!;
      const given = set.get(slot);
      const quantity = valueIn(file, state, slot);
      const missing =
        done[slot] || given !== undefined ? [] : quantity.expression.reads.filter((read) => !done[read]);
      if (missing.length > 0) {
        waiting.push(...missing);
        continue;
      }
      waiting.pop();
      if (done[slot]) continue;
      values[slot] = given ?? evaluate(quantity, scope);
      done[slot] = 1;
    }
  }
  for (const slot of file.parameters.keys()) checkBounds(scope, slot);
}

const valueIn = (file: FileModel, state: StateModel, slot: number): Quantity =>
  state.parameters.get(slot) ?? file.parameters[slot]!.value;

function checkBounds(scope: Scope, slot: number): void {
  const parameter = scope.file.parameters[slot]!;
  const value = scope.values[slot]!;
  const low = parameter.min && value < evaluate(parameter.min, scope) ? parameter.min : null;
  const high = parameter.max && value > evaluate(parameter.max, scope) ? parameter.max : null;
  const crossed = low ?? high;
  if (!crossed) return;
  const where = scope.state.parameters.get(slot)?.where ?? parameter.value.where;
  const bound = say(evaluate(crossed, scope), parameter.value, scope);
  faultAt(scope, where, {
    code: 'PARAMETER_OUT_OF_RANGE',
    message: `expected ${parameter.name} ${low ? 'at least' : 'at most'} ${bound}, found ${say(value, parameter.value, scope)} in state '${scope.state.name}'`,
    hint: `change the value, or the ${low ? 'min' : 'max'} that the parameter declares`,
  });
}
