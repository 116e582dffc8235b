import * as z from 'zod';
import { part, rotation } from './schema-part.ts';
import { material, parameter, products, quantity, text, uncertainTriple } from './schema-quantity.ts';

const note = text.optional().describe('carried into reports');

const units = z.strictObject({
  length: text.optional().describe('m where left out'),
  mass: text.optional().describe('kg where left out'),
  angle: text.optional().describe('rad where left out'),
  density: text.optional().describe('mass over length cubed where left out'),
  inertia: text.optional().describe('mass times length squared where left out'),
});

const frameWords = z.strictObject({
  origin: text.describe('where the origin lies, in words'),
  x: text.describe('where x points, in words'),
  y: text.describe('where y points, in words'),
  z: text.describe('where z points, in words'),
  note,
});

const otherFrame = z.strictObject({
  at: uncertainTriple.optional().describe("the frame's origin"),
  rotate: z.array(rotation).optional().describe('turns about the fixed axes, in order'),
  note,
  source: note,
});

const growth = z.record(text, z.union([quantity, z.record(text, quantity)]));

const state = z.strictObject({
  parameters: z.record(text, quantity).optional().describe('values in this state'),
  omit: z.array(text).optional().describe('paths of parts left out'),
  note,
});

/** A bound on a quantity of the roll-up. */
export const limit = z.strictObject({
  name: text.describe('unique among the limits'),
  quantity: text.describe('an expression of quantities, such as mass or centre.x'),
  min: quantity.optional().describe('the smallest value allowed'),
  max: quantity.optional().describe('the largest value allowed'),
  of: text.optional().describe("a part's path; the whole where left out"),
  frame: text.optional().describe('a name from "frames"'),
  on: z.enum(['basic', 'predicted']).optional().describe('predicted where the file has growth'),
  states: z.array(text).min(1).optional().describe('only in these states'),
  id: text.optional().describe('the number of the requirement'),
  source: note,
  owner: text.optional().describe('who answers for it'),
  note,
  waiver: z
    .strictObject({
      until: text.describe('last day, YYYY-MM-DD'),
      reason: text.describe('why'),
      by: text.describe('who granted it'),
    })
    .optional()
    .describe('a dated permission to miss the limit'),
});

const range = z.strictObject({
  from: quantity.describe('the first value'),
  to: quantity.describe('the last value'),
  step: quantity.optional().describe('from one value to the next'),
  count: quantity.optional().describe('how many values, instead of a step'),
});

/** A grid of parameter values. */
export const sweep = z.strictObject({
  vary: z.record(text, z.union([z.array(quantity).min(1), range])).describe('the values of each parameter'),
  states: z.array(text).min(1).optional().describe('only in these states'),
  keep: z.array(text).min(1).optional().describe('quantities to keep of each point'),
  note,
});

/** The whole assembly file, every scalar as text. */
export const assembly = z.strictObject({
  assembly: text.describe('the name of the assembly'),
  note,
  source: note,
  units: units.optional().describe('units of bare numbers; SI where left out'),
  products: products.optional().describe('the sign of products of inertia in bodies that state none'),
  frame: frameWords.optional().describe('the axes everything is placed in, in words'),
  parameters: z.record(text, parameter).optional().describe('named quantities; may use one another'),
  materials: z.record(text, material).optional().describe('named densities'),
  frames: z.record(text, otherFrame).optional().describe("others' points and axes, for output and limits"),
  growth: growth.optional().describe('growth allowance by maturity, or by category and maturity'),
  states: z
    .record(text, state)
    .meta({ minProperties: 1 })
    .optional()
    .describe('named states; one, nominal, where left out'),
  parts: z.array(part).min(1).describe('the parts'),
  limits: z.array(limit).optional().describe('bounds to judge'),
  sweeps: z.record(text, sweep).optional().describe('named grids of parameter values'),
});

export type AssemblyDocument = z.infer<typeof assembly>;
export type PartDocument = z.infer<typeof part>;
export type LimitDocument = z.infer<typeof limit>;
export type SweepDocument = z.infer<typeof sweep>;
export type WaiverDocument = NonNullable<LimitDocument['waiver']>;
export type StateDocument = z.infer<typeof state>;
export type UnitsDocument = z.infer<typeof units>;
export type FrameWordsDocument = z.infer<typeof frameWords>;
export type FrameDocument = z.infer<typeof otherFrame>;
export type GrowthDocument = z.infer<typeof growth>;
export type RangeDocument = z.infer<typeof range>;
export type ParameterDocument = z.infer<typeof parameter>;
export type MaterialDocument = z.infer<typeof material>;
export type BodyDocument = NonNullable<PartDocument['body']>;
export type InertiaDocument = NonNullable<BodyDocument['inertia']>;
export type RotationDocument = z.infer<typeof rotation>;
export type RepeatDocument = Exclude<NonNullable<PartDocument['repeat']>, unknown[]>;
export type OverrideDocument = NonNullable<PartDocument['override']>;
export type UncertainQuantityDocument = NonNullable<PartDocument['mass']>;
export type { SolidDocument, SolidKeysDocument } from './schema-solid.ts';
