import { nearestName } from '../nearest-name.ts';
import type { PartModel } from './model.ts';

const COPY = /^(.+)\[([1-9]\d*)\]$/;

/** A step of a path taken apart: `servo[2]` is copy 2 of `servo`; null where no copy is picked. */
export function readStep(step: string): { name: string; copy: number | null } {
  const [, name, copy] = COPY.exec(step) ?? [];
  return name === undefined ? { name: step, copy: null } : { name, copy: Number(copy) };
}

/** Whether a path is at another, below it, or what that means by leaving copies open: `servo[1]/horn` is at `servo/horn`. */
export function isAtOrBelow(path: string, root: string): boolean {
  const steps = path.split('/');
  return root.split('/').every((wanted, i) => {
    const step = steps[i];
    return step !== undefined && (step === wanted || readStep(step).name === wanted);
  });
}

/** Children of a part as paths name them: its own, or the top-level parts of the file it includes. */
const childrenOf = (part: PartModel): readonly PartModel[] =>
  part.shape.kind === 'include' ? part.shape.file.parts : part.parts;

/** A part on the way to one inside it, and the copy that the path picks of it. */
export interface Step {
  readonly part: PartModel;
  readonly copy: number | null;
}

/**
 * Finds a part by path (`boom/access hole`, `servo[2]`, `tailplane/spar`).
 *
 * @returns the part and the way to it, or the first name that does not exist with the nearest known one
 */
export function findPart(
  parts: readonly PartModel[],
  path: string,
): { part: PartModel; way: readonly Step[] } | { unknown: string; nearest: string | undefined } {
  let here = parts;
  const way: Step[] = [];
  for (const step of path.split('/')) {
    const { name, copy } = readStep(step);
    const next = here.find((p) => p.name === name);
    if (!next || (copy !== null && next.placing.repeat.length === 0))
      return {
        unknown: step,
        nearest: nearestName(
          name,
          here.map((p) => p.name),
        ),
      };
    way.push({ part: next, copy });
    here = childrenOf(next);
  }
  return { part: way.at(-1)!.part, way };
}
