/** Point of a plane figure [m]; (x, y) of an outline or (r, z) of a profile. */
export type Vector2 = readonly [number, number];

/**
 * Moments of a plane figure, first about a pivot, then about its own centroid. Area positive, whichever way its
 * outline turns.
 */
export interface SectionMoments {
  /** [m²] */
  readonly area: number;
  /** Centroid in the figure's own axes [m]. */
  readonly u: number;
  readonly v: number;
  /** Central second moments ∫ (u−ū)² dA and so on [m⁴]. */
  readonly uu: number;
  readonly vv: number;
  readonly uv: number;
  /** Central third moments [m⁵]. */
  readonly uuu: number;
  readonly uuv: number;
  readonly uvv: number;
}

/**
 * Area, centroid, central second and third moments of a polygon with holes by Green's theorem, as a fan of triangles
 * to a local point (C. Steger, On the calculation of arbitrary moments of polygons, TU München FGBV-96-05, 1996). Two
 * passes: the second is about the centroid that the first found, so a figure far from its origin loses nothing.
 *
 * @param outline in either turning sense; closes by itself, a repeated last point does no harm
 * @param holes outlines inside it, in either turning sense
 */
export function sectionMoments(
  outline: readonly Vector2[],
  holes: readonly (readonly Vector2[])[],
): SectionMoments {
  const [pu, pv] = boxCentre(outline);
  let sums = firstMoments(outline, pu, pv);
  for (const hole of holes) {
    const inner = firstMoments(hole, pu, pv);
    sums = { area: sums.area - inner.area, u: sums.u - inner.u, v: sums.v - inner.v };
  }
  const u = pu + sums.u / sums.area;
  const v = pv + sums.v / sums.area;
  const higher = [0, 0, 0, 0, 0, 0];
  addHigher(higher, outline, u, v, 1);
  for (const hole of holes) addHigher(higher, hole, u, v, -1);
  const [uu, vv, uv, uuu, uuv, uvv] = higher as [number, number, number, number, number, number];
  return { area: sums.area, u, v, uu, vv, uv, uuu, uuv, uvv };
}

/** Centre of the bounding box: near the figure, so that the fan's triangles are no larger than they need be. */
function boxCentre(points: readonly Vector2[]): Vector2 {
  let minU = Infinity;
  let maxU = -Infinity;
  let minV = Infinity;
  let maxV = -Infinity;
  for (const [u, v] of points) {
    if (u < minU) minU = u;
    if (u > maxU) maxU = u;
    if (v < minV) minV = v;
    if (v > maxV) maxV = v;
  }
  return [minU + (maxU - minU) / 2, minV + (maxV - minV) / 2];
}

/** Area and first moments about the pivot, signs made those of a counter-clockwise outline. */
function firstMoments(points: readonly Vector2[], pu: number, pv: number) {
  let area = 0;
  let u = 0;
  let v = 0;
  const last = points[points.length - 1]!;
  let au = last[0] - pu;
  let av = last[1] - pv;
  for (const point of points) {
    const bu = point[0] - pu;
    const bv = point[1] - pv;
    const twice = au * bv - bu * av;
    area += twice;
    u += twice * (au + bu);
    v += twice * (av + bv);
    au = bu;
    av = bv;
  }
  const sign = area < 0 ? -1 : 1;
  return { area: (sign * area) / 2, u: (sign * u) / 6, v: (sign * v) / 6 };
}

/** Adds uu, vv, uv, uuu, uuv, uvv about the pivot, times `k`, to `sums`. */
function addHigher(sums: number[], points: readonly Vector2[], pu: number, pv: number, k: number): void {
  let area = 0;
  let uu = 0;
  let vv = 0;
  let uv = 0;
  let uuu = 0;
  let uuv = 0;
  let uvv = 0;
  const last = points[points.length - 1]!;
  let au = last[0] - pu;
  let av = last[1] - pv;
  for (const point of points) {
    const bu = point[0] - pu;
    const bv = point[1] - pv;
    const twice = au * bv - bu * av;
    area += twice;
    const puu = au * au + au * bu + bu * bu;
    const pvv = av * av + av * bv + bv * bv;
    uu += twice * puu;
    vv += twice * pvv;
    uv += twice * (2 * au * av + au * bv + bu * av + 2 * bu * bv);
    uuu += twice * (au + bu) * (au * au + bu * bu);
    uuv += twice * (av * (2 * au * au + puu + au * bu) + bv * (2 * bu * bu + puu + au * bu));
    uvv += twice * (au * (2 * av * av + pvv + av * bv) + bu * (2 * bv * bv + pvv + av * bv));
    au = bu;
    av = bv;
  }
  const signed = area < 0 ? -k : k;
  sums[0]! += (signed * uu) / 12;
  sums[1]! += (signed * vv) / 12;
  sums[2]! += (signed * uv) / 24;
  sums[3]! += (signed * uuu) / 20;
  sums[4]! += (signed * uuv) / 60;
  sums[5]! += (signed * uvv) / 60;
}
