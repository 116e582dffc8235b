import type { Body } from '../inertia/body.ts';

/** A body of unit density whose axes are principal axes of it: centre on the z axis, second moments m·(xx, yy, zz). */
export const bodyOnAxis = (mass: number, z: number, xx: number, yy: number, zz: number): Body => ({
  mass,
  centre: [0, 0, z],
  secondMoments: [mass * xx, mass * yy, mass * zz, 0, 0, 0],
});
