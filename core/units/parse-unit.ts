import { nearestName } from '../nearest-name.ts';
import { LARGEST_EXPONENT } from './dimension.ts';
import { powersText } from './dimension-names.ts';
import { TextError } from './text-error.ts';
import { productUnit, type Unit, type UnitPower } from './unit.ts';
import { findUnit, UNIT_NAMES } from './unit-table.ts';

const PIECE = /\s*([*/]?)\s*(?:([\p{L}_°][\p{L}\p{N}_]*)|(1))(?:\s*\^\s*([+-]?\d+))?\s*/uy;

/**
 * A unit from its text alone: `mm`, `g*mm^2`, `kg/m^3`, `1/s`. Each `/` divides by the one name after it.
 *
 * @throws TextError UNITS_SYNTAX, UNITS_UNKNOWN_NAME
 */
export function parseUnit(text: string): Unit {
  const single = findUnit(text);
  if (single !== undefined) return single;
  const powers: UnitPower[] = [];
  let at = 0;
  let first = true;
  while (at < text.length || first) {
    PIECE.lastIndex = at;
    const piece = PIECE.exec(text);
    const operator = piece?.[1] ?? '';
    const leadingOne = piece?.[3] !== undefined;
    const misplaced = first ? operator !== '' : operator === '' || leadingOne;
    if (
      piece === null ||
      misplaced ||
      (leadingOne && (piece[4] !== undefined || PIECE.lastIndex === text.length))
    )
      throw syntaxError(text, at);
    if (!leadingOne) powers.push(unitPower(piece, operator));
    at = PIECE.lastIndex;
    first = false;
  }
  return compoundUnit(powers, { start: 0, end: text.length });
}

function unitPower(piece: RegExpExecArray, operator: string): UnitPower {
  const name = piece[2]!;
  const start = piece.index + piece[0].indexOf(name);
  const unit = findUnit(name);
  if (unit === undefined) throw unknownUnit('UNITS_UNKNOWN_NAME', name, { start, end: start + name.length });
  const written = Number(piece[4] ?? 1);
  const span = { start, end: piece.index + piece[0].trimEnd().length };
  if (written === 0 || Math.abs(written) > LARGEST_EXPONENT)
    throw new TextError(
      'UNITS_SYNTAX',
      `the power of a unit is a whole number up to ${LARGEST_EXPONENT}, not 0`,
      span,
    );
  return { unit, power: operator === '/' ? -written : written };
}

/**
 * The product of the powers, named after them.
 *
 * @throws TextError UNITS_SYNTAX when the powers, signs dropped, add up to more than 100
 */
export function compoundUnit(powers: readonly UnitPower[], span: { start: number; end: number }): Unit {
  const name = powersText(powers.map(({ unit, power }) => [unit.name, power] as const));
  const total = powers.reduce((sum, { power }) => sum + Math.abs(power), 0);
  const unit = total > LARGEST_EXPONENT ? undefined : productUnit(name, powers);
  if (unit === undefined)
    throw new TextError('UNITS_SYNTAX', `the powers in a unit add up to at most ${LARGEST_EXPONENT}`, span);
  return unit;
}

/** Spellings that people use for a unit of the table. */
const OTHER_SPELLINGS = new Map([
  ['µm', 'um'],
  ['μm', 'um'],
  ['micron', 'um'],
  ['inch', 'in'],
  ['inches', 'in'],
  ['feet', 'ft'],
  ['foot', 'ft'],
  ['lbs', 'lb'],
  ['lbm', 'lb'],
  ['gram', 'g'],
  ['grams', 'g'],
  ['tonne', 't'],
  ['degree', 'deg'],
  ['degrees', 'deg'],
  ['°', 'deg'],
  ['turn', 'rev'],
  ['sec', 's'],
  ['second', 's'],
  ['seconds', 's'],
  ['min', 'minute'],
  ['minutes', 'minute'],
  ['h', 'hour'],
  ['hours', 'hour'],
  ['cc', 'cm^3'],
  ['ccm', 'cm^3'],
]);

/** The fault of a name that is no unit, with the unit that was probably meant. */
export function unknownUnit(code: string, name: string, span: { start: number; end: number }): TextError {
  return new TextError(code, `"${name}" is not a unit`, span, unitHint(name));
}

/** "did you mean mm?" or the list of units. */
export function unitHint(name: string): string {
  const near = nearestUnitName(name);
  return near === undefined ? `the units are ${UNIT_NAMES.join(' ')}` : `did you mean ${near}?`;
}

/** The unit that a spelling of people's own stands for: `feet`, and powers without their sign, such as `m3` and `cc`. */
export function otherSpelling(name: string): string | undefined {
  const known = OTHER_SPELLINGS.get(name.toLowerCase());
  if (known !== undefined) return known;
  const [, base, power] = /^(.*?)([2-9²³⁴⁵])$/u.exec(name) ?? [];
  const unit = base === undefined ? undefined : findUnit(base) && base;
  return unit && `${unit}^${SUPERSCRIPTS[power!] ?? power}`;
}

const SUPERSCRIPTS: Readonly<Record<string, string>> = { '²': '2', '³': '3', '⁴': '4', '⁵': '5' };

/** The unit probably meant: another spelling of it, or the nearest with the same first letter and about as long. */
export function nearestUnitName(name: string): string | undefined {
  const other = otherSpelling(name);
  if (other !== undefined) return other;
  const first = name.charAt(0).toLowerCase();
  const difference = (unit: string): number => Math.abs(unit.length - name.length);
  const alike = UNIT_NAMES.filter((unit) => unit.charAt(0).toLowerCase() === first);
  return nearestName(
    name,
    alike.sort((a, b) => difference(a) - difference(b)),
  );
}

function syntaxError(text: string, at: number): TextError {
  const start = Math.min(at, Math.max(0, text.length - 1));
  return new TextError(
    'UNITS_SYNTAX',
    `"${text}" is not a unit`,
    { start, end: text.length },
    'a unit is names joined by * and /, with whole powers, such as g*mm^2 or kg/m^3',
  );
}
