export { type Contribution, contributionsTo, groupedContributionsTo, groupOf } from './contributions.ts';
export { difference, isAttributed } from './difference.ts';
export type {
  AxisChange,
  ConventionChange,
  Difference,
  InputChange,
  LimitChange,
  LimitSide,
  PartChange,
  PartSide,
  PartStatus,
  PrincipalChange,
  QuantityChange,
  SideLabel,
  Split,
  ValueChange,
} from './types.ts';
