import { IN_PLACE, type Placement } from '../inertia/placement.ts';
import { transpose } from '../linalg/matrix3.ts';
import { IDENTITY, type Matrix3 } from '../linalg/symmetric3.ts';
import type { GivenTensor } from '../rollup/given-tensor.ts';
import type { Step } from './sentence.ts';

/** A way to lay both tensors into one set of axes. */
export interface Framing {
  /** The axes of a's numbers in the common ones. */
  readonly a: Placement;
  readonly b: Placement;
  /** The slip that this way supposes; none where it takes both at their word. */
  readonly steps: readonly Step[];
}

const turned = (turn: Matrix3): Placement => ({ turn, offset: IN_PLACE.offset });
const step = (words: string): Step[] => [{ kind: 'turn', words }];
const TRANSPOSED = step('turned by the transpose of its rotation');
const LEFT_OUT = step('not turned by its rotation');

/**
 * The ways to bring two tensors into common axes, the one that takes both at their word first. A part beside an assembly
 * goes where the assembly puts it; any other two stand in the axes they are written in. Where a rotation is known, its
 * transpose and its absence are slips to be tried.
 */
export function framingsOf({ axes: a }: GivenTensor, { axes: b }: GivenTensor): Framing[] {
  if (typeof a !== 'string' && b === 'assembly')
    return placedAndSlips(a, (placement, steps) => ({ a: placement, b: IN_PLACE, steps }));
  if (typeof b !== 'string' && a === 'assembly')
    return placedAndSlips(b, (placement, steps) => ({ a: IN_PLACE, b: placement, steps }));
  const asWritten: Framing = { a: IN_PLACE, b: IN_PLACE, steps: [] };
  if (typeof a !== 'string' && isTurned(a)) {
    const slips: Framing[] = [
      { a: turned(a.turn), b: IN_PLACE, steps: step('turned by its rotation') },
      { a: turned(transpose(a.turn)), b: IN_PLACE, steps: TRANSPOSED },
    ];
    return [asWritten, ...slips];
  }
  if (typeof b === 'string' || !isTurned(b)) return [asWritten];
  return [
    asWritten,
    { a: IN_PLACE, b: turned(b.turn), steps: LEFT_OUT },
    { a: IN_PLACE, b: turned(transpose(b.turn)), steps: TRANSPOSED },
  ];
}

function placedAndSlips(
  part: Placement,
  frame: (placement: Placement, steps: readonly Step[]) => Framing,
): Framing[] {
  const placed = frame(part, []);
  if (!isTurned(part)) return [placed];
  return [
    placed,
    frame({ ...part, turn: transpose(part.turn) }, TRANSPOSED),
    frame({ ...part, turn: IDENTITY }, LEFT_OUT),
  ];
}

const isTurned = ({ turn }: Placement): boolean =>
  turn.some((row, r) => row.some((x, k) => x !== (r === k ? 1 : 0)));
