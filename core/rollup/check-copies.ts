import { type Where, within } from '../model/where.ts';
import { faultAt, type Scope } from './scope.ts';
import { type Member, missingCopy } from './tree.ts';

/** A path as the file of a scope writes it somewhere. */
export interface NamedPath {
  readonly path: string;
  readonly where: Where;
}

/** The paths that the state of a scope leaves out, as its own file names them. */
export const omittedIn = ({ state }: Scope): NamedPath[] =>
  state.omit.map((path, i) => ({ path, where: within(within(state.where, 'omit'), i) }));

/** The paths that limits judge in the state of a scope. */
export const judgedIn = ({ file, state }: Scope): NamedPath[] =>
  file.limits.flatMap(({ of, states, where }) =>
    of === null || (states && !states.includes(state.name)) ? [] : [{ path: of, where: within(where, 'of') }],
  );

/** Copies are known when the tree stands: one that is named and that its part does not make is a slip. */
export function checkCopies(named: readonly NamedPath[], members: readonly Member[], scope: Scope): void {
  for (const { path, where } of named) {
    const missing = missingCopy(members, path);
    if (missing)
      faultAt(scope, where, {
        code: 'MODEL_UNKNOWN_PART',
        message: `expected a copy from ${missing.part}[1] to ${missing.part}[${missing.count}], found '${path}'`,
        hint: 'copies are counted from 1, the original first',
      });
  }
}
