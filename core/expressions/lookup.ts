import { nearestName } from '../nearest-name.ts';
import type { Dimension } from '../units/dimension.ts';
import { nearestUnitName, otherSpelling } from '../units/parse-unit.ts';
import type { NameAst } from './ast.ts';
import { ExpressionError } from './expression-error.ts';
import { FUNCTION_NAMES } from './vocabulary.ts';

/** What a name stands for: a value of some kind, in SI, at a place of the parameter vector. */
export interface SymbolInfo {
  readonly dimension: Dimension;
  /** Offset in the parameter vector from its base. */
  readonly slot: number;
}

/** The names an expression may use. */
export interface Lookup {
  (name: string): SymbolInfo | undefined;
  /** All of them, for "did you mean". */
  names?: () => Iterable<string>;
}

/** A lookup over a map. */
export function lookupIn(symbols: ReadonlyMap<string, SymbolInfo>): Lookup {
  return Object.assign((name: string) => symbols.get(name), { names: () => symbols.keys() });
}

/** `kg/m3`: the unit that ends there is meant with a power, whatever names are near. */
function powerIn(name: string): string | undefined {
  const other = otherSpelling(name);
  return other?.includes('^') ? other : undefined;
}

/** The fault of a name that nothing bears, with the nearest parameter, function or unit. */
export function unknownName(use: NameAst, lookup: Lookup): ExpressionError {
  const known = [...(lookup.names?.() ?? []), 'pi', ...FUNCTION_NAMES];
  const near = powerIn(use.name) ?? nearestName(use.name, known) ?? nearestUnitName(use.name);
  const hint = near === undefined ? undefined : `did you mean ${near}?`;
  return new ExpressionError('EXPRESSION_UNKNOWN_NAME', `nothing is named "${use.name}"`, use, hint);
}
