import { type Body, secondMomentsFromInertia } from '../inertia/body.ts';
import { judgeTensor } from '../inertia/possibility.ts';
import { moveToCentre, possibleReadings } from '../inertia/possible-readings.ts';
import { eigenSymmetric3 } from '../linalg/eigen-symmetric3.ts';
import type { Symmetric3 } from '../linalg/symmetric3.ts';
import { subtract, type Vector3 } from '../linalg/vector3.ts';
import type { BodyModel, PartModel } from '../model/model.ts';
import { formatQuantity, INERTIA, unitFor } from '../units/index.ts';
import { massOf } from './own-body.ts';
import { ORIGIN } from './placing.ts';
import { refuseTooLarge } from './refuse-too-large.ts';
import { evaluate, evaluateVector, faultAt, type Scope } from './scope.ts';

/**
 * A bought item's ten numbers in central form, from the maker's mass, centre and tensor about the declared point with
 * the declared sign of products. A tensor that no body can have is a fault when it fails by more than half a unit of the
 * digits given, a warning within that; the message names another reading that would be possible, and never applies it.
 *
 * @returns also the slack that rounding is granted: how far below zero an eigenvalue of Q is [kg·m²]
 */
export function vendorBody(model: BodyModel, part: PartModel, scope: Scope): { body: Body; slack: number } {
  const mass = massOf(model.mass, part, scope);
  const centre = model.centre ? evaluateVector(model.centre, scope) : ORIGIN;
  const inertia = tensorOf(model, scope);
  const { about: declared } = model.inertia;
  const about =
    declared === 'centre' ? centre : declared === 'origin' ? ORIGIN : evaluateVector(declared, scope);
  const central = about === centre ? inertia : moveToCentre(inertia, mass, subtract(centre, about));
  const body = { mass, centre, secondMoments: secondMomentsFromInertia(central) };
  refuseTooLarge(body, part.name, part.where, scope);
  return { body, slack: judge(model, part, { mass, centre, inertia, about, central }, scope) };
}

/** The six as the tensor's own elements (products negative). */
function tensorOf(model: BodyModel, scope: Scope): Symmetric3 {
  const { six, products, mirrored } = model.inertia;
  const given = six.map((q) => evaluate(q, scope));
  mirrored?.forEach((quantity, i) => {
    const value = evaluate(quantity, scope);
    const above = given[3 + i]!;
    // Printed twice, an element is printed alike.
    if (Math.abs(value - above) <= 4 * Number.EPSILON * Math.abs(above)) return;
    const unit = unitFor(INERTIA, scope.file.units);
    faultAt(scope, quantity.where, {
      code: 'BODY_NOT_SYMMETRIC',
      message: `expected a symmetric matrix, found ${formatQuantity(value, unit)} below the diagonal and ${formatQuantity(above, unit)} above it`,
      hint: 'an inertia tensor is symmetric; compare the row with the data sheet',
    });
  });
  const sign = products === 'positive' ? -1 : 1;
  return [given[0]!, given[1]!, given[2]!, sign * given[3]!, sign * given[4]!, sign * given[5]!];
}

interface Reading {
  readonly mass: number;
  readonly centre: Vector3;
  readonly inertia: Symmetric3;
  readonly about: Vector3;
  readonly central: Symmetric3;
}

function judge(model: BodyModel, part: PartModel, reading: Reading, scope: Scope): number {
  const { halfUnits } = model.inertia;
  const exact = judgeTensor(reading.central);
  if (!exact.possible) {
    const allowance = roundingOf(halfUnits);
    const message = impossible(`${scope.prefix}${part.name}`, exact, scope);
    if (judgeTensor(reading.central, allowance).possible) {
      warn(part, scope, 'BODY_IMPOSSIBLE_BY_ROUNDING', `${message}; within half a unit of the digits given`);
      return exact.shortfall / 2;
    }
    const readings = possibleReadings({ ...reading, allowance });
    faultAt(scope, model.inertia.where, {
      code: 'BODY_IMPOSSIBLE',
      message,
      hint:
        readings.length > 0
          ? `it would be possible ${readings.join(', or ')}; ask the maker which was meant and declare it`
          : 'no other sign, reference point or order of the elements makes it possible: check the digits and the unit',
    });
    return 0;
  }
  warnIfPlaceholder(part, reading, scope);
  warnIfTooSmall(part, reading, scope);
  return 0;
}

