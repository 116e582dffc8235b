import type { SayLength, SolidDimensions, SolidFault, SolidKey } from './dimensions.ts';
import { givenName } from './twins.ts';

export const metres: SayLength = (length) => `${length} m`;

/** A full turn and four units in its last place: an angle converted from degrees may land just above. */
const FULL_TURN = 2 * Math.PI * (1 + 4 * Number.EPSILON);

/**
 * Every length positive and finite, every coordinate finite, every angle within a turn.
 *
 * @returns SOLID_NOT_POSITIVE, SOLID_NOT_FINITE, SOLID_WRONG_COUNT, SOLID_ANGLE_RANGE or null
 */
export function checkSizes(
  keys: readonly SolidKey[],
  dims: SolidDimensions,
  say: SayLength,
): SolidFault | null {
  for (const key of keys) {
    const fault = checkKey(key, dims, say);
    if (fault) return fault;
  }
  return null;
}

function checkKey(key: SolidKey, dims: SolidDimensions, say: SayLength): SolidFault | null {
  const value = dims[key.name];
  const name = givenName(key, dims);
  switch (key.kind) {
    case 'length':
      return checkLength(name, dims[name] as number, key.mayBeZero === true || name.startsWith('bore'), say);
    case 'size2':
    case 'size3':
      return firstFault(value as readonly number[], (size, i) =>
        checkLength(name, size, false, say, ` ${'xyz'[i]}`),
      );
    case 'angle':
      return checkAngle(name, value as number);
    case 'points2':
      return checkPoints(name, value as readonly (readonly number[])[]);
    case 'points3':
      return (
        checkCount(key, value as readonly unknown[]) ??
        checkPoints(name, value as readonly (readonly number[])[])
      );
    case 'outlines':
      return firstFault(value as readonly (readonly (readonly number[])[])[], (outline) =>
        checkPoints(name, outline),
      );
    case 'faces':
      return checkCount(key, value as readonly unknown[]);
  }
}

function firstFault<T>(items: readonly T[], check: (item: T, i: number) => SolidFault | null) {
  for (let i = 0; i < items.length; i++) {
    const fault = check(items[i]!, i);
    if (fault) return fault;
  }
  return null;
}

function checkCount(key: SolidKey, items: readonly unknown[]): SolidFault | null {
  const { min, max } = key.count ?? { min: 0 };
  if (items.length >= min && items.length <= (max ?? Infinity)) return null;
  const expected = max === min ? `${min}` : `${min} or more`;
  return {
    code: 'SOLID_WRONG_COUNT',
    message: `${key.name} has ${items.length} entries; it takes ${expected}.`,
    key: key.name,
  };
}

function checkLength(name: string, value: number, mayBeZero: boolean, say: SayLength, part = '') {
  if (Number.isFinite(value) && (value > 0 || (mayBeZero && value === 0))) return null;
  const expected = mayBeZero ? 'zero or more' : 'more than zero';
  return {
    code: 'SOLID_NOT_POSITIVE',
    message: `${name}${part} is ${Number.isFinite(value) ? say(value) : value}; it must be ${expected}.`,
    key: name,
  };
}

function checkAngle(name: string, value: number): SolidFault | null {
  if (value > 0 && value <= FULL_TURN) return null;
  return {
    code: 'SOLID_ANGLE_RANGE',
    message: `${name} is ${(value * 180) / Math.PI} deg; it must be more than 0 and at most 360 deg.`,
    key: name,
  };
}

const checkPoints = (name: string, points: readonly (readonly number[])[]): SolidFault | null =>
  firstFault(points, (point, i) =>
    point.every(Number.isFinite)
      ? null
      : {
          code: 'SOLID_NOT_FINITE',
          message: `point ${i + 1} of ${name} has a coordinate that is not a finite number.`,
          key: name,
        },
  );
