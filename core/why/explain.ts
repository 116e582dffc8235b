import { type Placement, placePoint } from '../inertia/placement.ts';
import { judgeTensor } from '../inertia/possibility.ts';
import { moveToCentre } from '../inertia/possible-readings.ts';
import { apply } from '../linalg/matrix3.ts';
import { IDENTITY, type Matrix3, type Symmetric3, trace, turnSymmetric } from '../linalg/symmetric3.ts';
import { norm, subtract, type Vector3 } from '../linalg/vector3.ts';
import type { GivenTensor } from '../rollup/given-tensor.ts';
import { AXIS_READINGS, type AxisReading } from './axis-readings.ts';
import { ELEMENT_ORDERS } from './element-orders.ts';
import { type Framing, framingsOf } from './framings.ts';
import { UNIT_SLIPS } from './inertia-units.ts';
import { centralUnder, pointReadings } from './point-readings.ts';
import { type Explanation, type Explanations, type Step, sentenceOf, summaryOf } from './sentence.ts';

/** A residual within this share of the largest element is no longer a rounding of the digits given. */
const NEAR = 0.01;
/** Where no digits are known, two tensors within this share are the same. */
const SAME = 1e-6;

/**
 * Which conventions make two tensors disagree. Both are brought into common axes; then it enumerates sign of products ×
 * reference point (centre, origin, shift twice, shift backwards) × axes (24 turns and their mirror images; a known
 * rotation transposed or left out) × unit factors × order of the elements for b, and ranks the readings under which b is
 * a.
 *
 * A reading explains when every element agrees within half a unit of the digits given (1e-6 of the largest where none are
 * known). Of readings that explain, those with the fewest slips come first; a reading that needs all slips of another and
 * more is left out. All three products flipped is a sign convention; two flipped is a half turn or a mirror image, and
 * only the centre tells which: with both centres it is told, without it both are said.
 *
 * @param a what is taken as right
 * @param b what is to be explained
 */
export function explain(a: GivenTensor, b: GivenTensor): Explanations {
  const central = centralOf(a);
  const points = numberReadings(b).flatMap((stage) => centralReadings(stage, b, a, central));
  const found: Candidate[] = [];
  for (const framing of framingsOf(a, b)) {
    const target = targetIn(framing.a, central, a);
    const centre = b.centre && placePoint(framing.b, b.centre);
    for (const point of points) {
      const reading = readingIn(framing, point);
      for (const axis of AXIS_READINGS) consider(reading, axis, target, centre, found);
    }
  }
  return rank(found);
}

/** What is taken as right, in the common axes. */
interface Target {
  /** About the centre, products negative [kg·m²]. */
  readonly tensor: Symmetric3;
  readonly halfUnits: Symmetric3;
  readonly centre: Vector3 | null;
  /** Its largest element. */
  readonly size: number;
}

const targetIn = (placement: Placement, central: Symmetric3, a: GivenTensor): Target => {
  const tensor = turnedInto(placement, central);
  return {
    tensor,
    halfUnits: turnedHalfUnits(placement.turn, a.halfUnits),
    centre: a.centre && placePoint(placement, a.centre),
    size: Math.max(...tensor.map(Math.abs)),
  };
};

const turnedInto = ({ turn }: Placement, j: Symmetric3): Symmetric3 =>
  turn === IDENTITY ? j : turnSymmetric(turn, j);

const readingIn = ({ b, steps }: Framing, reading: Reading): Reading => ({
  inertia: turnedInto(b, reading.inertia),
  halfUnits: turnedHalfUnits(b.turn, reading.halfUnits),
  steps: [...reading.steps, ...steps],
  cost: reading.cost + steps.length,
});

interface Candidate {
  readonly target: Target;
  readonly steps: readonly Step[];
  readonly tensor: Symmetric3;
  readonly residual: number;
  /** Largest deviation over what the digits allow; explained when at most 1. */
  readonly fit: number;
  readonly cost: number;
  /** How far the centres are apart under this reading, as a share of their size; null where unknown. */
  readonly centreGap: number | null;
}

interface Reading {
  readonly inertia: Symmetric3;
  readonly halfUnits: Symmetric3;
  readonly steps: readonly Step[];
  readonly cost: number;
}

/** As the maker declares it: about its centre, products negative. */
function centralOf(given: GivenTensor): Symmetric3 {
  const signed = given.products === 'positive' ? negated(given.inertia) : given.inertia;
  if (given.about === 'centre' || given.mass === null || given.centre === null) return signed;
  const d = given.about === 'origin' ? given.centre : subtract(given.centre, given.about);
  return moveToCentre(signed, given.mass, d);
}

