import type { Placement } from '../inertia/placement.ts';
import { compose, IN_PLACE } from '../inertia/placement.ts';
import { apply, determinant, multiply, orthonormalityError } from '../linalg/matrix3.ts';
import { IDENTITY, type Matrix3 } from '../linalg/symmetric3.ts';
import { cross, scale, subtract, type Vector3 } from '../linalg/vector3.ts';
import type { PlacingModel, RepeatModel, RotateStep } from '../model/model.ts';
import { mirrorIn, type Repeat, turnAbout, turnAboutVector } from './copies.ts';
import { evaluate, evaluateVector, faultAt, type Scope } from './scope.ts';

/** How far a given matrix or quaternion may be from a rotation: rounding in the digits people write. */
const ROTATION_TOLERANCE = 1e-6;

/**
 * A local point x lands at `at + R (x − anchor)`, then in the mirror where `image` is asked for.
 *
 * @param anchor in local axes [m]
 */
export function placementOf(placing: PlacingModel, anchor: Vector3, scope: Scope): Placement {
  const { at, rotate, image } = placing;
  if (!at && rotate.length === 0 && !image && anchor === ORIGIN) return IN_PLACE;
  const turn = turnOf(rotate, scope);
  const to = at ? evaluateVector(at, scope) : ORIGIN;
  const placed: Placement = { turn, offset: anchor === ORIGIN ? to : subtract(to, apply(turn, anchor)) };
  return image ? compose(mirrorIn(image), placed) : placed;
}

export const ORIGIN: Vector3 = [0, 0, 0];

/** The steps in order about the parent's fixed axes: each new one multiplies from the left. */
export function turnOf(steps: readonly RotateStep[], scope: Scope): Matrix3 {
  let turn = IDENTITY;
  for (const step of steps) {
    const next = matrixOf(step, scope);
    turn = turn === IDENTITY ? next : multiply(next, turn);
  }
  return turn;
}

function matrixOf(step: RotateStep, scope: Scope): Matrix3 {
  if (step.kind === 'axis') return turnAbout(step.axis, evaluate(step.angle, scope));
  if (step.kind === 'vector') {
    const axis = evaluateVector(step.axis, scope);
    if (axis.every((x) => x === 0)) {
      faultAt(scope, step.where, {
        code: 'ROTATION_NO_AXIS',
        message: 'expected an axis of some length, found [0, 0, 0]',
        hint: 'write the direction that the part turns about, for instance [0, 0, 1]',
      });
      return IDENTITY;
    }
    return turnAboutVector(axis, evaluate(step.angle, scope));
  }
  if (step.kind === 'quaternion')
    return fromQuaternion(
      step.items.map((q) => evaluate(q, scope)),
      step,
      scope,
    );
  const rows = step.rows.map((row) => evaluateVector(row, scope)) as unknown as Matrix3;
  return checkedRotation(rows, step, scope);
}

function fromQuaternion(
  q: readonly number[],
  step: RotateStep & { kind: 'quaternion' },
  scope: Scope,
): Matrix3 {
  const n = Math.sqrt(q.reduce((s, x) => s + x * x, 0));
  if (!(Math.abs(n - 1) <= ROTATION_TOLERANCE)) {
    faultAt(scope, step.where, {
      code: 'ROTATION_QUATERNION',
      message: `expected a quaternion of length 1 to within 1e-6, found length ${Number(n.toPrecision(9))}`,
      hint: 'the order is [w, x, y, z]; divide each by the length',
    });
    return IDENTITY;
  }
  const [w, x, y, z] = q.map((v) => v / n) as [number, number, number, number];
  return [
    [1 - 2 * (y * y + z * z), 2 * (x * y - w * z), 2 * (x * z + w * y)],
    [2 * (x * y + w * z), 1 - 2 * (x * x + z * z), 2 * (y * z - w * x)],
    [2 * (x * z - w * y), 2 * (y * z + w * x), 1 - 2 * (x * x + y * y)],
  ];
}

/** A matrix within tolerance of a rotation, brought onto it: rounding in its digits must not scale a tensor. */
function checkedRotation(m: Matrix3, step: RotateStep & { kind: 'matrix' }, scope: Scope): Matrix3 {
  const error = orthonormalityError(m);
  const det = determinant(m);
  if (!(error <= 2 * ROTATION_TOLERANCE) || det < 0) {
    const mirror = det < 0 && error <= 2 * ROTATION_TOLERANCE;
    faultAt(scope, step.where, {
      code: 'ROTATION_MATRIX',
      message: mirror
        ? 'expected a rotation, found a mirror image (determinant −1)'
        : `expected a rotation, whose rows are unit and square to each other to within 1e-6, found one off by ${error.toExponential(2)}`,
      hint: mirror
        ? 'use `image: xz` for the mirrored part'
        : 'write more digits, or `rotate` steps about axes; the matrix takes local to parent, its columns are the local axes',
    });
    return IDENTITY;
  }
  return error <= 4 * Number.EPSILON ? m : nearestRotation(m);
}

/** Newton's iteration for the orthogonal polar factor (Higham 1986): X ← (X + X⁻ᵀ) / 2, quadratic from so near. */
function nearestRotation(m: Matrix3): Matrix3 {
  let x = m;
  for (let i = 0; i < 3; i++) {
    const t = inverseTransposed(x);
    x = x.map((row, r) => row.map((v, c) => (v + t[r]![c]!) / 2)) as unknown as Matrix3;
  }
  return x;
}

function inverseTransposed(m: Matrix3): Matrix3 {
  const k = 1 / determinant(m);
  const [a, b, c] = m;
  return [scale(cross(b, c), k), scale(cross(c, a), k), scale(cross(a, b), k)];
}

const COPIES_AT_MOST = 100_000;

export function repeatsOf(models: readonly RepeatModel[], scope: Scope): Repeat[] {
  let total = 1;
  return models.map((model): Repeat => {
    if (model.kind === 'mirror') {
      total *= 2;
      return model;
    }
    const count = evaluate(model.count, scope);
    total *= count;
    if (!(Number.isInteger(count) && count >= 1 && total <= COPIES_AT_MOST)) {
      faultAt(scope, model.count.where, {
        code: 'REPEAT_COUNT',
        message: `expected a whole number of copies from 1 to ${COPIES_AT_MOST} (all repeats of a part together), found ${count}`,
        hint: '`count` includes the original',
      });
      scope.run.faults.check();
    }
    if (model.kind === 'line') return { kind: 'line', count, step: evaluateVector(model.step, scope) };
    return {
      kind: 'ring',
      count,
      axis: model.axis,
      through: model.through ? evaluateVector(model.through, scope) : ORIGIN,
      angle: model.angle ? evaluate(model.angle, scope) : 2 * Math.PI,
    };
  });
}

/** A frame's axes in body axes: the columns of its turn. */
export const frameOf = (
  frame: { at: Parameters<typeof evaluateVector>[0]; rotate: readonly RotateStep[] },
  scope: Scope,
): Placement => ({ turn: turnOf(frame.rotate, scope), offset: evaluateVector(frame.at, scope) });