/** How far rounding in the digits can push an eigenvalue of Q: ½ Σ δᵢᵢ and the Frobenius norm of the products'. */
function roundingOf(half: readonly number[]): number {
  const [a, b, c, d, e, f] = half as [number, number, number, number, number, number];
  return (a + b + c) / 2 + Math.sqrt(2 * (d * d + e * e + f * f));
}

/** The message of an impossible tensor: principal moments about the centre, the rule and the shortfall. */
export function impossible(
  path: string,
  p: { moments: readonly number[]; shortfall: number; shortfallOfTrace: number; rule: string | null },
  scope: Scope,
): string {
  const unit = unitFor(INERTIA, scope.file.units);
  const [a, b, c] = p.moments.map((m) => formatQuantity(Number(m.toPrecision(6)), unit));
  const short = formatQuantity(Number(p.shortfall.toPrecision(3)), unit);
  const share = `${Number((p.shortfallOfTrace * 100).toPrecision(2))} % of the trace`;
  const rule =
    p.rule === 'negative moment'
      ? `${a} is negative`
      : `the two smaller must add up to the largest, and are short of it by ${short} (${share})`;
  return `expected a tensor that a body can have, found principal moments ${a}, ${b}, ${c} about the centre of ${path}: ${rule}`;
}

function warn(part: PartModel, scope: Scope, code: string, message: string): void {
  scope.run.warnings.push({ code, message, at: { file: scope.file.path, line: part.line } });
}

/** Equal moments of a power of ten and no products: what tools write where nobody filled a tensor in. */
function warnIfPlaceholder(part: PartModel, { central: j, mass }: Reading, scope: Scope): void {
  const name = `${scope.prefix}${part.name}`;
  if (mass > 0 && j.every((x) => x === 0)) {
    warn(
      part,
      scope,
      'BODY_PLACEHOLDER',
      `${name}: the tensor is all zeros, as if the mass were in one point; if it is, write \`solid: particle\``,
    );
    return;
  }
  if (j[3] !== 0 || j[4] !== 0 || j[5] !== 0 || j[0] !== j[1] || j[1] !== j[2]) return;
  const isPower = (x: number) => {
    const k = Math.round(Math.log10(x));
    return x > 0 && Math.abs(x / Number(`1e${k}`) - 1) < 1e-12;
  };
  if (isPower(j[0]) || isPower(j[0] / unitFor(INERTIA, scope.file.units).factor))
    warn(
      part,
      scope,
      'BODY_PLACEHOLDER',
      `${name}: three equal moments that are a power of ten and no products look like a placeholder, not a body`,
    );
}

/** Denser than anything [kg/m³]: the tensor is then too small for the mass by powers of ten. */
const DENSEST = 25_000;

/**
 * Mean density of the uniform ellipsoid with this body's mass and tensor (semi-axes √(5 λᵢ/m), λ the eigenvalues of
 * Q): beyond any material's, the tensor is too small for the mass, as when mm² were read as cm².
 */
function warnIfTooSmall(part: PartModel, { central, mass }: Reading, scope: Scope): void {
  const q = eigenSymmetric3(secondMomentsFromInertia(central)).values;
  const smallest = q[2] * 1e-6;
  if (!(mass > 0) || q[0] <= smallest) return;
  const semi = q.map((x) => Math.sqrt((5 * x) / mass));
  const density = mass / ((4 / 3) * Math.PI * semi[0]! * semi[1]! * semi[2]!);
  if (density > DENSEST)
    warn(
      part,
      scope,
      'BODY_TOO_COMPACT',
      `${scope.prefix}${part.name}: a uniform body with this mass and tensor would have ${Number((density / 1000).toPrecision(3))} g/cm^3, denser than any material; look for a slip of units`,
    );
}
