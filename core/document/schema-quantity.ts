import * as z from 'zod';

/** Any text. Quantities and expressions stay text here; they are parsed where units and parameters are known. */
export const text = z.string();

/** A number with or without a unit, or an expression. */
export const quantity = text;

/** `true` or `false`, as text like everything else. */
export const yesNo = z.enum(['true', 'false']);

export const pair = z.tuple([text, text]);
export const triple = z.tuple([text, text, text]);
export const matrix = z.tuple([triple, triple, triple]);

const uncertainty = {
  u: quantity.optional().describe('standard uncertainty; a percentage is relative'),
  tol: quantity.optional().describe('half-width of a rectangular distribution; write one of u and tol'),
};

/** A quantity, plain or with its uncertainty. */
export const uncertainQuantity = z.union([
  quantity,
  z.strictObject({ value: quantity.describe('the quantity'), ...uncertainty }),
]);

/** Two lengths, each plain or with its uncertainty. */
export const uncertainPair = z.tuple([uncertainQuantity, uncertainQuantity]);

/** Three lengths, each plain or with its uncertainty. */
export const uncertainTriple = z.tuple([uncertainQuantity, uncertainQuantity, uncertainQuantity]);

/** A parameter: a quantity, or one with bounds and uncertainty. */
export const parameter = z.union([
  quantity,
  z.strictObject({
    value: quantity.describe('the quantity; other parameters may be used'),
    min: quantity.optional().describe('the smallest value allowed, in every state and sweep'),
    max: quantity.optional().describe('the largest value allowed, in every state and sweep'),
    ...uncertainty,
    note: text.optional().describe('carried into reports'),
    source: text.optional().describe('carried into reports'),
  }),
]);

/** A material. */
export const material = z.strictObject({
  density: uncertainQuantity.describe('mass over volume, such as 2700 kg/m^3'),
  ...uncertainty,
  note: text.optional().describe('carried into reports'),
  source: text.optional().describe('carried into reports'),
});

export const PLANES = ['xy', 'xz', 'yz'] as const;
export const AXES = ['x', 'y', 'z'] as const;
export const BASES = ['estimated', 'calculated', 'measured'] as const;
export const PRODUCT_SIGNS = ['negative', 'positive'] as const;

export const plane = z.enum(PLANES);
export const axis = z.enum(AXES);
export const products = z.enum(PRODUCT_SIGNS);
