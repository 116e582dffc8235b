// Solids of the file format as data and as bodies of unit density.
export { metres } from './check-sizes.ts';
export type {
  DimensionValue,
  Extent,
  KeyKind,
  Outline,
  SayLength,
  SolidDimensions,
  SolidFamily,
  SolidFault,
  SolidKey,
  SolidKind,
  Twin,
} from './dimensions.ts';
export { polyhedronBody } from './polyhedron.ts';
export { SOLID_NAMES, SOLIDS, type SolidName, solidByName } from './registry.ts';
export type { Vector2 } from './section-moments.ts';
export { checkNames, namesOf, resolveTwins } from './twins.ts';
export { type Polyline, wireframe } from './wireframe.ts';
