import { type Moments, netBody, netMass } from '../inertia/balance-sum.ts';
import { type Body, scaleBody } from '../inertia/body.ts';
import { compose } from '../inertia/placement.ts';
import { judgeBody } from '../inertia/possibility.ts';
import type { FileModel, PartModel } from '../model/model.ts';
import type { Where } from '../model/where.ts';
import { formatQuantity, MASS, unitFor } from '../units/index.ts';
import { onBoth, placeMoments, scaleMoments, sumAndClose, turnToCut } from './both-moments.ts';
import { checkCopies, omittedIn } from './check-copies.ts';
import { copiesOf } from './copies.ts';
import { warnIfCutLeavesHost } from './cut-extent.ts';
import { growthOf, growthTablesOf } from './growth.ts';
import { ownBody } from './own-body.ts';
import { fillParameters } from './parameter-values.ts';
import { ORIGIN, placementOf, repeatsOf } from './placing.ts';
import { refuseTooLarge, refuseTooLargeMoments } from './refuse-too-large.ts';
import { evaluate, faultAt, type Scope } from './scope.ts';
import type { Both, Member, PartNode } from './tree.ts';
import { impossible } from './vendor-body.ts';

/** What goes down from a part to its children. */
interface Inherited {
  readonly maturity: string | null;
  readonly category: string | null;
  readonly basis: string | null;
  /** Density of the nearest solid around, for cuts [kg/m³]. */
  readonly hostDensity: number | null;
}

export const NOTHING_INHERITED: Inherited = {
  maturity: null,
  category: null,
  basis: null,
  hostDensity: null,
};

/** Evaluates parts that stand side by side; those that the state leaves out are absent. */
export function membersOf(
  parts: readonly PartModel[],
  prefix: string,
  inherited: Inherited,
  scope: Scope,
): Member[] {
  return parts.flatMap((part) => memberOf(part, prefix, inherited, scope) ?? []);
}

function memberOf(part: PartModel, prefix: string, inherited: Inherited, scope: Scope): Member | null {
  const path = prefix + part.name;
  if (part.states && !part.states.includes(scope.state.name)) return null;
  if (scope.omit.has(path)) return null;
  const node = nodeOf(part, path, inherited, scope);
  if (!node) return null;
  const anchor = part.placing.anchor === 'centroid' ? (node.own?.body.centre ?? ORIGIN) : ORIGIN;
  const placement = placementOf(part.placing, anchor, scope);
  const placed = placeMoments(placement, node.moments);
  refuseTooLargeMoments(placed, path, part.where, scope);
  if (part.placing.repeat.length === 0)
    return { kind: 'one', name: part.name, node, placement, moments: placed };
  const standings = copiesOf(repeatsOf(part.placing.repeat, scope));
  const copies = standings.flatMap((copy, i) => {
    const name = `${part.name}[${i + 1}]`;
    if (scope.omit.has(prefix + name)) return [];
    const moments = placeMoments(copy, placed);
    refuseTooLargeMoments(moments, prefix + name, part.where, scope);
    return { kind: 'one' as const, name, node, placement: compose(copy, placement), moments };
  });
  return {
    kind: 'copies',
    name: part.name,
    node,
    count: standings.length,
    copies,
    moments: sumAndClose(copies.map((c) => c.moments)),
  };
}

