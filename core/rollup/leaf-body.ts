import { type Body, scaleBody } from '../inertia/body.ts';
import { placeBody } from '../inertia/placement.ts';
import type { Leaf } from './tree.ts';

/** A leaf's body in body axes, its mass not negative; `leaf.sign` says whether it is cut away. */
export function leafBody(leaf: Leaf, on: 'basic' | 'predicted'): Body {
  const growth = on === 'basic' ? 1 : 1 + leaf.node.growth;
  return placeBody(leaf.placement, scaleBody(leaf.node.own!.body, leaf.factor[on] * growth));
}
