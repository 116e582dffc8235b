import { closeMoments, type Moments, sumMoments } from '../inertia/balance-sum.ts';
import { type Body, scaleBody } from '../inertia/body.ts';
import { IN_PLACE, type Placement, placeBody } from '../inertia/placement.ts';
import type { Both } from './tree.ts';

/** Does the same to basic and predicted, once where they are the same object. */
export function onBoth<T, R>(both: Both<T>, change: (value: T) => R): Both<R> {
  const basic = change(both.basic);
  return { basic, predicted: both.predicted === both.basic ? basic : change(both.predicted) };
}

const eachBody = (m: Moments, change: (body: Body) => Body): Moments => ({
  material: m.material && change(m.material),
  cut: m.cut && change(m.cut),
});

export const placeMoments = (p: Placement, both: Both<Moments>): Both<Moments> =>
  p === IN_PLACE ? both : onBoth(both, (m) => eachBody(m, (body) => placeBody(p, body)));

export const scaleMoments = (m: Moments, k: number): Moments =>
  k === 1 ? m : eachBody(m, (body) => scaleBody(body, k));

/** Material becomes what is cut away, and the other way round. */
export const turnToCut = (m: Moments): Moments => ({ material: m.cut, cut: m.material });

/** A group's members on the fixed tree, closed. */
export function sumAndClose(items: readonly Both<Moments>[]): Both<Moments> {
  const basic = closeMoments(sumMoments(items.map((i) => i.basic)));
  if (items.every((i) => i.basic === i.predicted)) return { basic, predicted: basic };
  return { basic, predicted: closeMoments(sumMoments(items.map((i) => i.predicted))) };
}
