import type { Vector3 } from './vector3.ts';

/**
 * The rotation that turns x, y, z into three right-handed unit axes, as a quaternion (Shepperd's method, 1978: the
 * largest component first, so nothing is divided by a small number).
 *
 * @param axes rows are the axes that x, y, z turn into
 * @returns [w, x, y, z] of unit length, w not negative (of w = 0, the first other component not negative)
 */
export function quaternionFromAxes(
  axes: readonly [Vector3, Vector3, Vector3],
): [number, number, number, number] {
  // The matrix of the rotation has the axes as columns: m[r][c] = axes[c][r].
  const m = (r: 0 | 1 | 2, c: 0 | 1 | 2) => axes[c][r];
  const squares = [
    1 + m(0, 0) + m(1, 1) + m(2, 2),
    1 + m(0, 0) - m(1, 1) - m(2, 2),
    1 - m(0, 0) + m(1, 1) - m(2, 2),
    1 - m(0, 0) - m(1, 1) + m(2, 2),
  ];
  const largest = squares.indexOf(Math.max(...squares));
  const four = 2 * Math.sqrt(squares[largest]!);
  const wx = (m(2, 1) - m(1, 2)) / four;
  const wy = (m(0, 2) - m(2, 0)) / four;
  const wz = (m(1, 0) - m(0, 1)) / four;
  const xy = (m(0, 1) + m(1, 0)) / four;
  const xz = (m(0, 2) + m(2, 0)) / four;
  const yz = (m(1, 2) + m(2, 1)) / four;
  const own = four / 4;
  const q: [number, number, number, number] =
    largest === 0
      ? [own, wx, wy, wz]
      : largest === 1
        ? [wx, own, xy, xz]
        : largest === 2
          ? [wy, xy, own, yz]
          : [wz, xz, yz, own];
  const lead = q.find((v) => v !== 0) ?? 1;
  return q.map((v) => (lead < 0 ? 0 - v : v + 0)) as [number, number, number, number];
}
