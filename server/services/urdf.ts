import type { RollUpRecord } from '#core/record/record.ts';

/**
 * The body as a URDF `<inertial>` element: mass [kg], centre [m] from the body origin, tensor about the centre in body
 * axes [kg·m²]. URDF's ixy is the tensor's own element (−∫ x y dm), as here; rpy stays zero.
 */
export function urdfInertial({
  assembly,
  state,
  stamp,
  conventions,
  ...record
}: RollUpRecord): string | null {
  const on = conventions.growth ? 'predicted' : 'basic';
  const { mass, centre, inertia } = record[on];
  if (!centre || !inertia) return null;
  const [x, y, z] = inertia.aboutCentre;
  // Two hyphens would end the comment.
  const said =
    `${assembly}, ${state}, ${on}; stamp ${stamp}; kg, m, kg*m^2, products as tensor elements`.replace(
      /--+/g,
      '-',
    );
  return `<?xml version="1.0" encoding="UTF-8"?>
<!-- ${said.replace(/[<>&]/g, ' ')} -->
<inertial>
  <origin xyz="${centre.join(' ')}" rpy="0 0 0"/>
  <mass value="${mass}"/>
  <inertia ixx="${x[0]}" ixy="${x[1]}" ixz="${x[2]}" iyy="${y[1]}" iyz="${y[2]}" izz="${z[2]}"/>
</inertial>
`;
}
