/** A small machine of two parts with a limit, in two states; other masses make other stamps. */
export const machineText = (tip = 1, limit = 3.5): string => `assembly: rover
units: { length: mm, mass: kg, angle: deg }
states: { driving: {}, parked: { omit: [tip] } }
parts:
  - { name: cube, solid: { box: { size: [100, 120, 140] } }, mass: 2, maturity: measured }
  - { name: tip, solid: particle, mass: ${tip}, at: [300, 0, 0], maturity: estimated }
growth: { estimated: 10 %, measured: 0 % }
limits:
  - { name: all up, quantity: mass, max: ${limit} kg, id: RV-1 }
`;
