export { fromSi, toSi, unitScale } from './convert.ts';
export { DECIMAL, shiftDecimal } from './decimal-text.ts';
export {
  ANGLE,
  ANGULAR_SPEED,
  AREA,
  DENSITY,
  type Dimension,
  dimension,
  FIRST_MOMENT,
  FORCE,
  FREQUENCY,
  INERTIA,
  LARGEST_EXPONENT,
  LENGTH,
  MASS,
  PLAIN,
  productDimension,
  TIME,
  VOLUME,
} from './dimension.ts';
export { aDimension, baseUnitText, dimensionName, powersText } from './dimension-names.ts';
export { type FileUnits, SI_UNITS, unitFor } from './file-units.ts';
export { formatQuantity, withUnit } from './format-quantity.ts';
export { literalValue } from './literal-value.ts';
export { compoundUnit, nearestUnitName, parseUnit, unitHint, unknownUnit } from './parse-unit.ts';
export { TextError } from './text-error.ts';
export { PLAIN_UNIT, productUnit, type Unit, type UnitPower } from './unit.ts';
export { findUnit, getUnit, UNIT_NAMES } from './unit-table.ts';
