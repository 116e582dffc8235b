import { DENSITY, type Dimension, INERTIA } from './dimension.ts';
import { powersText } from './dimension-names.ts';
import { productUnit, type Unit, type UnitPower } from './unit.ts';
import { getUnit } from './unit-table.ts';

/** The units that bare numbers of a file take. */
export interface FileUnits {
  readonly length: Unit;
  readonly mass: Unit;
  readonly angle: Unit;
  /** s where a file says nothing. */
  readonly time: Unit;
  /** Given by the file, or left to mass and length. */
  readonly density?: Unit | undefined;
  readonly inertia?: Unit | undefined;
}

export const SI_UNITS: FileUnits = {
  length: getUnit('m'),
  mass: getUnit('kg'),
  angle: getUnit('rad'),
  time: getUnit('s'),
};

const derived = new WeakMap<FileUnits, Map<Dimension, Unit>>();

/**
 * The unit that a bare number of some kind takes in a file: its own where `units:` names one, else the product of the
 * file's base units (`g*mm^2`, `g/mm^3`). For a plain number the unit of no name and factor 1.
 */
export function unitFor(kind: Dimension, units: FileUnits): Unit {
  const known = derived.get(units) ?? new Map<Dimension, Unit>();
  if (known.size === 0) derived.set(units, known);
  const unit = known.get(kind) ?? deriveUnit(kind, units);
  known.set(kind, unit);
  return unit;
}

function deriveUnit(kind: Dimension, units: FileUnits): Unit {
  if (kind === DENSITY && units.density !== undefined) return units.density;
  if (kind === INERTIA && units.inertia !== undefined) return units.inertia;
  const powers: UnitPower[] = [
    { unit: units.mass, power: kind.mass },
    { unit: units.length, power: kind.length },
    { unit: units.time, power: kind.time },
    { unit: units.angle, power: kind.angle },
  ].filter(({ power }) => power !== 0);
  const only = powers.length === 1 && powers[0]!.power === 1 ? powers[0]!.unit : undefined;
  if (only !== undefined) return only;
  return productUnit(powersText(powers.map(({ unit, power }) => [unit.name, power] as const)), powers)!;
}
