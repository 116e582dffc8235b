import type { Outline, SayLength, SolidFault } from './dimensions.ts';
import type { Vector2 } from './section-moments.ts';

/**
 * An outline is at least three points, does not cross or touch itself, and encloses an area.
 *
 * @returns SOLID_OUTLINE_TOO_FEW, SOLID_OUTLINE_CROSSES, SOLID_DEGENERATE or null
 */
export function checkOutline(key: string, outline: Outline, say: SayLength, title = key): SolidFault | null {
  const edges = edgesOf(outline);
  if (edges.length < 3)
    return {
      code: 'SOLID_OUTLINE_TOO_FEW',
      message: `${title} has ${edges.length < 2 ? 'fewer than two' : 'two'} different points; it needs three or more.`,
      key,
    };
  if (isFlat(edges))
    return { code: 'SOLID_DEGENERATE', message: `${title} encloses no area: its points lie on a line.`, key };
  const pair = firstMeeting(edges, edges, true);
  if (!pair) return null;
  const [a, b] = pair;
  return {
    code: 'SOLID_OUTLINE_CROSSES',
    message: `${title} meets itself: its edge ${sayEdge(a, say)} and its edge ${sayEdge(b, say)} cross or touch.`,
    hint: 'list the corners in order around the figure; give openings as holes',
    key,
  };
}

/**
 * Holes are outlines that lie inside the outline and apart from one another.
 *
 * @returns a fault of `checkOutline`, SOLID_HOLE_OUTSIDE, SOLID_HOLES_OVERLAP or null
 */
export function checkHoles(
  key: string,
  outline: Outline,
  holes: readonly Outline[],
  say: SayLength,
): SolidFault | null {
  const rim = edgesOf(outline);
  const done: Edge[][] = [];
  for (let i = 0; i < holes.length; i++) {
    const fault = checkOutline(key, holes[i]!, say, `hole ${i + 1}`);
    if (fault) return fault;
    const edges = edgesOf(holes[i]!);
    if (firstMeeting(edges, rim, false) || !contains(rim, edges[0]!.from))
      return {
        code: 'SOLID_HOLE_OUTSIDE',
        message: `hole ${i + 1} touches or leaves the outline; a hole must lie inside it.`,
        key,
      };
    for (let j = 0; j < done.length; j++) {
      const other = done[j]!;
      if (
        firstMeeting(edges, other, false) ||
        contains(other, edges[0]!.from) ||
        contains(edges, other[0]!.from)
      )
        return {
          code: 'SOLID_HOLES_OVERLAP',
          message: `holes ${j + 1} and ${i + 1} overlap or touch, so their common area would be taken out twice.`,
          key,
        };
    }
    done.push(edges);
  }
  return null;
}

/** One straight side; `number` counts from 1 at the side from the first point given. */
interface Edge {
  readonly from: Vector2;
  readonly to: Vector2;
  readonly number: number;
  readonly next: number;
}

/** Sides of positive length; a repeated point makes none. */
function edgesOf(outline: Outline): Edge[] {
  const points = outline.filter((point, i) => {
    const before = outline[(i + outline.length - 1) % outline.length]!;
    return point[0] !== before[0] || point[1] !== before[1];
  });
  return points.map((from, i) => ({
    from,
    to: points[(i + 1) % points.length]!,
    number: i,
    next: (i + 1) % points.length,
  }));
}

const sayEdge = (edge: Edge, say: SayLength): string =>
  `[${say(edge.from[0])}, ${say(edge.from[1])}] to [${say(edge.to[0])}, ${say(edge.to[1])}]`;

/** Twice the signed area of a triangle: positive when c lies left of a → b. */
const turn = (a: Vector2, b: Vector2, c: Vector2): number =>
  (b[0] - a[0]) * (c[1] - a[1]) - (c[0] - a[0]) * (b[1] - a[1]);

