import type { StateDocument } from '../document/index.ts';
import type { FileReader } from './file-reader.ts';
import type { ParameterModel, PartModel, Quantity, StateModel } from './model.ts';
import { findPart } from './part-paths.ts';
import { boundQuantity, type Parameters, parameterNamed } from './read-parameters.ts';
import { unknownName } from './read-part.ts';
import { type Where, within } from './where.ts';

/** The state of a file that declares none. */
export const NOMINAL = 'nominal';

export function readStates(
  states: Readonly<Record<string, StateDocument>> | undefined,
  parameters: Parameters,
  reader: FileReader,
): StateModel[] {
  if (states === undefined) return [{ name: NOMINAL, parameters: new Map(), omit: [], where: null }];
  return Object.entries(states).map(([name, state]) => {
    const where = within(within(null, 'states'), name);
    const values = new Map<number, Quantity>();
    for (const [parameter, text] of Object.entries(state.parameters ?? {})) {
      const at = within(within(where, 'parameters'), parameter);
      const symbol = parameterNamed(parameters.slots, parameter);
      if (!symbol) unknownName(reader, at, 'parameter', parameter, parameters.slots.keys(), { isKey: true });
      else values.set(symbol.slot, boundQuantity(reader, text, parameters.list[symbol.slot]!.value, at));
    }
    checkCircle(parameters.list, values, reader, where);
    return { name, parameters: values, omit: state.omit ?? [], where };
  });
}

/** `omit:` names parts by path; checked once the parts are read. */
export function checkOmitted(
  states: readonly StateModel[],
  parts: readonly PartModel[],
  reader: FileReader,
): void {
  for (const state of states)
    state.omit.forEach((path, i) => {
      const found = findPart(parts, path);
      const where = within(within(state.where, 'omit'), i);
      if (/\[\d+\]\//.test(path))
        reader.fault(where, {
          code: 'MODEL_UNKNOWN_PART',
          message: `expected the path of a part or of one whole copy, found '${path}', which is inside one copy`,
          hint: 'copies are alike: leave the part out of all of them by its path without [n]',
        });
      if (!('unknown' in found)) return;
      reader.fault(where, {
        code: 'MODEL_UNKNOWN_PART',
        message: `expected the path of a part, found '${path}', in which '${found.unknown}' is not one`,
        hint: found.nearest
          ? `did you mean '${found.nearest}'?`
          : 'paths join names with /, such as boom/access hole',
      });
    });
}

/** A state's values may use other parameters, so a circle can close in one state alone. */
function checkCircle(
  list: readonly ParameterModel[],
  values: ReadonlyMap<number, Quantity>,
  reader: FileReader,
  where: Where,
): void {
  if (values.size === 0) return;
  const circle = findCircle(list, (slot) => values.get(slot) ?? list[slot]!.value);
  if (circle)
    reader.fault(where, {
      code: 'PARAMETER_CIRCLE',
      message: `expected parameters that can be worked out one after another, found the circle ${circle.join(' → ')}`,
      hint: 'give one of them a value of its own in this state',
    });
}

/** The names along a circle of parameters, the first repeated at the end, or null. */
export function findCircle(
  list: readonly ParameterModel[],
  quantityOf: (slot: number) => Quantity,
): string[] | null {
  const done = new Set<number>();
  for (const first of list.keys()) {
    // The way from the first to the one in hand, and how many of its reads are looked at: no recursion, for a chain may
    // be longer than the engine's stack.
    const trail: { slot: number; next: number }[] = [{ slot: first, next: 0 }];
    const open = new Set([first]);
    while (trail.length > 0) {
      const here = trail.at(-1)!;
      const read = done.has(here.slot) ? undefined : quantityOf(here.slot).expression.reads[here.next++];
      if (read === undefined) {
        done.add(here.slot);
        open.delete(here.slot);
        trail.pop();
      } else if (open.has(read)) {
        const circle = trail.slice(trail.findIndex((t) => t.slot === read)).map((t) => t.slot);
        return [...circle, read].map((slot) => list[slot]!.name);
      } else if (!done.has(read)) {
        open.add(read);
        trail.push({ slot: read, next: 0 });
      }
    }
  }
  return null;
}
