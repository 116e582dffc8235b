export { type AddingColumn, printAddingColumn } from './adding-column.ts';
export { type Beam, beamOf } from './beam.ts';
export {
  DIGITS,
  decimalsFor,
  formatFixed,
  formatPercent,
  formatShort,
  formatSignificant,
  NO_FIGURE,
  readFigure,
} from './decimal.ts';
export {
  type DisplayKind,
  type DisplayUnit,
  type DisplayUnits,
  displayUnits,
  unitOfLimit,
} from './display-units.ts';
export { plainText } from './plain-text.ts';
export { type PrintedLimit, printLimit } from './printed-limit.ts';
export {
  isPossible,
  type PrintedTensor,
  type ProductsSign,
  printMoments,
  printTensor,
  tensorRows,
} from './printed-tensor.ts';
export { inUnit, PLAIN_ROOM, type Scale, scaleFor, TENSOR_ROOM } from './scale.ts';
export { unitText } from './unit-text.ts';