const negated = (j: Symmetric3): Symmetric3 => [j[0], j[1], j[2], 0 - j[3], 0 - j[4], 0 - j[5]];

/** Order of the elements × sign of the products. */
function numberReadings(b: GivenTensor): Reading[] {
  const orders = [
    { steps: [] as Step[], slots: [0, 1, 2, 3, 4, 5] as const, cost: 0 },
    ...ELEMENT_ORDERS.map(({ words, slots }) => ({
      steps: [{ kind: 'order', words }] as Step[],
      slots,
      cost: 1.3,
    })),
  ];
  return orders.flatMap(({ steps, slots, cost }) => {
    const pick = (six: Symmetric3) => slots.map((k) => six[k]!) as unknown as Symmetric3;
    const asRead = pick(b.inertia);
    const declared = b.products === 'positive' ? negated(asRead) : asRead;
    const halfUnits = pick(b.halfUnits);
    const other: Step = { kind: 'sign', words: 'with its products negated' };
    return [
      { inertia: declared, halfUnits, steps, cost },
      { inertia: negated(declared), halfUnits, steps: [...steps, other], cost: cost + 1 },
    ];
  });
}

/** Reference point × unit: the trace, which no turn and no sign changes, leaves one factor for each point. */
function centralReadings(stage: Reading, b: GivenTensor, a: GivenTensor, target: Symmetric3): Reading[] {
  const mass = b.mass ?? a.mass;
  const centre = b.centre ?? a.centre;
  const declared = typeof b.about === 'string' ? b.about : 'point';
  const points: { steps: Step[]; central: (j: Symmetric3) => Symmetric3; cost: number }[] = [];
  if (mass === null || centre === null || declared === 'centre')
    points.push({ steps: [], central: (j) => j, cost: 0 });
  else {
    const d = b.about === 'origin' ? centre : subtract(centre, b.about as Vector3);
    points.push({ steps: [], central: (j) => moveToCentre(j, mass, d), cost: 0 });
  }
  if (mass !== null && centre !== null && norm(centre) > 0)
    for (const { words, shifts } of pointReadings(declared))
      points.push({
        steps: [{ kind: 'point', words }],
        central: (j) => centralUnder(j, mass, centre, shifts),
        cost: 1,
      });
  return points.flatMap(({ steps, central, cost }) => {
    const make = (factor: number, step: Step | null, more: number): Reading => ({
      inertia: central(scaled(stage.inertia, factor)),
      halfUnits: scaled(stage.halfUnits, factor),
      steps: [...stage.steps, ...steps, ...(step ? [step] : [])],
      cost: stage.cost + cost + more,
    });
    // f tr(J) − tr(shift) = tr(target), the shift not depending on f.
    const shift = -trace(central([0, 0, 0, 0, 0, 0]));
    const wanted = (trace(target) + shift) / trace(stage.inertia);
    const units = UNIT_SLIPS.flatMap((slip, i) =>
      !(Math.abs(slip.ratio / wanted - 1) <= 2 * NEAR)
        ? []
        : [
            make(
              slip.ratio,
              { kind: 'unit', words: `read in ${slip.is}, not ${slip.readAs}` },
              1.1 + i / 1000,
            ),
          ],
    );
    return [make(1, null, 0), ...units];
  });
}

const scaled = (j: Symmetric3, k: number): Symmetric3 =>
  k === 1 ? j : (j.map((x) => x * k) as unknown as Symmetric3);

function consider(
  reading: Reading,
  axis: AxisReading,
  target: Target,
  centre: Vector3 | null,
  found: Candidate[],
): void {
  const tensor = axis.kind === 'none' ? reading.inertia : turnSymmetric(axis.turn, reading.inertia);
  const gaps = tensor.map((x, k) => Math.abs(x - target.tensor[k]!));
  const residual = Math.max(...gaps.map((gap) => shareOf(gap, target.size)));
  if (!(residual < NEAR) && axis.kind !== 'none') return;
  const half = turnedHalfUnits(axis.turn, reading.halfUnits);
  const fit = Math.max(
    ...gaps.map((gap, k) => shareOf(gap, half[k]! + target.halfUnits[k]! + SAME * target.size)),
  );
  for (const { steps, cost, matrix } of axisSteps(axis, target.centre, centre))
    found.push({
      target,
      tensor,
      residual,
      fit,
      steps: [...reading.steps, ...steps],
      cost: reading.cost + cost,
      centreGap: centreGap(matrix, target.centre, centre),
    });
}

