import type { DisplayUnits, ProductsSign } from '#core/figures/index.ts';
import { displayUnits } from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { TextError } from '#core/units/index.ts';

/** How a run's figures are shown, as its address says it. */
export interface RunView {
  readonly on: 'basic' | 'predicted';
  readonly about: 'centre' | 'origin';
  readonly products: ProductsSign;
  readonly units: DisplayUnits;
  /** As the address names them: `file`, `si` or names such as `mm,g,deg`. */
  readonly unitsText: string;
  /** Where the address names units that are none: what is wrong with them; figures are then in the file's. */
  readonly unitsFault: string | null;
}

/** Reads an address; what it says wrongly counts as not said. */
export function readRunView(search: URLSearchParams, record: RollUpRecord): RunView {
  const on = search.get('on');
  const first = record.conventions.growth ? 'predicted' : 'basic';
  return {
    on: on === 'basic' || on === 'predicted' ? on : first,
    about: search.get('about') === 'origin' ? 'origin' : 'centre',
    products: search.get('products') === 'positive' ? 'positive' : 'negative',
    ...readUnits(search.get('units') ?? 'file', record),
  };
}

export function readUnits(
  text: string,
  record: Pick<RollUpRecord, 'conventions'>,
): Pick<RunView, 'units' | 'unitsText' | 'unitsFault'> {
  try {
    return { units: displayUnits(record, text), unitsText: text, unitsFault: null };
  } catch (error) {
    if (!(error instanceof TextError)) throw error;
    return { units: displayUnits(record), unitsText: 'file', unitsFault: error.message };
  }
}

/** `g, mm, g·mm², °`. */
export const unitsInWords = ({ mass, length, inertia, angle }: DisplayUnits): string =>
  [mass, length, inertia, angle].map((unit) => unit.text).join(', ');
