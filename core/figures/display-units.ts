import type { RollUpRecord } from '../record/record.ts';
import {
  ANGLE,
  aDimension,
  type Dimension,
  INERTIA,
  LENGTH,
  MASS,
  parseUnit,
  TextError,
  type Unit,
} from '../units/index.ts';
import { unitText } from './unit-text.ts';

/** A unit in which figures are shown. */
export interface DisplayUnit {
  /** As printed: `g·mm²`. */
  readonly text: string;
  /** SI units in one of it. */
  readonly factor: number;
}

export type DisplayKind = 'length' | 'mass' | 'inertia' | 'angle';

export interface DisplayUnits extends Readonly<Record<DisplayKind, DisplayUnit>> {
  /** Whether these are the file's own, so that a limit keeps the unit in which the file writes it. */
  readonly own: boolean;
}

const KINDS: ReadonlyMap<Dimension, DisplayKind> = new Map([
  [LENGTH, 'length'],
  [MASS, 'mass'],
  [INERTIA, 'inertia'],
  [ANGLE, 'angle'],
]);

/**
 * The units in which a record's figures are shown.
 *
 * @param override `file` (the file's own, also where left out), `si`, or names such as `mm,g,deg`, each for its kind;
 *   inertia follows mass and length unless it is named too (`mm,g,kg*m^2`)
 * @throws TextError UNITS_UNKNOWN_NAME, UNITS_SYNTAX, or UNITS_NOT_SHOWN for a kind that is not shown or named twice
 */
export function displayUnits(
  record: { conventions: Pick<RollUpRecord['conventions'], 'fileUnits'> },
  override = 'file',
): DisplayUnits {
  const file = record.conventions.fileUnits;
  const wanted = override.trim();
  if (wanted === 'file' || wanted === '') return { ...fromNames(file), own: true };
  if (wanted.toLowerCase() === 'si')
    return { ...fromNames({ length: 'm', mass: 'kg', inertia: 'kg*m^2', angle: 'rad' }), own: false };
  const given = readNames(wanted);
  const length = given.length ?? file.length;
  const mass = given.mass ?? file.mass;
  const follows = given.length || given.mass ? `${mass}*${length}^2` : file.inertia;
  const angle = given.angle ?? file.angle;
  return { ...fromNames({ length, mass, inertia: given.inertia ?? follows, angle }), own: false };
}

function readNames(list: string): Partial<Record<DisplayKind, string>> {
  const given: Partial<Record<DisplayKind, string>> = {};
  let start = 0;
  for (const part of list.split(',')) {
    const span = { start, end: start + part.length };
    start += part.length + 1;
    const unit = parseUnit(part.trim());
    const kind = KINDS.get(unit.dimension);
    if (kind === undefined)
      throw new TextError(
        'UNITS_NOT_SHOWN',
        `"${part.trim()}" is ${aDimension(unit.dimension)}`,
        span,
        'name units of length, mass, angle and moment of inertia, such as mm,g,deg',
      );
    if (given[kind] !== undefined)
      throw new TextError('UNITS_NOT_SHOWN', `two units of ${kind}: ${given[kind]} and ${unit.name}`, span);
    given[kind] = unit.name;
  }
  return given;
}

function fromNames(names: Record<DisplayKind, string>): Record<DisplayKind, DisplayUnit> {
  const shown = (unit: Unit): DisplayUnit => ({ text: unitText(unit.name), factor: unit.factor });
  return {
    length: shown(parseUnit(names.length)),
    mass: shown(parseUnit(names.mass)),
    inertia: shown(parseUnit(names.inertia)),
    angle: shown(parseUnit(names.angle)),
  };
}

const SI_KINDS: Readonly<Record<string, DisplayKind>> = {
  m: 'length',
  kg: 'mass',
  'kg*m^2': 'inertia',
  rad: 'angle',
};

/** The unit of a limit's figures: the one in which its file writes it, unless the reader asked for other units. */
export function unitOfLimit(
  limit: { unit: string; shown: { unit: string; factor: number } },
  units: DisplayUnits,
): DisplayUnit {
  const kind = SI_KINDS[limit.unit];
  if (units.own || kind === undefined)
    return { text: unitText(limit.shown.unit), factor: limit.shown.factor };
  return units[kind];
}
