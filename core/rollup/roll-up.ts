import { FaultList, InputError, type Warning } from '../errors.ts';
import { type Moments, netMass } from '../inertia/balance-sum.ts';
import type { Body } from '../inertia/body.ts';
import type { Project } from '../model/read-project.ts';
import { nearestName } from '../nearest-name.ts';
import { sumAndClose } from './both-moments.ts';
import { checkCopies, judgedIn, omittedIn } from './check-copies.ts';
import { warnIfCutLeavesHost } from './cut-extent.ts';
import {
  judgeNet,
  membersOf,
  NOTHING_INHERITED,
  openScope,
  refuseTooManyAtTop,
  slackOf,
} from './part-tree.ts';
import { frameOf } from './placing.ts';
import { refuseTooLong } from './refuse-too-large.ts';
import { faultAt, type Run, type Scope } from './scope.ts';
import { type Both, type Leaf, leavesOf, type Member, netBodies } from './tree.ts';
import { gyrationWarnings } from './warn-gyration.ts';

/** One assembly in one state, rolled up. */
export interface RollUp {
  readonly project: Project;
  readonly state: string;
  readonly scope: Scope;
  readonly members: readonly Member[];
  readonly leaves: readonly Leaf[];
  readonly moments: Both<Moments>;
  /** The whole, in body axes. */
  readonly total: Both<Body>;
  readonly warnings: readonly Warning[];
  readonly meshInputs: ReadonlyMap<string, { sha256: string; bytes: number }>;
}

export interface RollUpOptions {
  readonly state: string;
  /** Values from outside for the top file's parameters, by slot [SI]. */
  readonly set?: ReadonlyMap<number, number>;
  /** Meshes read by an earlier roll-up of the same source, to be used again. */
  readonly meshes?: Run['meshes'];
  readonly meshInputs?: Run['meshInputs'];
}

/**
 * Rolls an assembly up in one state.
 *
 * @throws InputError with every fault of the parts: impossible solids and tensors, masses, rotations, meshes
 */
export function rollUp(project: Project, options: RollUpOptions): RollUp {
  const { root, source } = project;
  checkState(project, options.state);
  const run = newRun(source, options);
  const scope = openScope(root, options.state, options.set ?? new Map(), run, '', null);
  run.faults.check();
  const members = membersOf(root.parts, '', NOTHING_INHERITED, scope);
  for (const frame of root.frames)
    refuseTooLong(frameOf(frame, scope).offset, frame.name, frame.where, scope);
  checkCopies([...omittedIn(scope), ...judgedIn(scope)], members, scope);
  run.faults.check();
  refuseTooManyAtTop(members, scope);
  warnIfCutLeavesHost(null, members, scope);
  const moments = members.length > 0 ? sumAndClose(members.map((m) => m.moments)) : EMPTY;
  const total = netBodies(moments);
  if (!total.basic || !total.predicted) {
    const [found, which] = total.basic
      ? [netMass(moments.predicted), ' with growth allowance']
      : [netMass(moments.basic), ''];
    faultAt(scope, null, {
      code: 'ASSEMBLY_NO_MASS',
      message: `expected a total mass above zero in state '${options.state}', found ${found} kg${which}`,
      hint: 'the cut-outs may weigh as much as the material, or every part be left out of this state',
    });
    run.faults.check();
  }
  const slack = { basic: slackOf(members, 'basic'), predicted: slackOf(members, 'predicted') };
  judgeNet(total, slack, 'the whole', null, scope);
  run.faults.check();
  warnWithoutMaturity(run);
  const leaves = [...leavesOf(members)];
  run.warnings.push(...gyrationWarnings(leaves));
  return {
    project,
    state: options.state,
    scope,
    members,
    leaves,
    moments,
    total: total as Both<Body>,
    warnings: run.warnings,
    meshInputs: run.meshInputs,
  };
}

/** A run that has gathered nothing yet. */
export const newRun = (
  source: Run['source'],
  { meshes = new Map(), meshInputs = new Map() }: Pick<RollUpOptions, 'meshes' | 'meshInputs'>,
): Run => ({ source, faults: new FaultList(), warnings: [], meshes, meshInputs, withoutMaturity: [] });

const EMPTY: Both<Moments> = {
  basic: { material: null, cut: null },
  predicted: { material: null, cut: null },
};

/** @throws InputError MODEL_UNKNOWN_STATE */
export function checkState(project: Project, state: string): void {
  const names = project.root.states.map((s) => s.name);
  if (names.includes(state)) return;
  const nearest = nearestName(state, names);
  throw new InputError([
    {
      code: 'MODEL_UNKNOWN_STATE',
      message: `expected a state of ${project.root.path}, found '${state}'`,
      hint: nearest ? `did you mean '${nearest}'?` : `known: ${names.join(', ')}`,
    },
  ]);
}

const NAMED_AT_MOST = 3;

/** One warning for all parts that a growth table cannot judge, so that a large file is not flooded. */
function warnWithoutMaturity(run: Run): void {
  const list = run.withoutMaturity;
  if (list.length === 0) return;
  const named = list.slice(0, NAMED_AT_MOST).map((p) => p.path);
  const more = list.length - named.length;
  run.warnings.push({
    code: 'GROWTH_NO_MATURITY',
    message: `no maturity, so no growth allowance (0 %), on ${named.join(', ')}${more > 0 ? ` and ${more} more` : ''}`,
    at: list[0]!.at,
  });
}
