import { type Moments, netBody, netMass } from '../inertia/balance-sum.ts';
import type { Body } from '../inertia/body.ts';
import { compose, IN_PLACE, type Placement } from '../inertia/placement.ts';
import type { PartModel } from '../model/model.ts';
import type { OwnBody } from './own-body.ts';
import type { Scope } from './scope.ts';

/** The basic figures, and the predicted ones with growth allowance; the same object where nothing grows. */
export interface Both<T> {
  readonly basic: T;
  readonly predicted: T;
}

/**
 * A part, evaluated: its own solid and its members, in its own axes. Copies share one node; what differs between them
 * is where they stand.
 */
export interface PartNode {
  readonly part: PartModel;
  readonly scope: Scope;
  readonly maturity: string | null;
  readonly category: string | null;
  readonly basis: string | null;
  /** Growth allowance of the part's own solid, predicted/basic − 1. */
  readonly growth: number;
  readonly own: OwnBody | null;
  readonly members: readonly Member[];
  /** Multiplies everything in the node: what an override makes of it, basic and predicted. */
  readonly factor: Both<number>;
  /** Own and members, closed, override applied and cut-outs turned to cuts; in the node's own axes. */
  readonly moments: Both<Moments>;
  /** Solids and bodies in it, every copy counted. */
  readonly leaves: number;
  /** Sum of what rounding is granted to bought items inside, for judging what is computed from them [kg·m²]. */
  readonly slack: number;
  /** What the override replaced [kg], basic. */
  readonly overridden: { readonly from: number; readonly to: number } | null;
}

/** One standing of a node in its parent's axes, or a set of copies under one name. */
export type Member =
  | {
      readonly kind: 'one';
      readonly name: string;
      readonly node: PartNode;
      readonly placement: Placement;
      /** In the parent's axes. */
      readonly moments: Both<Moments>;
    }
  | {
      readonly kind: 'copies';
      readonly name: string;
      readonly copies: readonly (Member & { kind: 'one' })[];
      readonly moments: Both<Moments>;
    };

/** A leaf of the tree as it stands in the whole: one solid or body, override factors and cut signs worked in. */
export interface Leaf {
  readonly path: string;
  readonly node: PartNode;
  /** −1 inside a cut-out (+1 for a cut in a cut). */
  readonly sign: 1 | -1;
  readonly factor: Both<number>;
  /** The node's axes in body axes. */
  readonly placement: Placement;
}

/** Visits every leaf in file order. */
export function* leavesOf(
  members: readonly Member[],
  prefix = '',
  placement: Placement = IN_PLACE,
  sign: 1 | -1 = 1,
  factor: Both<number> = { basic: 1, predicted: 1 },
): Generator<Leaf> {
  for (const member of members) {
    if (member.kind === 'copies') {
      yield* leavesOf(member.copies, prefix, placement, sign, factor);
      continue;
    }
    const { node } = member;
    const path = prefix + member.name;
    const here = compose(placement, member.placement);
    const turned = node.part.cut ? (sign === 1 ? -1 : 1) : sign;
    const scaled = {
      basic: factor.basic * node.factor.basic,
      predicted: factor.predicted * node.factor.predicted,
    };
    if (node.own) yield { path, node, sign: turned, factor: scaled, placement: here };
    yield* leavesOf(node.members, `${path}/`, here, turned, scaled);
  }
}

/** A member found by path, and where its parent's axes stand in body axes. */
export interface Found {
  readonly member: Member;
  readonly path: string;
  readonly placement: Placement;
  readonly sign: 1 | -1;
  /** Overrides of the groups around it. */
  readonly factor: Both<number>;
}

/** Finds a member by path: `servo` is all copies together, `servo[2]` one of them. Null where the state has none. */
export function findMember(members: readonly Member[], path: string): Found | null {
  let here: Omit<Found, 'member' | 'path'> & { members: readonly Member[] } = {
    members,
    placement: IN_PLACE,
    sign: 1,
    factor: { basic: 1, predicted: 1 },
  };
  const segments = path.split('/');
  for (const [i, segment] of segments.entries()) {
    const member = memberNamed(here.members, segment);
    if (!member) return null;
    const { placement, sign, factor } = here;
    if (i === segments.length - 1) return { member, path, placement, sign, factor };
    const one = member.kind === 'copies' ? (member.copies.length === 1 ? member.copies[0]! : null) : member;
    if (!one) return null;
    here = {
      members: one.node.members,
      placement: compose(placement, one.placement),
      sign: one.node.part.cut ? (sign === 1 ? -1 : 1) : sign,
      factor: {
        basic: factor.basic * one.node.factor.basic,
        predicted: factor.predicted * one.node.factor.predicted,
      },
    };
  }
  return null;
}

function memberNamed(members: readonly Member[], name: string): Member | undefined {
  for (const member of members) {
    if (member.name === name) return member;
    if (member.kind === 'copies') {
      const copy = member.copies.find((c) => c.name === name);
      if (copy) return copy;
    }
  }
  return undefined;
}

/** The net bodies of a pair of moments; null where no mass remains. */
export const netBodies = (moments: Both<Moments>): Both<Body | null> => ({
  basic: netBody(moments.basic),
  predicted: netBody(moments.predicted),
});

export const netMasses = (moments: Both<Moments>): Both<number> => ({
  basic: netMass(moments.basic),
  predicted: netMass(moments.predicted),
});
