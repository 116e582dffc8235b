import fc from 'fast-check';
import { netBody, sumMoments } from '../../../core/inertia/balance-sum.ts';
import { type Body, inertiaAboutCentre } from '../../../core/inertia/body.ts';
import { placeBody } from '../../../core/inertia/placement.ts';
import { type Matrix3, type Symmetric3, toRows } from '../../../core/linalg/symmetric3.ts';
import type { Vector3 } from '../../../core/linalg/vector3.ts';
import type { PartBody, RollUpRecord, Totals } from '../../../core/record/record.ts';
import { buildRecord, totalsOf } from '../../helpers/build-record.ts';

/** A part of a machine for tests: any possible body, material or cut-out. */
export interface Piece {
  path: string;
  body: Body;
  cut?: boolean;
  kind?: string;
}

/** A record whose totals are rolled up from the pieces on the product's own tree. */
export function machine(pieces: readonly Piece[], overrides: Partial<RollUpRecord> = {}): RollUpRecord {
  const record = buildRecord();
  const total = netBody(
    sumMoments(
      pieces.map(({ body, cut }) => (cut ? { material: null, cut: body } : { material: body, cut: null })),
    ),
  );
  const none: Totals = { mass: 0, centre: null, inertia: null, principal: null, gyration: null };
  const totals = total ? totalsOf(total) : none;
  const template = record.parts[0]!;
  const parts = pieces.map(({ path, body, cut = false, kind = 'body' }) => {
    const part = partBody(body, cut);
    return { ...template, path, kind, cut, basic: part, predicted: part };
  });
  return { ...record, basic: totals, predicted: totals, parts, ...overrides };
}

function partBody(body: Body, cut: boolean): PartBody {
  const sign = cut ? -1 : 1;
  const j = inertiaAboutCentre(body).map((x) => sign * x + 0) as unknown as Symmetric3;
  return { mass: sign * body.mass, centre: [...body.centre], inertia: toRows(j) };
}

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true }).map((x) => x + 0);
export const anyPoint = (size: number): fc.Arbitrary<Vector3> =>
  fc.tuple(between(-size, size), between(-size, size), between(-size, size));

/** Q = Σ v vᵀ of three vectors: positive semidefinite with any three products. */
export const anyBody: fc.Arbitrary<Body> = fc
  .record({
    mass: between(0.1, 5),
    centre: anyPoint(2),
    arms: fc.tuple(anyPoint(0.4), anyPoint(0.4), anyPoint(0.4)),
  })
  .map(({ mass, centre, arms }) => {
    const q = (i: 0 | 1 | 2, j: 0 | 1 | 2) => mass * arms.reduce((total, v) => total + v[i] * v[j], 0);
    return { mass, centre, secondMoments: [q(0, 0), q(1, 1), q(2, 2), q(0, 1), q(0, 2), q(1, 2)] };
  });

/** Any rotation, from a quaternion. */
export const anyTurn: fc.Arbitrary<Matrix3> = fc
  .tuple(between(-1, 1), between(-1, 1), between(-1, 1), between(-1, 1))
  .filter((q) => q.reduce((sum, x) => sum + x * x, 0) > 0.1)
  .map((raw) => {
    const n = Math.sqrt(raw.reduce((sum, x) => sum + x * x, 0));
    const [w, x, y, z] = raw.map((c) => c / n) as [number, number, number, number];
    return [
      [1 - 2 * (y * y + z * z), 2 * (x * y - w * z), 2 * (x * z + w * y)],
      [2 * (x * y + w * z), 1 - 2 * (x * x + z * z), 2 * (y * z - w * x)],
      [2 * (x * z - w * y), 2 * (y * z + w * x), 1 - 2 * (x * x + y * y)],
    ];
  });

export const turned = (pieces: readonly Piece[], turn: Matrix3): Piece[] =>
  pieces.map((piece) => ({ ...piece, body: placeBody({ turn, offset: [0, 0, 0] }, piece.body) }));

const edit = fc.oneof(
  { weight: 3, arbitrary: fc.constant('keep' as const) },
  fc.constantFrom(
    'move' as const,
    'heavier' as const,
    'turn' as const,
    'replace' as const,
    'remove' as const,
  ),
);

/** Two machines of which some parts are kept, moved, heavier, turned, replaced, removed, added or renamed. */
export const anyTwoMachines: fc.Arbitrary<{ a: Piece[]; b: Piece[] }> = fc
  .record({
    parts: fc.array(
      fc.record({
        body: anyBody,
        edit,
        other: anyBody,
        shift: anyPoint(0.5),
        turn: anyTurn,
        renamed: fc.boolean(),
      }),
      { minLength: 2, maxLength: 9 },
    ),
    added: fc.array(anyBody, { maxLength: 2 }),
    hole: fc.option(fc.record({ share: between(0.05, 0.5), shift: anyPoint(0.1), kept: fc.boolean() })),
  })
  .map(({ parts, added, hole }) => {
    const a: Piece[] = parts.map(({ body }, i) => ({ path: `part ${i}`, body }));
    const b: Piece[] = parts.flatMap(({ body, edit, other, shift, turn, renamed }, i) => {
      const path = renamed && edit === 'keep' ? `renamed ${i}` : `part ${i}`;
      // The first stays, so that B always has a mass.
      const what = i === 0 && edit === 'remove' ? 'keep' : edit;
      if (what === 'remove') return [];
      if (what === 'keep') return [{ path, body }];
      if (what === 'replace') return [{ path, body: other }];
      if (what === 'heavier') return [{ path, body: heavier(body, 1.25) }];
      if (what === 'turn')
        return [{ path, body: { ...placeBody({ turn, offset: [0, 0, 0] }, body), centre: body.centre } }];
      const [x, y, z] = body.centre;
      return [{ path, body: { ...body, centre: [x + shift[0], y + shift[1], z + shift[2]] } }];
    });
    added.forEach((body, i) => {
      b.push({ path: `added ${i}`, body });
    });
    if (hole) {
      const from = heavier(parts[0]!.body, hole.share);
      a.push({ path: 'part 0/hole', body: from, cut: true });
      const [x, y, z] = from.centre;
      const s = hole.kept ? ([0, 0, 0] as const) : hole.shift;
      b.push({ path: 'part 0/hole', cut: true, body: { ...from, centre: [x + s[0], y + s[1], z + s[2]] } });
    }
    return { a, b };
  });

function heavier(body: Body, k: number): Body {
  const secondMoments = body.secondMoments.map((q) => q * k) as unknown as Symmetric3;
  return { mass: body.mass * k, centre: body.centre, secondMoments };
}
