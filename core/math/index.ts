// Elementary functions with the same bits on every engine; sin, cos and tan exact at quarter turns.
export { acos, asin, atan, atan2 } from './elementary.ts';
export { hypot } from './hypot.ts';
export { pow } from './power.ts';
export { cos, rotationSineCosine, sin, tan, wholeQuarterTurns } from './quarter-turns.ts';
