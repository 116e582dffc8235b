export type { Mark, Places } from '../yaml/places.ts';
export type { PathStep } from '../yaml/value.ts';
export { isDay } from './is-day.ts';
export { assemblyJsonSchema } from './json-schema.ts';
export { type DocumentRead, readDocument } from './read-document.ts';
export type {
  AssemblyDocument,
  BodyDocument,
  FrameDocument,
  FrameWordsDocument,
  GrowthDocument,
  InertiaDocument,
  LimitDocument,
  MaterialDocument,
  OverrideDocument,
  ParameterDocument,
  PartDocument,
  RangeDocument,
  RepeatDocument,
  RotationDocument,
  SolidDocument,
  SolidKeysDocument,
  StateDocument,
  SweepDocument,
  UncertainQuantityDocument,
  UnitsDocument,
  WaiverDocument,
} from './schema.ts';
export { SOLIDS, type SolidName } from './solid-keys.ts';
