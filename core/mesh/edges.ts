import { JoinedSets } from './joined-sets.ts';
import type { TriangleMesh } from './volume-body.ts';

/** How a mesh's triangles meet along its edges. */
export interface EdgeReport {
  /** Edges with a side missing (an odd number of triangles). */
  readonly open: number;
  /** Edges whose triangles run them the same way, so that one of them is turned over. */
  readonly flipped: number;
  /** Edges where more than two triangles meet, as many each way: solids that touch. */
  readonly touching: number;
  /** The first few open edges, else flipped ones, as pairs of vertices. */
  readonly first: readonly (readonly [number, number])[];
  /** Triangles joined along edges into shells. */
  readonly shells: JoinedSets;
}

const FEW = 3;
/** Room for an edge's far vertex and for twice a half-edge plus its direction, in one exact double. */
const CODES = 2 ** 27;
const SMALL_BUCKET = 24;

/**
 * Finds for every edge how many triangles run it each way. Half-edges are put in buckets by their lower vertex (a counting
 * sort) and each bucket, a handful, is sorted by the other: no hash, little more memory than the triangles.
 *
 * Triangles on either side of a plain edge are one shell. Where more than one pair meets, pairs within a shell
 * are joined first and what is left in order, so that two closed solids that touch stay two shells.
 */
export function examineEdges(mesh: TriangleMesh): EdgeReport {
  const buckets = bucketHalfEdges(mesh);
  const shells = new JoinedSets(mesh.triangles.length / 3);
  const found = new Found();
  const crowded: number[][] = [];
  const { starts, others, codes } = buckets;
  for (let u = 0; u + 1 < starts.length; u++) {
    const end = starts[u + 1]!;
    sortBucket(buckets, starts[u]!, end);
    for (let i = starts[u]!; i < end; ) {
      const v = others[i]!;
      let j = i + 1;
      while (j < end && others[j] === v) j++;
      if (j === i + 2 && ((codes[i]! ^ codes[i + 1]!) & 1) === 1)
        shells.join(triangleOf(codes[i]!), triangleOf(codes[i + 1]!));
      else if (!found.add(u, v, codes.subarray(i, j))) crowded.push(Array.from(codes.subarray(i, j)));
      i = j;
    }
  }
  for (const codesOfEdge of crowded) pairUp(codesOfEdge, shells);
  const { open, flipped } = found;
  return {
    open,
    flipped,
    touching: crowded.length,
    first: open > 0 ? found.firstOpen : found.firstFlipped,
    shells,
  };
}

interface Buckets {
  readonly starts: Uint32Array;
  /** The higher vertex of each half-edge. */
  readonly others: Uint32Array;
  /** Twice the half-edge's place in `triangles`, plus one where it runs from the higher vertex to the lower. */
  readonly codes: Uint32Array;
}

const triangleOf = (code: number): number => Math.floor((code >>> 1) / 3);

function bucketHalfEdges({ vertices, triangles }: TriangleMesh): Buckets {
  const starts = new Uint32Array(vertices.length / 3 + 1);
  const next = (i: number) => (i % 3 === 2 ? i - 2 : i + 1);
  for (let i = 0; i < triangles.length; i++) {
    const a = triangles[i]!;
    const b = triangles[next(i)]!;
    starts[Math.min(a, b) + 1]!++;
  }
  for (let v = 1; v < starts.length; v++) starts[v]! += starts[v - 1]!;
  const others = new Uint32Array(triangles.length);
  const codes = new Uint32Array(triangles.length);
  const fill = starts.slice();
  for (let i = 0; i < triangles.length; i++) {
    const a = triangles[i]!;
    const b = triangles[next(i)]!;
    const at = fill[Math.min(a, b)]!++;
    others[at] = Math.max(a, b);
    codes[at] = 2 * i + (a < b ? 0 : 1);
  }
  return { starts, others, codes };
}

/** By far vertex, then by place: insertion for a handful, the engine's sort of packed doubles for a hub of many. */
function sortBucket({ others, codes }: Buckets, start: number, end: number): void {
  if (end - start > SMALL_BUCKET) {
    const packed = new Float64Array(end - start);
    for (let i = start; i < end; i++) packed[i - start] = others[i]! * CODES + codes[i]!;
    packed.sort();
    for (let i = start; i < end; i++) {
      others[i] = Math.floor(packed[i - start]! / CODES);
      codes[i] = packed[i - start]! - others[i]! * CODES;
    }
    return;
  }
  for (let i = start + 1; i < end; i++) {
    const other = others[i]!;
    const code = codes[i]!;
    let j = i - 1;
    while (j >= start && others[j]! > other) {
      others[j + 1] = others[j]!;
      codes[j + 1] = codes[j]!;
      j--;
    }
    others[j + 1] = other;
    codes[j + 1] = code;
  }
}

class Found {
  open = 0;
  flipped = 0;
  readonly firstOpen: [number, number][] = [];
  readonly firstFlipped: [number, number][] = [];

  /** Counts a faulty edge; false for one with as many triangles each way. */
  add(u: number, v: number, codes: Uint32Array): boolean {
    let back = 0;
    for (const code of codes) back += code & 1;
    if (2 * back === codes.length) return false;
    if (codes.length % 2 === 1) {
      this.open++;
      if (this.firstOpen.length < FEW) this.firstOpen.push([u, v]);
    } else {
      this.flipped++;
      if (this.firstFlipped.length < FEW) this.firstFlipped.push([u, v]);
    }
    return true;
  }
}

function pairUp(codes: readonly number[], shells: JoinedSets): void {
  const forward = codes.filter((code) => (code & 1) === 0).map(triangleOf);
  const back = codes.filter((code) => (code & 1) === 1).map(triangleOf);
  const left: number[] = [];
  for (const t of forward) {
    const mate = back.findIndex((other) => shells.find(other) === shells.find(t));
    if (mate < 0) left.push(t);
    else back.splice(mate, 1);
  }
  left.forEach((t, i) => {
    shells.join(t, back[i]!);
  });
}
