import * as z from 'zod';
import { pair, text, triple, uncertainPair, uncertainQuantity, uncertainTriple } from './schema-quantity.ts';
import {
  type KeyShape,
  SOLID_KEY_SHAPES,
  SOLIDS,
  type SolidKey,
  type SolidKeys,
  type SolidName,
  VERTEX_COUNT,
  writtenKey,
} from './solid-keys.ts';

type UncertainQuantity = z.infer<typeof uncertainQuantity>;
type Pair = [string, string];
type Triple = [string, string, string];

interface ShapeTypes {
  text: string;
  quantity: UncertainQuantity;
  pair: [UncertainQuantity, UncertainQuantity];
  triple: [UncertainQuantity, UncertainQuantity, UncertainQuantity];
  pairs: Pair[];
  triples: Triple[];
  outlines: Pair[][];
  faces: string[][];
  fill: 'solid' | 'shell';
}

type ShapeOf<K extends SolidKey> = ShapeTypes[(typeof SOLID_KEY_SHAPES)[K][0]];
type Written<K extends SolidKey> = K extends 'box_size' | 'flat_size' ? 'size' : K;
type KeysOf<S> = S extends {
  needs: readonly (readonly (infer K)[])[];
  must?: readonly (infer N)[];
  may?: readonly (infer M)[];
}
  ? K | N | M
  : never;

/** The keys of one solid as they stand in a file, all text. Which of them are needed is in SOLIDS. */
export type SolidKeysDocument<N extends SolidName> = {
  [K in Extract<KeysOf<(typeof SOLIDS)[N]>, SolidKey> as Written<K>]?: ShapeOf<K>;
};

/** `particle`, or a mapping with exactly one solid's name. */
export type SolidDocument = 'particle' | { [N in SolidName]?: SolidKeysDocument<N> };

const polygon = z.array(pair).min(3);

const SHAPES: Record<KeyShape, z.ZodType> = {
  text,
  quantity: uncertainQuantity,
  pair: uncertainPair,
  triple: uncertainTriple,
  pairs: polygon,
  triples: z.array(triple).min(3),
  outlines: z.array(polygon),
  faces: z.array(z.array(text).min(3)).min(4),
  fill: z.enum(['solid', 'shell']),
};

/** The schema of one key, made once for all solids that have it. */
const KEY_SCHEMAS = Object.fromEntries(
  Object.entries(SOLID_KEY_SHAPES).map(([key, [shape, description]]) => [
    key,
    SHAPES[shape].describe(description),
  ]),
) as unknown as Record<SolidKey, z.ZodType>;

const OPTIONAL_KEYS = Object.fromEntries(
  Object.entries(KEY_SCHEMAS).map(([key, schema]) => [key, schema.optional()]),
) as unknown as Record<SolidKey, z.ZodType>;

function solidSchema(name: SolidName, { about, needs, must = [], may = [] }: SolidKeys): z.ZodType {
  const keys = [
    ...must.map((key) => [writtenKey(key), KEY_SCHEMAS[key]]),
    ...[...needs.flat(), ...may].map((key) => [writtenKey(key), OPTIONAL_KEYS[key]]),
  ];
  const shape = Object.fromEntries(keys) as Record<string, z.ZodType>;
  const corners = VERTEX_COUNT[name];
  if (corners !== undefined)
    shape.vertices = z.array(triple).length(corners).optional().describe(`${corners} corners [x, y, z]`);
  return z.strictObject(shape).optional().describe(about);
}

const SOLID_SCHEMAS = Object.fromEntries(
  Object.entries(SOLIDS).map(([name, solid]) => [name, solidSchema(name as SolidName, solid)]),
);

/** A part's solid. That a mapping names one solid only is judged with the part. */
export const solid = z.union([z.enum(['particle']), z.strictObject(SOLID_SCHEMAS)]) as unknown as z.ZodType<
  SolidDocument,
  SolidDocument
>;
