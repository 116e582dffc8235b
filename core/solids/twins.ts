import type { DimensionValue, SolidDimensions, SolidFault, SolidKey, SolidKind, Twin } from './dimensions.ts';

/** `radius` beside `diameter`, `top_radius` beside `top_diameter`, and so on: half the size. */
export const halfOf = (name: string, about: string): Twin => ({
  name,
  about,
  resolve: (value) => 2 * value,
});

/** `bore` and `bore_radius` beside `wall`: half the difference of two nearly equal numbers, exact by Sterbenz' lemma. */
export const BORE: readonly Twin[] = [
  {
    name: 'bore',
    about: 'inner diameter, instead of the wall',
    resolve: (value, dims) => ((dims.diameter as number) - value) / 2,
  },
  {
    name: 'bore_radius',
    about: 'half the bore',
    resolve: (value, dims) => (dims.diameter as number) / 2 - value,
  },
];

/** Every name a solid's dimensions may bear, its twins included, in the order of the format. */
export const namesOf = (solid: SolidKind): string[] =>
  solid.keys.flatMap((key) => [key.name, ...(key.twins ?? []).map((twin) => twin.name)]);

/**
 * Fills in each key from the twin that was given, and defaults. What was given stays, so that a fault can point at it.
 *
 * @param given at most one name of each family of twins (`checkNames`), all in SI
 */
export function resolveTwins(solid: SolidKind, given: SolidDimensions): SolidDimensions {
  const dims: Record<string, DimensionValue | undefined> = { ...given };
  for (const key of solid.keys) {
    if (dims[key.name] !== undefined) continue;
    const twin = givenTwin(key, given);
    dims[key.name] = twin ? twin.resolve(given[twin.name] as number, dims) : key.default;
  }
  return dims;
}

/**
 * Whether the names given are those the solid takes: each key once, by itself or by one twin.
 *
 * @returns SOLID_KEY_UNKNOWN, SOLID_KEY_TWICE, SOLID_KEY_MISSING or null
 */
export function checkNames(solid: SolidKind, given: readonly string[]): SolidFault | null {
  const known = namesOf(solid);
  const unknown = given.find((name) => !known.includes(name));
  if (unknown !== undefined)
    return {
      code: 'SOLID_KEY_UNKNOWN',
      message: `a ${solid.name} has no "${unknown}"; it takes ${known.length ? known.join(', ') : 'no keys'}.`,
      key: unknown,
    };
  for (const key of solid.keys) {
    const names = [key.name, ...(key.twins ?? []).map((twin) => twin.name)];
    const found = names.filter((name) => given.includes(name));
    if (found.length > 1)
      return {
        code: 'SOLID_KEY_TWICE',
        message: `"${found[0]}" and "${found[1]}" say the same size of a ${solid.name} twice.`,
        hint: 'keep one of them',
        key: found[1]!,
      };
    if (found.length === 0 && key.default === undefined)
      return {
        code: 'SOLID_KEY_MISSING',
        message: `a ${solid.name} needs ${names.map((name) => `"${name}"`).join(' or ')}: ${key.about}.`,
        key: key.name,
      };
  }
  return null;
}

/** The name under which the user gave a key: itself or a twin. */
export const givenName = (key: SolidKey, dims: SolidDimensions): string =>
  givenTwin(key, dims)?.name ?? key.name;

const givenTwin = (key: SolidKey, given: SolidDimensions): Twin | undefined =>
  key.twins?.find((twin) => given[twin.name] !== undefined);
