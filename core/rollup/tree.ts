import { type Moments, netBody, netMass } from '../inertia/balance-sum.ts';
import type { Body } from '../inertia/body.ts';
import { compose, IN_PLACE, type Placement } from '../inertia/placement.ts';
import type { PartModel } from '../model/model.ts';
import { readStep } from '../model/part-paths.ts';
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
  readonly slack: Both<number>;
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
      /** What each copy is. */
      readonly node: PartNode;
      /** How many the part makes; `copies` lacks those that the state leaves out. */
      readonly count: number;
      readonly copies: readonly (Member & { kind: 'one' })[];
      readonly moments: Both<Moments>;
    };

/** How a member's own axes and masses count in the whole. */
export interface Standing {
  /** The axes in body axes. */
  readonly placement: Placement;
  /** −1 inside a cut-out (+1 for a cut in a cut). */
  readonly sign: 1 | -1;
  /** Overrides of all groups around it. */
  readonly factor: Both<number>;
}

const AT_THE_TOP: Standing = { placement: IN_PLACE, sign: 1, factor: { basic: 1, predicted: 1 } };

/** How what is in a member stands, where the member's parent stands so. */
const inside = (around: Standing, { node, placement }: Member & { kind: 'one' }): Standing => ({
  placement: compose(around.placement, placement),
  sign: node.part.cut ? (around.sign === 1 ? -1 : 1) : around.sign,
  factor: {
    basic: around.factor.basic * node.factor.basic,
    predicted: around.factor.predicted * node.factor.predicted,
  },
});

/** A leaf of the tree as it stands in the whole: one solid or body, override factors and cut signs worked in. */
export interface Leaf extends Standing {
  readonly path: string;
  readonly node: PartNode;
}

/** Visits every leaf in file order. */
export function* leavesOf(
  members: readonly Member[],
  prefix = '',
  around: Standing = AT_THE_TOP,
): Generator<Leaf> {
  for (const member of members)
    for (const one of standingsOf(member)) {
      const path = prefix + one.name;
      const here = inside(around, one);
      if (one.node.own) yield { path, node: one.node, ...here };
      yield* leavesOf(one.node.members, `${path}/`, here);
    }
}

const standingsOf = (member: Member | undefined): readonly (Member & { kind: 'one' })[] =>
  member === undefined ? [] : member.kind === 'copies' ? member.copies : [member];

/** A member found by path, and how its parent stands. */
export interface Found {
  readonly member: Member;
  readonly around: Standing;
}

/**
 * What stands at a path: `servo` is all copies as one member, `servo[2]` one of them, `servo/horn` the horns of every
 * copy. Nothing where the state has none.
 */
export function findMembers(members: readonly Member[], path: string): Found[] {
  const steps = path.split('/');
  const last = steps.pop()!;
  let here = [{ members, around: AT_THE_TOP }];
  for (const step of steps)
    here = here.flatMap(({ members: among, around }) =>
      standingsOf(memberNamed(among, step)).map((one) => ({
        members: one.node.members,
        around: inside(around, one),
      })),
    );
  return here.flatMap(({ members: among, around }) => {
    const member = memberNamed(among, last);
    return member ? [{ member, around }] : [];
  });
}

function memberNamed(members: readonly Member[], step: string): Member | undefined {
  const { name, copy } = readStep(step);
  const member = members.find((m) => m.name === name);
  if (copy === null || member?.kind !== 'copies') return copy === null ? member : undefined;
  return member.copies.find((c) => c.name === step);
}

/** The first copy that a path names and its part does not make, and how many it makes; null where there is none. */
export function missingCopy(
  members: readonly Member[],
  path: string,
): { readonly part: string; readonly count: number } | null {
  let here = members;
  let part = '';
  for (const step of path.split('/')) {
    const { name, copy } = readStep(step);
    const member = here.find((m) => m.name === name);
    if (!member) return null;
    part += part === '' ? name : `/${name}`;
    if (member.kind === 'copies' && copy !== null && copy > member.count)
      return { part, count: member.count };
    here = member.node.members;
  }
  return null;
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
