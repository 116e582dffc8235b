import {
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
  LENGTH,
  MASS,
  PLAIN,
  TIME,
  VOLUME,
} from './dimension.ts';

const NAMES = new Map<Dimension, string>([
  [PLAIN, 'plain number'],
  [LENGTH, 'length'],
  [AREA, 'area'],
  [VOLUME, 'volume'],
  [MASS, 'mass'],
  [TIME, 'time'],
  [ANGLE, 'angle'],
  [DENSITY, 'density'],
  [FIRST_MOMENT, 'first moment of mass'],
  [INERTIA, 'moment of inertia'],
  [FREQUENCY, 'frequency'],
  [ANGULAR_SPEED, 'angular speed'],
  [FORCE, 'force'],
  [dimension(-2, 1, 0, 0), 'mass per area'],
  [dimension(-1, 1, 0, 0), 'mass per length'],
  [dimension(1, 0, -1, 0), 'speed'],
  [dimension(1, 0, -2, 0), 'acceleration'],
  [dimension(2, 1, -2, 0), 'torque or energy'],
  [dimension(-1, 1, -2, 0), 'pressure'],
  [dimension(-1, 0, 0, 1), 'angle per length'],
]);

/** The kind in words, without an article: "length", "moment of inertia"; "quantity in kg*m^3" where it has no name. */
export function dimensionName(kind: Dimension): string {
  return NAMES.get(kind) ?? `quantity in ${baseUnitText(kind)}`;
}

/** The kind with its article: "a length", "an angle". */
export function aDimension(kind: Dimension): string {
  const name = dimensionName(kind);
  return /^[aeiou]/.test(name) ? `an ${name}` : `a ${name}`;
}

/** The SI unit of the kind, as text that reads back as that unit: "kg*m^2", "rad/s", "1/s"; "" for a plain number. */
export function baseUnitText(kind: Dimension): string {
  return powersText([
    ['kg', kind.mass],
    ['m', kind.length],
    ['s', kind.time],
    ['rad', kind.angle],
  ]);
}

/** Products first, quotients after: [['g', 1], ['mm', -3]] is "g/mm^3", [['s', -1]] is "1/s". Zero powers drop out. */
export function powersText(powers: readonly (readonly [name: string, power: number])[]): string {
  const written = (name: string, power: number): string => (power === 1 ? name : `${name}^${power}`);
  const above = powers.filter(([, power]) => power > 0).map(([name, power]) => written(name, power));
  const below = powers.filter(([, power]) => power < 0).map(([name, power]) => `/${written(name, -power)}`);
  if (above.length === 0 && below.length === 0) return '';
  return (above.length === 0 ? '1' : above.join('*')) + below.join('');
}
