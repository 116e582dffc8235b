import type { Moments } from '../inertia/balance-sum.ts';
import type { Body } from '../inertia/body.ts';
import type { Where } from '../model/where.ts';
import { faultAt, type Scope } from './scope.ts';
import type { Both } from './tree.ts';

/**
 * The largest mass [kg] and length [m], its cube the largest moment [kg·m²]: beyond any machine, and so far inside what
 * a double carries that squares of moments and sums of all parts stay finite.
 */
const AT_MOST = 1e40;
const MOMENT_AT_MOST = 1e120;

// A number that is none fails as well.
const isWithin = (values: readonly number[], bound: number) => values.every((x) => Math.abs(x) <= bound);

const isCarried = (body: Body | null): boolean =>
  body === null ||
  (body.mass <= AT_MOST && isWithin(body.centre, AT_MOST) && isWithin(body.secondMoments, MOMENT_AT_MOST));

/** @throws InputError PART_TOO_LARGE, with all faults before it: nothing right can be computed from here */
export function refuseTooLarge(body: Body, name: string, where: Where, scope: Scope): void {
  if (!isCarried(body)) refuse(name, where, scope);
}

/** The same for lengths: sizes of a solid, the place of a frame [m]. */
export function refuseTooLong(lengths: readonly number[], name: string, where: Where, scope: Scope): void {
  if (!isWithin(lengths, AT_MOST)) refuse(name, where, scope);
}

/** The same for what a part or a copy of it weighs where it stands. */
export function refuseTooLargeMoments(
  { basic, predicted }: Both<Moments>,
  name: string,
  where: Where,
  scope: Scope,
): void {
  for (const { material, cut } of basic === predicted ? [basic] : [basic, predicted])
    if (!isCarried(material) || !isCarried(cut)) refuse(name, where, scope);
}

function refuse(name: string, where: Where, scope: Scope): void {
  faultAt(scope, where, {
    code: 'PART_TOO_LARGE',
    message: `expected masses and lengths of at most 1e40 kg and m, found that those of '${name}' are larger`,
    hint: 'look for a slip in a power of ten or a unit: in sizes, mass, place, repeat or override',
  });
  scope.run.faults.check();
}
