/** A unit in which makers print moments of inertia, and how many kg·m² one of it is. */
interface InertiaUnit {
  readonly name: string;
  readonly factor: number;
}

// Exact by definition: 1 in = 0.0254 m, 1 ft = 0.3048 m, 1 lb = 0.45359237 kg, g₀ = 9.80665 m/s² (NIST SP 811).
const LB = 0.45359237;
const IN = 0.0254;
const FT = 0.3048;
const LBF = LB * 9.80665;
const SLUG = LBF / FT;

/** Most used first: of two pairs with one ratio the earlier is named. */
const UNITS: readonly InertiaUnit[] = [
  { name: 'kg·m²', factor: 1 },
  { name: 'g·mm²', factor: 1e-9 },
  { name: 'kg·mm²', factor: 1e-6 },
  { name: 'g·cm²', factor: 1e-7 },
  { name: 'kg·cm²', factor: 1e-4 },
  { name: 'lb·in²', factor: LB * IN * IN },
  { name: 'lb·ft²', factor: LB * FT * FT },
  { name: 'slug·ft²', factor: SLUG * FT * FT },
  { name: 'oz·in²', factor: (LB / 16) * IN * IN },
  { name: 'lbf·in·s²', factor: LBF * IN },
  { name: 'slug·in²', factor: SLUG * IN * IN },
  { name: 't·mm²', factor: 1e-3 },
  { name: 't·m²', factor: 1e3 },
  { name: 'g·m²', factor: 1e-3 },
  { name: 'kgf·m·s²', factor: 9.80665 },
];

/** Numbers that are in one unit and were taken to be in another: true value = taken value × ratio. */
export interface UnitSlip {
  readonly is: string;
  readonly readAs: string;
  readonly ratio: number;
}

/** Every pair, unlike ratios once, the pair of the most used units for each. */
export const UNIT_SLIPS: readonly UnitSlip[] = (() => {
  const slips: (UnitSlip & { rank: number })[] = [];
  UNITS.forEach((is, i) => {
    UNITS.forEach((as, j) => {
      if (i !== j) slips.push({ is: is.name, readAs: as.name, ratio: is.factor / as.factor, rank: i + j });
    });
  });
  slips.sort((a, b) => a.rank - b.rank);
  const known: UnitSlip[] = [];
  for (const { rank: _, ...slip } of slips) {
    const isNew =
      Math.abs(slip.ratio - 1) > 1e-9 && !known.some((k) => Math.abs(k.ratio / slip.ratio - 1) < 1e-9);
    if (isNew) known.push(slip);
  }
  return known;
})();
