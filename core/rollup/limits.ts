import { type Moments, netBody } from '../inertia/balance-sum.ts';
import type { Body } from '../inertia/body.ts';
import { merge, subtractBody } from '../inertia/merge.ts';
import type { Placement } from '../inertia/placement.ts';
import { bodyInFrame, QUANTITIES, quantityVector } from '../inertia/quantities.ts';
import type { LimitModel } from '../model/model.ts';
import { isAtOrBelow } from '../model/part-paths.ts';
import { onBoth, placeMoments, scaleMoments, sumAndClose, turnToCut } from './both-moments.ts';
import { leafBody } from './leaf-body.ts';
import { frameOf } from './placing.ts';
import type { RollUp } from './roll-up.ts';
import { evaluate, type Scope } from './scope.ts';
import { type Both, type Found, findMembers, type Leaf, netMasses } from './tree.ts';

/** A limit judged in one state; SI. */
export interface JudgedLimit {
  readonly limit: LimitModel;
  readonly on: 'basic' | 'predicted';
  /** Null where the quantity has no value: no mass, or a part absent in this state. */
  readonly values: { readonly basic: number | null; readonly predicted: number | null };
  readonly value: number | null;
  readonly min: number | null;
  readonly max: number | null;
  readonly nearest: 'min' | 'max';
  readonly margin: number | null;
  readonly marginOfLimit: number | null;
  readonly verdict: 'within' | 'outside';
  readonly heaviest: readonly { readonly leaf: Leaf; readonly value: number }[];
}

/**
 * Judges the limits of the top file that apply in this state. Margin is the distance to the nearest stop, negative
 * outside. A quantity without a value is outside: what cannot be shown to hold is not held.
 */
export function judgeLimits(roll: RollUp): JudgedLimit[] {
  const { scope } = roll;
  return scope.file.limits
    .filter((limit) => !limit.states || limit.states.includes(roll.state))
    .map((limit) => judge(limit, roll, scope));
}

function judge(limit: LimitModel, roll: RollUp, scope: Scope): JudgedLimit {
  const target = targetOf(limit, roll);
  const frame = frameNamed(limit.frame, scope);
  const vectors = onBodies(target, (body, mass) => quantityVector(body && inFrame(frame, body), mass));
  const valueOn = (on: 'basic' | 'predicted') => limitValue(limit, vectors, on, scope);
  const values = { basic: valueOn('basic'), predicted: valueOn('predicted') };
  const on = limit.on ?? (scope.growth ? 'predicted' : 'basic');
  const value = values[on];
  const min = limit.min && evaluate(limit.min, scope);
  const max = limit.max && evaluate(limit.max, scope);
  const { nearest, margin } = marginOf(value, min, max);
  const stop = nearest === 'min' ? min! : max!;
  const outside = margin === null || margin < 0;
  return {
    limit,
    on,
    values,
    value,
    min,
    max,
    nearest,
    margin,
    marginOfLimit: margin === null || stop === 0 ? null : margin / Math.abs(stop),
    verdict: outside ? 'outside' : 'within',
    heaviest: outside && value !== null ? heaviestIn(limit, on, vectors, target, frame, roll, nearest) : [],
  };
}

/** Distance to the nearer stop, negative outside. */
export function marginOf(
  value: number | null,
  min: number | null,
  max: number | null,
): { nearest: 'min' | 'max'; margin: number | null } {
  if (value === null) return { nearest: max === null ? 'min' : 'max', margin: null };
  const below = min === null ? Number.POSITIVE_INFINITY : value - min;
  const above = max === null ? Number.POSITIVE_INFINITY : max - value;
  return below < above ? { nearest: 'min', margin: below } : { nearest: 'max', margin: above };
}

interface Target {
  readonly bodies: Both<Body | null>;
  readonly masses: Both<number>;
  /** Those in it, with their sign in it; worked out for broken limits alone. */
  leaves(): readonly Leaf[];
}

/**
 * What a limit weighs: the whole, or the part or group of its `of`, in body axes. A part that this state leaves out
 * weighs nothing, and has no centre or tensor.
 */
function targetOf(limit: LimitModel, roll: RollUp): Target {
  if (limit.of === null)
    return { bodies: roll.total, masses: netMasses(roll.moments), leaves: () => roll.leaves };
  return (
    targetAt(limit.of, roll) ?? {
      bodies: { basic: null, predicted: null },
      masses: { basic: 0, predicted: 0 },
      leaves: () => [],
    }
  );
}