function nodeOf(part: PartModel, path: string, inherited: Inherited, scope: Scope): PartNode | null {
  const maturity = part.maturity ?? inherited.maturity;
  const category = part.category ?? inherited.category;
  const basis = part.basis ?? inherited.basis;
  const own = ownBody(part, part.cut ? inherited.hostDensity : null, scope);
  const ownExpected = part.shape.kind !== 'group' && part.shape.kind !== 'include';
  if (ownExpected && !own) return null;
  if (own) refuseTooLarge(own.body, path, part.where, scope);
  const attributes = { maturity, category, basis };
  const growth = own || part.override ? growthOf(part, path, attributes, own !== null, scope) : 0;
  const hostDensity =
    own?.density ?? part.density?.expression.evaluate(scope.values) ?? inherited.hostDensity;
  const members =
    part.shape.kind === 'include'
      ? includedMembers(part, part.shape, path, attributes, scope)
      : membersOf(part.parts, `${path}/`, { ...attributes, hostDensity }, scope);
  const items: Both<Moments>[] = members.map((m) => m.moments);
  if (own) items.unshift(ownMoments(own.body, growth));
  const sum = items.length === 1 ? items[0]! : sumAndClose(items);
  warnIfCutLeavesHost(own, members, scope);
  const override = overrideOf(part, path, sum, growth, scope);
  const factor = override?.factor ?? { basic: 1, predicted: 1 };
  const scaled =
    factor.basic === 1 && factor.predicted === 1
      ? sum
      : {
          basic: scaleMoments(sum.basic, factor.basic),
          predicted: scaleMoments(sum.predicted, factor.predicted),
        };
  refuseTooLargeMoments(scaled, path, part.where, scope);
  const ownSlack = own?.slack ?? 0;
  const node: PartNode = {
    part,
    scope,
    ...attributes,
    growth,
    own,
    members,
    factor,
    leaves: leavesIn(part, path, own !== null, members, scope),
    slack: {
      basic: factor.basic * (ownSlack + slackOf(members, 'basic')),
      predicted: factor.predicted * (ownSlack * (1 + growth) + slackOf(members, 'predicted')),
    },
    moments: part.cut ? onBoth(scaled, turnToCut) : scaled,
    overridden: override?.overridden ?? null,
  };
  if (members.length > 0) judgeGroup(node, path, scaled, scope);
  return node;
}

function ownMoments(body: Body, growth: number): Both<Moments> {
  const basic = { material: body, cut: null };
  return { basic, predicted: growth === 0 ? basic : { material: scaleBody(body, 1 + growth), cut: null } };
}

/** More parts than this, copies and includes counted, are a slip or a bomb, not a machine. */
const LEAVES_AT_MOST = 100_000;

function leavesIn(
  part: PartModel,
  path: string,
  hasOwn: boolean,
  members: readonly Member[],
  scope: Scope,
): number {
  const leaves = Number(hasOwn) + sumOf(members, leavesOf);
  refuseTooMany(part.where, path, leaves, scope);
  return leaves;
}

const leavesOf = (member: Member): number =>
  member.kind === 'one' ? member.node.leaves : member.copies.length * member.node.leaves;

const sumOf = (members: readonly Member[], of: (member: Member) => number) =>
  members.reduce((sum, member) => sum + of(member), 0);

/** Checks what stands at the top of a file as well, before anything walks every leaf; blames the largest. */
export function refuseTooManyAtTop(members: readonly Member[], scope: Scope): void {
  const leaves = sumOf(members, leavesOf);
  if (leaves <= LEAVES_AT_MOST) return;
  const largest = members.reduce((a, b) => (leavesOf(b) > leavesOf(a) ? b : a));
  refuseTooMany(largest.node.part.where, largest.name, leaves, scope);
}

function refuseTooMany(where: Where, path: string, leaves: number, scope: Scope): void {
  if (leaves <= LEAVES_AT_MOST) return;
  faultAt(scope, where, {
    code: 'ASSEMBLY_TOO_LARGE',
    message: `expected at most ${LEAVES_AT_MOST} parts, copies and includes counted, found ${leaves}, most of them in '${path}'`,
    hint: 'look for repeats inside repeats and files that include one another twice at every level; give what is alike as one body',
  });
  scope.run.faults.check();
}

/** What rounding is granted to the bought items of some members together [kg·m²]. */
export const slackOf = (members: readonly Member[], on: keyof Both<number>): number =>
  members.reduce((sum, m) => sum + m.node.slack[on] * (m.kind === 'one' ? 1 : m.copies.length), 0);

/** An override scales the net of children and cuts to the new mass, the centre kept. */
function overrideOf(part: PartModel, path: string, sum: Both<Moments>, growth: number, scope: Scope) {
  if (!part.override) return null;
  const { basic } = sum;
  const from = netMass(basic);
  const to = evaluate(part.override.mass, scope);
  const before = netMass(sum.predicted);
  if (!(from > 0) || !(before > 0) || !(to > 0)) {
    const say = (m: number) => formatQuantity(Number(m.toPrecision(12)), unitFor(MASS, scope.file.units));
    faultAt(scope, part.override.where, {
      code: 'OVERRIDE_NOT_POSITIVE',
      message:
        to > 0
          ? `expected '${path}' to have a mass above zero that an override can scale, found ${say(from)}${from > 0 ? `, and ${say(before)} with growth allowance` : ''}`
          : `expected an override to a mass above zero, found ${say(to)}`,
      hint:
        to > 0 ? 'give the parts masses first' : 'to leave the part out of a state, use `omit` or `states`',
    });
    return null;
  }
  const predicted = part.maturity !== null ? to * (1 + growth) : to * (before / from);
  return {
    factor: { basic: to / from, predicted: predicted / before },
    overridden: { from, to },
  };
}

