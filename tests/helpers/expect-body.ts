import { expect } from 'vitest';
import { type Body, inertiaAboutCentre } from '../../core/inertia/body.ts';
import { toRows } from '../../core/linalg/symmetric3.ts';

/** Largest magnitude in a list. */
export const largest = (values: readonly number[]): number =>
  values.reduce((most, value) => Math.max(most, Math.abs(value)), 0);

/** Every entry within `relative` of the list's own largest entry. */
export function expectClose(
  found: readonly number[],
  expected: readonly number[],
  relative: number,
  what = '',
): void {
  expect(found.length, what).toBe(expected.length);
  const scale = largest(expected);
  const error = largest(found.map((value, i) => value - expected[i]!));
  if (error <= relative * scale) return;
  expect.fail(
    `${what} is off by ${(error / (scale || 1)).toExponential(2)} of the largest entry: found [${found.join(', ')}], expected [${expected.join(', ')}]`,
  );
}

/** Central inertia tensor as nine numbers, products negative. */
export const nine = (body: Body): number[] => toRows(inertiaAboutCentre(body)).flat();

/** Mass, centre (against `size`) and second moments within `relative`. */
export function expectBody(
  found: Body,
  expected: Body,
  relative: number,
  size = largest(expected.centre),
): void {
  expectClose([found.mass], [expected.mass], relative, 'mass');
  const off = largest(found.centre.map((value, i) => value - expected.centre[i]!));
  if (!(off <= relative * size))
    expect.fail(`centre is off by ${off} of ${size}: found [${found.centre}], expected [${expected.centre}]`);
  expectClose(found.secondMoments, expected.secondMoments, relative, 'second moments');
}
