/** What `steelyard new` writes: small, complete, and with each idea of the format once. */
export const STARTER = `# A starter assembly. Roll it up:     steelyard run FILE
#                      Judge limits:   steelyard check FILE
# What each solid takes:               steelyard solids
assembly: my machine
units: { length: mm, mass: g, angle: deg }     # of bare numbers; a unit may be written anywhere
frame:
  origin: centre of the base plate, on its upper face
  x: forward
  y: left
  z: up

parameters:
  reach: 180 mm
  wall: { value: 2 mm, min: 1 mm, max: 4 mm }

materials:
  al6061: { density: 2700 kg/m^3 }

growth: { estimated: 15 %, released: 3 %, measured: 0 % }

parts:
  - name: base plate
    solid: { box: { size: [ 120, 80, 6 ] } }
    material: al6061
    at: [ 0, 0, -3 ]
    maturity: released
    basis: calculated
    parts:                                     # a cut takes its material from the part it stands in
      - name: cable hole
        solid: { cylinder: { diameter: 20, length: 6 } }
        cut: true
        at: [ 30, 0, 0 ]

  - name: arm
    solid: { tube: { diameter: 24, wall: wall, length: reach } }
    material: al6061
    at: [ reach / 2, 0, 12 ]
    rotate: [ { y: 90 deg } ]                  # a tube lies along its own z: turn it to x
    maturity: estimated
    basis: calculated

  - name: motor                                # a bought item with the maker's data
    body:
      mass: 152 g
      centre: [ 0, 0, 14 ]
      inertia: { xx: 21500 g*mm^2, yy: 21500 g*mm^2, zz: 18400 g*mm^2, xy: 0, xz: 0, yz: 0, about: centre }
    at: [ reach, 0, 12 ]
    maturity: measured
    basis: measured
    source: data sheet, weighed

limits:
  - { name: total mass, quantity: mass, max: 480 g }
  - { name: centre forward, quantity: centre.x, min: 40 mm, max: 110 mm }
`;