/** Nothing is no share of anything, also of nothing. */
const shareOf = (part: number, whole: number): number => (part === 0 ? 0 : part / whole);

/** Half units go with their elements; signs do not matter to them. */
function turnedHalfUnits(turn: Matrix3, half: Symmetric3): Symmetric3 {
  const absolute = turn.map((row) => row.map(Math.abs)) as unknown as Matrix3;
  return turnSymmetric(absolute, half);
}

const MIRROR_COST = 0.05;

/** A reading of axes as steps: a turn, a mirror image, or, where no centre tells, both in one. */
function axisSteps(axis: AxisReading, a: Vector3 | null, b: Vector3 | null) {
  const turnGap = centreGap(axis.turn, a, b);
  const mirrorGap = centreGap(axis.mirror, a, b);
  const known = turnGap !== null && mirrorGap !== null;
  const isMirror = known && mirrorGap < turnGap;
  if (axis.kind === 'none')
    // Every tensor is its own image through the origin: only a centre that lands there says that this was done.
    return isMirror && mirrorGap < NEAR
      ? [{ steps: [step('mirror', axis.mirrorWords)], cost: 1.4, matrix: axis.mirror }]
      : [{ steps: [] as Step[], cost: 0, matrix: axis.turn }];
  const base = axis.kind === 'signs' ? 1 : 1.2;
  const turn = { steps: [step('axes', axis.turnWords)], cost: base, matrix: axis.turn };
  const mirror = { steps: [step('mirror', axis.mirrorWords)], cost: base + MIRROR_COST, matrix: axis.mirror };
  if (known) return [isMirror ? mirror : turn];
  if (axis.kind === 'permutation') return [turn];
  const words = `${axis.turnWords} or ${axis.mirrorWords} (the tensor cannot tell; compare the centres)`;
  return [{ ...turn, steps: [step('axes', words)] }];
}

const step = (kind: Step['kind'], words: string): Step => ({ kind, words });

/** How far b's centre is from a's when b's axes are read so, as a share of its size; null where either is not given. */
function centreGap(matrix: Matrix3, a: Vector3 | null, b: Vector3 | null): number | null {
  if (a === null || b === null || norm(a) === 0 || norm(b) === 0) return null;
  return norm(subtract(apply(matrix, b), a)) / norm(a);
}

const MOST = 6;

function rank(found: readonly Candidate[]): Explanations {
  const explained = found.filter((c) => c.fit <= 1).sort(byCost);
  const kept: Candidate[] = [];
  for (const candidate of explained) {
    const words = new Set(candidate.steps.map((s) => s.words));
    // What another reading says with fewer words adds nothing.
    const more = kept.some((k) => k.steps.every((s) => words.has(s.words)));
    if (!more) kept.push(candidate);
  }
  const near = found
    .filter((c) => c.fit > 1 && c.residual < NEAR)
    .sort((x, y) => x.residual - y.residual || byCost(x, y))
    .filter((c, i, all) => i === 0 || c.residual < 0.5 * all[0]!.residual);
  const plain = found.find((c) => c.steps.length === 0) ?? found[0]!;
  const explanations = (kept.length > 0 ? kept : near).slice(0, MOST).map(toExplanation);
  return {
    agree: kept[0]?.steps.length === 0,
    explained: kept.length > 0,
    explanations,
    differences: differencesOf(plain.tensor, plain.target.tensor),
    summary: summaryOf(explanations, kept.length > 0),
  };
}

const byCost = (x: Candidate, y: Candidate): number =>
  x.cost - y.cost || (x.centreGap ?? 0) - (y.centreGap ?? 0) || x.residual - y.residual;

function toExplanation(candidate: Candidate): Explanation {
  const centresAgree = candidate.centreGap === null ? null : candidate.centreGap < NEAR;
  return {
    sentence: sentenceOf(candidate.steps, centresAgree),
    steps: [...candidate.steps],
    residual: candidate.residual,
    withinDigits: candidate.fit <= 1,
    possible: judgeTensor(candidate.tensor).possible,
    centresAgree,
  };
}

const ELEMENTS = ['xx', 'yy', 'zz', 'xy', 'xz', 'yz'];

/** Where the two disagree as declared, largest first [kg·m²]. */
function differencesOf(b: Symmetric3, a: Symmetric3): Explanations['differences'] {
  return ELEMENTS.map((element, k) => ({ element, a: a[k]!, b: b[k]!, difference: b[k]! - a[k]! }))
    .filter((d) => d.difference !== 0)
    .sort((x, y) => Math.abs(y.difference) - Math.abs(x.difference));
}
