import type { Body } from '../inertia/body.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import { checkSizes, metres } from './check-sizes.ts';
import type {
  DimensionValue,
  Extent,
  SayLength,
  SolidDimensions,
  SolidFamily,
  SolidFault,
  SolidKey,
  SolidKind,
} from './dimensions.ts';
import { halfOf } from './twins.ts';

interface Definition {
  readonly about: string;
  readonly origin: string;
  readonly round?: boolean;
  readonly keys: readonly SolidKey[];
  make(dims: SolidDimensions): Body;
  extent(dims: SolidDimensions): Extent;
  /** The smallest of the lengths and sizes where left out. */
  smallest?(dims: SolidDimensions): number;
  /** Beyond each size alone, which is checked first. */
  check?(dims: SolidDimensions, say: SayLength): SolidFault | null;
}

/** A registry entry: the definition with sizes checked first and the smallest size found from the keys. */
export const defineSolid = (name: string, family: SolidFamily, definition: Definition): SolidKind => ({
  name,
  family,
  about: definition.about,
  origin: definition.origin,
  keys: definition.keys,
  round: definition.round ?? false,
  make: definition.make,
  extent: definition.extent,
  smallest: definition.smallest ?? ((dims) => smallestSize(definition.keys, dims)),
  check: (dims, say = metres) =>
    checkSizes(definition.keys, dims, say) ?? definition.check?.(dims, say) ?? null,
});

function smallestSize(keys: readonly SolidKey[], dims: SolidDimensions): number {
  let smallest = Infinity;
  for (const { name, kind } of keys) {
    const value = dims[name];
    if (kind === 'length') smallest = Math.min(smallest, value as number);
    else if (kind === 'size2' || kind === 'size3')
      smallest = Math.min(smallest, ...(value as readonly number[]));
  }
  return smallest;
}

// Reading a checked dimension.
export const number = (value: DimensionValue | undefined): number => value as number;
export const numbers = (value: DimensionValue | undefined): readonly [number, number, number] =>
  value as Vector3;

// Keys that many solids share.
export const DIAMETER: SolidKey = {
  name: 'diameter',
  kind: 'length',
  about: 'outer diameter',
  twins: [halfOf('radius', 'half the diameter')],
};
export const LENGTH: SolidKey = { name: 'length', kind: 'length', about: 'length along z' };
export const HEIGHT: SolidKey = { name: 'height', kind: 'length', about: 'height along z' };
export const ANGLE: SolidKey = {
  name: 'angle',
  kind: 'angle',
  about: 'angle about z, counter-clockwise from +x',
  default: 2 * Math.PI,
};

/** Box of a body centred on z whose half widths are x and y, between two heights. */
export const around = (x: number, y: number, from: number, to: number): Extent => ({
  min: [-x, -y, from],
  max: [x, y, to],
});

/** Box around points [m]. */
export function aroundPoints(points: readonly Vector3[]): Extent {
  const min: [number, number, number] = [Infinity, Infinity, Infinity];
  const max: [number, number, number] = [-Infinity, -Infinity, -Infinity];
  for (const point of points)
    for (let i = 0; i < 3; i++) {
      min[i] = Math.min(min[i]!, point[i]!);
      max[i] = Math.max(max[i]!, point[i]!);
    }
  return { min, max };
}
