import { nearestName } from '../nearest-name.ts';
import type { PartModel } from './model.ts';

const COPY = /\[\d+\]$/;

/** Children of a part as paths name them: its own, or the top-level parts of the file it includes. */
const childrenOf = (part: PartModel): readonly PartModel[] =>
  part.shape.kind === 'include' ? part.shape.file.parts : part.parts;

/**
 * Finds a part by path (`boom/access hole`, `servo[2]`, `tailplane/spar`).
 *
 * @returns the part, or the first name that does not exist with the nearest known one
 */
export function findPart(
  parts: readonly PartModel[],
  path: string,
): { part: PartModel } | { unknown: string; nearest: string | undefined } {
  let here = parts;
  let found: PartModel | undefined;
  for (const segment of path.split('/')) {
    const name = segment.replace(COPY, '');
    const next = here.find((p) => p.name === name);
    const repeats = next && (next.placing.repeat.length > 0 || !COPY.test(segment));
    if (!next || !repeats)
      return {
        unknown: segment,
        nearest: nearestName(
          name,
          here.map((p) => p.name),
        ),
      };
    found = next;
    here = childrenOf(next);
  }
  return found ? { part: found } : { unknown: path, nearest: undefined };
}
