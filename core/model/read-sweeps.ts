import type { SweepDocument } from '../document/index.ts';
import { ExpressionError, namesIn, parseExpression } from '../expressions/index.ts';
import { PLAIN_UNIT } from '../units/index.ts';
import type { FileReader } from './file-reader.ts';
import type { SweepModel } from './model.ts';
import { limitLookup } from './read-limits.ts';
import { boundQuantity, type Parameters, parameterNamed } from './read-parameters.ts';
import { unknownName } from './read-part.ts';
import { within } from './where.ts';

/** Reads and checks `sweeps:`; they are run by the sweep command. */
export function readSweeps(
  sweeps: Readonly<Record<string, SweepDocument>> | undefined,
  parameters: Parameters,
  states: readonly string[],
  reader: FileReader,
): SweepModel[] {
  const quantities = limitLookup(parameters.list);
  return Object.entries(sweeps ?? {}).map(([name, sweep]) => {
    const where = within(within(null, 'sweeps'), name);
    sweep.states?.forEach((state, i) => {
      if (!states.includes(state))
        unknownName(reader, within(within(where, 'states'), i), 'state', state, states);
    });
    sweep.keep?.forEach((text, i) => {
      const at = within(within(where, 'keep'), i);
      try {
        for (const used of namesIn(parseExpression(text)))
          if (!quantities(used.name))
            reader.fault(at, {
              code: 'MODEL_UNKNOWN_QUANTITY',
              message: `expected a quantity of a roll-up or a parameter, found '${used.name}'`,
              hint: 'such as mass, centre.x, inertia.xx, principal.min, tilt.z',
            });
      } catch (error) {
        if (!(error instanceof ExpressionError)) throw error;
        reader.expressionFault(error, at);
      }
    });
    return {
      name,
      vary: Object.entries(sweep.vary).flatMap(([parameter, given]): SweepModel['vary'] => {
        const at = within(within(where, 'vary'), parameter);
        const symbol = parameterNamed(parameters.slots, parameter);
        if (!symbol) {
          unknownName(reader, at, 'parameter', parameter, parameters.slots.keys(), { isKey: true });
          return [];
        }
        const like = parameters.list[symbol.slot]!.value;
        const quantity = (text: string, key: string | number) =>
          boundQuantity(reader, text, like, within(at, key));
        if (Array.isArray(given))
          return [
            {
              slot: symbol.slot,
              range: { kind: 'list' as const, values: given.map((v, i) => quantity(v, i)) },
            },
          ];
        const range = given as { from: string; to: string; step?: string; count?: string };
        const ends = { from: quantity(range.from, 'from'), to: quantity(range.to, 'to') };
        return [
          range.step !== undefined
            ? {
                slot: symbol.slot,
                range: { kind: 'step' as const, ...ends, step: quantity(range.step, 'step') },
              }
            : {
                slot: symbol.slot,
                range: {
                  kind: 'count' as const,
                  ...ends,
                  count: reader.quantity(range.count ?? '0', PLAIN_UNIT, within(at, 'count')),
                },
              },
        ];
      }),
      states: sweep.states ?? null,
      keep: sweep.keep ?? [],
    };
  });
}
