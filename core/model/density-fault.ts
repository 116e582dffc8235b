/** Heaviest density that anything is made of is 22.6 g/cm³; beyond this it is a slip of units. [kg/m³] */
const DENSITY_AT_MOST = 25_000;

/**
 * @param density [kg/m³]
 * @returns the fault of a density that no material has, or null
 */
export function densityFault(density: number): { code: string; message: string; hint: string } | null {
  if (density > 0 && density <= DENSITY_AT_MOST) return null;
  if (density <= 0)
    return {
      code: 'DENSITY_NOT_POSITIVE',
      message: `expected a density above zero, found ${density} kg/m^3`,
      hint: 'a cut-out takes the density of its host; write `cut: true` rather than a negative density',
    };
  return {
    code: 'DENSITY_TOO_LARGE',
    message: `expected a density of at most 25 g/cm^3 (nothing is denser than 22.6), found ${Number((density / 1000).toPrecision(6))} g/cm^3`,
    hint: 'write its unit with it, for instance 2700 kg/m^3 or 2.7 g/cm^3; a bare number is in the base units of the file',
  };
}
