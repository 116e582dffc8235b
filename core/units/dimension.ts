/**
 * The kind of a quantity, as whole exponents of length, mass, time and angle. There is one object for each kind, so
 * `a === b` compares them (within one thread: a copy sent to another thread must be made anew with `dimension`).
 * Angle counts: radians cancel only against radians.
 */
export interface Dimension {
  readonly length: number;
  readonly mass: number;
  readonly time: number;
  readonly angle: number;
}

/** Largest exponent, either sign, that a dimension may have. */
export const LARGEST_EXPONENT = 100;

const known = new Map<number, Dimension>();

/**
 * The dimension with these exponents.
 *
 * @throws RangeError when one is not whole or beyond ±100; callers that pass on what a user wrote ask `canBeDimension`
 */
export function dimension(length: number, mass: number, time: number, angle: number): Dimension {
  if (!canBeDimension(length, mass, time, angle))
    throw new RangeError('a dimension has whole exponents up to 100');
  const code = ((length + 128) * 256 + (mass + 128)) * 65536 + (time + 128) * 256 + (angle + 128);
  let found = known.get(code);
  if (found === undefined) {
    found = Object.freeze({ length: length + 0, mass: mass + 0, time: time + 0, angle: angle + 0 });
    known.set(code, found);
  }
  return found;
}

export const canBeDimension = (...exponents: number[]): boolean =>
  exponents.every((e) => Number.isInteger(e) && Math.abs(e) <= LARGEST_EXPONENT);

export const PLAIN = dimension(0, 0, 0, 0);
export const LENGTH = dimension(1, 0, 0, 0);
export const AREA = dimension(2, 0, 0, 0);
export const VOLUME = dimension(3, 0, 0, 0);
export const MASS = dimension(0, 1, 0, 0);
export const TIME = dimension(0, 0, 1, 0);
export const ANGLE = dimension(0, 0, 0, 1);
export const DENSITY = dimension(-3, 1, 0, 0);
export const FIRST_MOMENT = dimension(1, 1, 0, 0);
export const INERTIA = dimension(2, 1, 0, 0);
export const FREQUENCY = dimension(0, 0, -1, 0);
export const ANGULAR_SPEED = dimension(0, 0, -1, 1);
export const FORCE = dimension(1, 1, -2, 0);

/** The kind of a product a · b^power; undefined when an exponent is not whole or out of range. */
export function productDimension(a: Dimension, b: Dimension, power = 1): Dimension | undefined {
  const length = a.length + wholeIfNear(b.length * power);
  const mass = a.mass + wholeIfNear(b.mass * power);
  const time = a.time + wholeIfNear(b.time * power);
  const angle = a.angle + wholeIfNear(b.angle * power);
  return canBeDimension(length, mass, time, angle) ? dimension(length, mass, time, angle) : undefined;
}

/** 3 · (1/3) need not be 1 in binary; an exponent this near a whole number is meant to be one. */
function wholeIfNear(exponent: number): number {
  const whole = Math.round(exponent);
  return Math.abs(exponent - whole) < 1e-9 ? whole : exponent;
}
