import * as z from 'zod';
import {
  axis,
  BASES,
  matrix,
  plane,
  products,
  quantity,
  text,
  triple,
  uncertainQuantity,
  uncertainTriple,
  yesNo,
} from './schema-quantity.ts';
import { solid } from './schema-solid.ts';

const angle = quantity.optional();

/** One turn about the parent's axes. That it is one form only is judged with the part. */
export const rotation = z.strictObject({
  x: angle.describe('angle about x'),
  y: angle.describe('angle about y'),
  z: angle.describe('angle about z'),
  axis: triple.optional().describe('turn about this direction by "angle"'),
  angle: angle.describe('angle about "axis"'),
  quaternion: z.tuple([text, text, text, text]).optional().describe('[w, x, y, z] of length 1'),
  matrix: matrix.optional().describe("rows; the columns are the local axes in the parent's"),
});

/** One way of copying. That it is one form only is judged with the part. */
export const repeat = z.strictObject({
  line: z
    .strictObject({
      count: quantity.describe('how many, with the original'),
      step: triple.describe('from one copy to the next'),
    })
    .optional()
    .describe('copies in a row'),
  ring: z
    .strictObject({
      count: quantity.describe('how many, with the original'),
      axis: axis.describe("the parent's axis the copies turn about"),
      through: triple.optional().describe('a point of the axis; [0, 0, 0] where left out'),
      angle: angle.describe('from the first to the last; 360 deg where left out'),
    })
    .optional()
    .describe('copies turned about an axis'),
  mirror: plane.optional().describe('the original and its mirror image'),
});

const element = uncertainQuantity.optional();

/** The inertia of a body with the maker's data. */
export const inertia = z.strictObject({
  xx: element.describe('moment about x'),
  yy: element.describe('moment about y'),
  zz: element.describe('moment about z'),
  xy: element.describe('product of inertia'),
  xz: element.describe('product of inertia'),
  yz: element.describe('product of inertia'),
  matrix: matrix.optional().describe('all nine elements by rows, instead of xx to yz'),
  about: z
    .union([z.enum(['centre', 'origin']), triple])
    .describe("centre, origin (the part's) or a point [x, y, z]"),
  products: products
    .optional()
    .describe('negative: Ixy = -∫ x y dm, the tensor element; positive: Pxy = +∫ x y dm'),
});

/** A body with known mass, centre and inertia. */
export const body = z.strictObject({
  mass: uncertainQuantity.describe('mass'),
  centre: uncertainTriple.optional().describe("centre of mass in the part's axes; the origin where left out"),
  inertia: inertia.describe('inertia tensor'),
});

/** A weighed mass that replaces the sum. */
export const override = z.strictObject({
  mass: uncertainQuantity.describe('the net mass to take instead'),
  reason: text.describe('why; listed wherever the totals are'),
});

/** A part, a group or an included assembly. */
export const part = z
  .strictObject({
    name: text.describe('unique among its siblings; without "/", "[" and "]"'),
    solid: solid.optional().describe('a solid by name and sizes'),
    body: body.optional().describe("a bought item with the maker's data"),
    include: text.optional().describe('another assembly file, relative to this one'),
    with: z.record(text, quantity).optional().describe('values for parameters of the included file'),
    state: z
      .union([text, z.record(text, text)])
      .optional()
      .describe("the included file's state: one name, or one for each state here"),
    mass: uncertainQuantity.optional().describe("the mass of the part's own solid"),
    material: text.optional().describe('a name from "materials"'),
    density: uncertainQuantity.optional().describe('density, instead of a material'),
    cut: yesNo.optional().describe('true: subtract this solid'),
    at: uncertainTriple.optional().describe("where the part's origin (or anchor) lies, in the parent's axes"),
    rotate: z.array(rotation).optional().describe("turns about the parent's fixed axes, in order"),
    anchor: z.enum(['centroid']).optional().describe('place the centroid instead of the origin'),
    image: plane.optional().describe('the mirror image instead of the part, after placing'),
    repeat: z
      .union([repeat, z.array(repeat).min(1)])
      .optional()
      .describe('copies, after placing'),
    maturity: text.optional().describe('a row of the growth table; goes down to children'),
    category: text.optional().describe('a group for sums; goes down to children'),
    basis: z.enum(BASES).optional().describe('where the mass comes from; goes down to children'),
    override: override.optional().describe('a net mass to take instead of the sum'),
    states: z.array(text).min(1).optional().describe('only in these states'),
    note: text.optional().describe('carried into reports'),
    source: text.optional().describe('carried into reports'),
    get parts(): z.ZodOptional<z.ZodArray<typeof part>> {
      return z.array(part).min(1).optional().describe("children, placed in this part's axes");
    },
  })
  .describe('a part, a group or an included assembly');
