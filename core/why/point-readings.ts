import { moveToCentre } from '../inertia/possible-readings.ts';
import type { Symmetric3 } from '../linalg/symmetric3.ts';
import type { Vector3 } from '../linalg/vector3.ts';

/** A way to have taken the reference point: how many times m K(c) is in the numbers beyond the central tensor. */
export interface PointReading {
  readonly words: string;
  /** Multiples of the shift from the origin that are in the numbers. */
  readonly shifts: number;
}

/** Readings other than the declared one, by what was declared. */
export function pointReadings(declared: 'centre' | 'origin' | 'point'): readonly PointReading[] {
  if (declared === 'centre')
    return [
      { words: 'about the origin, not about its centre', shifts: 1 },
      { words: 'shifted twice from its centre to the origin', shifts: 2 },
      { words: 'shifted from its centre the wrong way', shifts: -1 },
    ];
  const said = declared === 'origin' ? 'the origin' : 'the point it says';
  return [
    { words: `about its centre, not about ${said}`, shifts: 0 },
    ...(declared === 'point' ? [{ words: `about the origin, not about ${said}`, shifts: 1 }] : []),
    { words: 'shifted twice from its centre to the origin', shifts: 2 },
    { words: 'shifted from its centre the wrong way', shifts: -1 },
  ];
}

/**
 * The central tensor that numbers stand for under a reading: J − k m (|c|² 1 − c cᵀ).
 *
 * @param centre from the origin of the numbers' axes [m]
 */
export const centralUnder = (
  inertia: Symmetric3,
  mass: number,
  centre: Vector3,
  shifts: number,
): Symmetric3 => (shifts === 0 ? inertia : moveToCentre(inertia, shifts * mass, centre));