/**
 * The own numbers of what stands at a path (a part, a group, copies together), in body axes; null where this state has
 * none there. Asked for by name, a cut-out's numbers are those of what is cut away.
 */
export function targetAt(path: string, roll: RollUp): Target | null {
  const found = findMembers(roll.members, path);
  if (found.length === 0) return null;
  // All that stands at one path is one part of the file, so a cut-out is one in every standing.
  const { member, around } = found[0]!;
  const { cut } = member.node.part;
  const sum = sumAndClose(found.map(momentsInBodyAxes));
  const moments = cut ? onBoth(sum, turnToCut) : sum;
  const flips = cut === (around.sign === 1);
  const leaves = () =>
    roll.leaves
      .filter((leaf) => isAtOrBelow(leaf.path, path))
      .map((leaf): Leaf => (flips ? { ...leaf, sign: leaf.sign === 1 ? -1 : 1 } : leaf));
  return { bodies: onBoth(moments, netBody), masses: netMasses(moments), leaves };
}

const momentsInBodyAxes = ({ member: { moments }, around: { factor, placement } }: Found): Both<Moments> =>
  placeMoments(placement, {
    basic: scaleMoments(moments.basic, factor.basic),
    predicted: scaleMoments(moments.predicted, factor.predicted),
  });

export function frameNamed(name: string | null, scope: Scope): Placement | null {
  const frame = name === null ? undefined : scope.file.frames.find((f) => f.name === name);
  return frame ? frameOf(frame, scope) : null;
}

const inFrame = (frame: Placement | null, body: Body): Body => (frame ? bodyInFrame(frame, body) : body);

function onBodies<R>(
  target: Pick<Target, 'bodies' | 'masses'>,
  make: (body: Body | null, mass: number) => R,
): Both<R> {
  const basic = make(target.bodies.basic, target.masses.basic);
  return {
    basic,
    predicted:
      target.bodies.predicted === target.bodies.basic
        ? basic
        : make(target.bodies.predicted, target.masses.predicted),
  };
}

/** Fills the vector of a limit's symbols (`limitLookup` in core/model): judged, basic, predicted, parameters. */
function limitValue(
  limit: LimitModel,
  vectors: Both<Float64Array>,
  on: 'basic' | 'predicted',
  scope: Scope,
): number | null {
  const n = QUANTITIES.length;
  const symbols = new Float64Array(3 * n + scope.values.length);
  symbols.set(vectors[on], 0);
  symbols.set(vectors.basic, n);
  symbols.set(vectors.predicted, 2 * n);
  symbols.set(scope.values, 3 * n);
  const value = limit.quantity.expression.evaluate(symbols);
  return Number.isFinite(value) ? value + 0 : null;
}

const NAMED_AT_MOST = 5;

/**
 * The parts that push a broken limit outward most: by how far the value would move back if the part were not there.
 * Exact for any expression; nothing is made of a part whose removal leaves no mass.
 */
function heaviestIn(
  limit: LimitModel,
  on: 'basic' | 'predicted',
  vectors: Both<Float64Array>,
  target: Target,
  frame: Placement | null,
  roll: RollUp,
  nearest: 'min' | 'max',
): { leaf: Leaf; value: number }[] {
  const value = limitValue(limit, vectors, on, roll.scope)!;
  const moved = target.leaves().flatMap((leaf) => {
    const without = onBodies(
      {
        bodies: {
          basic: withoutLeaf(target.bodies.basic, leaf, 'basic'),
          predicted: withoutLeaf(target.bodies.predicted, leaf, 'predicted'),
        },
        masses: target.masses,
      },
      (body, mass) => quantityVector(body && inFrame(frame, body), body?.mass ?? mass),
    );
    const rest = limitValue(limit, without, on, roll.scope);
    return rest === null ? [] : [{ leaf, value: value - rest }];
  });
  const outward = nearest === 'max' ? 1 : -1;
  return moved
    .filter((m) => m.value * outward > 0)
    .sort((a, b) => (b.value - a.value) * outward)
    .slice(0, NAMED_AT_MOST);
}

function withoutLeaf(body: Body | null, leaf: Leaf, on: 'basic' | 'predicted'): Body | null {
  if (!body) return null;
  const part = leafBody(leaf, on);
  if (leaf.sign < 0) return merge(body, part);
  return body.mass - part.mass > 1e-12 * body.mass ? subtractBody(body, part) : null;
}