const distance = (a: Vector2, b: Vector2): number =>
  Math.sqrt((a[0] - b[0]) * (a[0] - b[0]) + (a[1] - b[1]) * (a[1] - b[1]));

/** All corners on one line: heights under the rounding of the coordinates, 8 eps of the size each. */
function isFlat(edges: readonly Edge[]): boolean {
  let far = edges[0]!;
  let reach = 0;
  const from = edges[0]!.from;
  let size = 0;
  for (const edge of edges) {
    const length = distance(edge.from, from);
    size = Math.max(size, Math.abs(edge.from[0]), Math.abs(edge.from[1]));
    if (length > reach) {
      reach = length;
      far = edge;
    }
  }
  const slack = 8 * Number.EPSILON * Math.max(size, reach) * reach;
  return edges.every((edge) => Math.abs(turn(from, far.from, edge.from)) <= slack);
}

/** The first two sides that share a point, apart from neighbours' common corner. Sorted by x, so far pairs are not tried. */
function firstMeeting(
  first: readonly Edge[],
  second: readonly Edge[],
  same: boolean,
): readonly [Edge, Edge] | null {
  const low = (edge: Edge) => Math.min(edge.from[0], edge.to[0]);
  const high = (edge: Edge) => Math.max(edge.from[0], edge.to[0]);
  const sorted = [...second].sort((a, b) => low(a) - low(b));
  const longest = sorted.reduce((most, edge) => Math.max(most, high(edge) - low(edge)), 0);
  for (const a of first) {
    const start = low(a) - longest * (1 + 4 * Number.EPSILON);
    for (let k = firstAtLeast(sorted, start, low); k < sorted.length; k++) {
      const b = sorted[k]!;
      if (low(b) > high(a)) break;
      if (same && b.number <= a.number) continue;
      if (same ? meetWithin(a, b) : meet(a, b)) return [a, b];
    }
  }
  return null;
}

function firstAtLeast(sorted: readonly Edge[], value: number, low: (edge: Edge) => number): number {
  let from = 0;
  let to = sorted.length;
  while (from < to) {
    const middle = (from + to) >> 1;
    if (low(sorted[middle]!) < value) from = middle + 1;
    else to = middle;
  }
  return from;
}

/** Of one outline: neighbours may share their corner but not fold back onto each other. */
function meetWithin(a: Edge, b: Edge): boolean {
  if (a.next === b.number) return foldsBack(a.from, a.to, b.to);
  if (b.next === a.number) return foldsBack(b.from, b.to, a.to);
  return meet(a, b);
}

const foldsBack = (a: Vector2, b: Vector2, c: Vector2): boolean =>
  turn(a, b, c) === 0 && (a[0] - b[0]) * (c[0] - b[0]) + (a[1] - b[1]) * (c[1] - b[1]) > 0;

function meet(a: Edge, b: Edge): boolean {
  if (Math.max(a.from[1], a.to[1]) < Math.min(b.from[1], b.to[1])) return false;
  if (Math.max(b.from[1], b.to[1]) < Math.min(a.from[1], a.to[1])) return false;
  if (Math.max(a.from[0], a.to[0]) < Math.min(b.from[0], b.to[0])) return false;
  if (Math.max(b.from[0], b.to[0]) < Math.min(a.from[0], a.to[0])) return false;
  const apart = (p: number, q: number) => (p > 0 && q > 0) || (p < 0 && q < 0);
  return (
    !apart(turn(a.from, a.to, b.from), turn(a.from, a.to, b.to)) &&
    !apart(turn(b.from, b.to, a.from), turn(b.from, b.to, a.to))
  );
}

/** Whether a point that lies on no side is inside (crossings of a ray along +x, odd is inside). */
function contains(edges: readonly Edge[], point: Vector2): boolean {
  let inside = false;
  for (const { from, to } of edges) {
    if (from[1] > point[1] === to[1] > point[1]) continue;
    const side = turn(from, to, point);
    if (to[1] > from[1] ? side > 0 : side < 0) inside = !inside;
  }
  return inside;
}