function judgeGroup(node: PartNode, path: string, moments: Both<Moments>, scope: Scope): void {
  judgeNet(onBoth(moments, netBody), node.slack, path, node.part.where, scope);
}

/** Whether a body can have what is left of a group, as basic masses and with growth allowance; the first that fails. */
export function judgeNet(
  bodies: Both<Body | null>,
  slack: Both<number>,
  path: string,
  where: Where | null,
  scope: Scope,
): void {
  for (const on of bodies.predicted === bodies.basic ? BASIC : BASIC_AND_PREDICTED) {
    const body = bodies[on];
    const possibility = body && judgeBody(body, slack[on]);
    if (!possibility || possibility.possible) continue;
    faultAt(scope, where, {
      code: 'ASSEMBLY_IMPOSSIBLE',
      message: impossible(on === 'basic' ? path : `${path} with growth allowance`, possibility, scope),
      hint:
        on === 'basic'
          ? 'a cut-out takes away more than is there: see that each lies wholly in the material of its host'
          : 'a cut-out grows by more than its host does: give both one maturity and category',
    });
    return;
  }
}

const BASIC = ['basic'] as const;
const BASIC_AND_PREDICTED = ['basic', 'predicted'] as const;

/** The scope of a file that a part includes: its parameters as the part sets them, its state as the part chooses it. */
export function includedScope(
  part: PartModel,
  shape: PartModel['shape'] & { kind: 'include' },
  path: string,
  scope: Scope,
): Scope {
  const set = new Map([...shape.with].map(([slot, quantity]) => [slot, evaluate(quantity, scope)]));
  return openScope(shape.file, includedState(part, shape, scope), set, scope.run, path, scope);
}

/** The parts of an included file, evaluated in a scope of its own. */
function includedMembers(
  part: PartModel,
  shape: PartModel['shape'] & { kind: 'include' },
  path: string,
  attributes: Omit<Inherited, 'hostDensity'>,
  scope: Scope,
): Member[] {
  const inner = includedScope(part, shape, path, scope);
  const members = membersOf(shape.file.parts, '', { ...attributes, hostDensity: null }, inner);
  checkCopies(omittedIn(inner), members, inner);
  return members;
}

function includedState(
  part: PartModel,
  shape: PartModel['shape'] & { kind: 'include' },
  scope: Scope,
): string {
  const { file, state } = shape;
  const named = typeof state === 'string' ? state : state?.get(scope.state.name);
  if (named !== undefined) return named;
  const same = file.states.find((s) => s.name === scope.state.name);
  if (same) return same.name;
  if (file.states.length === 1) return file.states[0]!.name;
  faultAt(scope, shape.where, {
    code: 'INCLUDE_STATE_MISSING',
    message: `expected a state of ${file.path} for '${part.name}' in state '${scope.state.name}', found none named`,
    hint: `add \`state: { ${scope.state.name}: ${file.states[0]!.name} }\`; it has ${file.states.map((s) => s.name).join(', ')}`,
  });
  scope.run.faults.check();
  return file.states[0]!.name;
}

/**
 * A scope for one file at one state, its parameters and growth allowances evaluated.
 *
 * @param path of the part that includes the file, in the outer scope's file; empty for the top file
 */
export function openScope(
  file: FileModel,
  stateName: string,
  set: ReadonlyMap<number, number>,
  run: Scope['run'],
  path: string,
  outer: Scope | null,
): Scope {
  const state = file.states.find((s) => s.name === stateName)!;
  const values = new Float64Array(file.parameters.length);
  const below = `${path}/`;
  const fromOuter = [...(outer?.omit ?? [])]
    .filter((p) => p.startsWith(below))
    .map((p) => p.slice(below.length));
  const bare: Scope = {
    run,
    file,
    state,
    values,
    growth: outer?.growth ?? null,
    omit: new Set([...state.omit, ...fromOuter]),
    prefix: outer ? `${outer.prefix}${below}` : '',
  };
  fillParameters(bare, set);
  return file.growth ? { ...bare, growth: growthTablesOf(file.growth, bare) } : bare;
}
