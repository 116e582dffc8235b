import type { Symmetric3 } from '../linalg/symmetric3.ts';
import { decimalExponent } from './decimal.ts';
import type { DisplayUnit } from './display-units.ts';
import { raised } from './unit-text.ts';

/** A unit with a power of ten for the head of a column or a tensor: `kg·m² × 10⁻³`. */
export interface Scale {
  readonly head: string;
  /** SI units in one of the printed figure. */
  readonly factor: number;
}

/** From which decimal exponent of the largest figure on the head takes a power of ten. */
interface Room {
  readonly low: number;
  readonly high: number;
}
/** Tensors read best with few digits before the mark. */
export const TENSOR_ROOM: Room = { low: -1, high: 4 };
/** Masses and lengths stay in the plain unit as long as they can. */
export const PLAIN_ROOM: Room = { low: -3, high: 6 };

const LEAST_EXPONENT = -90;

/**
 * The unit in which figures are printed, with an engineering power of ten (a multiple of three) where the largest
 * needs it.
 *
 * @param values in SI
 */
export function scaleFor(unit: DisplayUnit, values: readonly number[], room: Room = TENSOR_ROOM): Scale {
  const largest = Math.max(0, ...values.filter(Number.isFinite).map(Math.abs)) / unit.factor;
  const exponent = decimalExponent(largest);
  // What is smaller than any body prints as zero: dividing by its power of ten would overflow.
  if (exponent < LEAST_EXPONENT || (exponent >= room.low && exponent <= room.high))
    return { head: unit.text, factor: unit.factor };
  const power = 3 * Math.floor(exponent / 3);
  const ten = Number(`1e${power}`);
  return { head: `${unit.text} × 10${raised(power)}`.trim(), factor: unit.factor * ten };
}

/** A tensor in the printed unit. */
export const inUnit = (tensor: Symmetric3, { factor }: Scale): Symmetric3 =>
  tensor.map((x) => x / factor) as unknown as Symmetric3;
