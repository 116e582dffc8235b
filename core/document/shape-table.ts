import type * as z from 'zod';
import { type Definition, definitionOf } from './schema-walk.ts';

/** A schema as plain data: shapes refer to one another by their place in the table, for a part holds parts. */
export interface ShapeTable {
  readonly root: number;
  readonly shapes: readonly Shape[];
}

export type Shape =
  | { readonly kind: 'text' }
  | { readonly kind: 'choice'; readonly words: readonly string[] }
  | { readonly kind: 'union'; readonly of: readonly number[] }
  | { readonly kind: 'list'; readonly of: number; readonly least: number; readonly most: number | null }
  | { readonly kind: 'tuple'; readonly of: readonly number[] }
  | { readonly kind: 'record'; readonly of: number }
  | {
      readonly kind: 'mapping';
      readonly keys: Readonly<Record<string, number>>;
      readonly needed: readonly string[];
    };

/** The table of a schema of text, choices, lists, records, strict objects and unions of these. */
export function shapeTableOf(schema: z.ZodType): ShapeTable {
  const shapes: Shape[] = [];
  const known = new Map<Definition, number>();
  const indexOf = (inner: z.ZodType): number => {
    const definition = definitionOf(inner);
    const before = known.get(definition);
    if (before !== undefined) return before;
    const index = shapes.push({ kind: 'text' }) - 1;
    known.set(definition, index);
    shapes[index] = shapeOf(definition, indexOf);
    return index;
  };
  return { root: indexOf(schema), shapes };
}

function shapeOf(definition: Definition, indexOf: (schema: z.ZodType) => number): Shape {
  switch (definition.type) {
    case 'string':
      return { kind: 'text' };
    case 'enum':
      return { kind: 'choice', words: Object.keys(definition.entries!) };
    case 'union':
      return { kind: 'union', of: definition.options!.map(indexOf) };
    case 'array':
      return { kind: 'list', of: indexOf(definition.element!), ...lengthBounds(definition) };
    case 'tuple':
      return { kind: 'tuple', of: definition.items!.map(indexOf) };
    case 'record':
      return { kind: 'record', of: indexOf(definition.valueType!) };
    case 'object':
      return mappingOf(definition.shape!, indexOf);
    default:
      throw new Error(`a shape table knows no schema of type ${definition.type}`);
  }
}

function lengthBounds(definition: Definition): { least: number; most: number | null } {
  let least = 0;
  let most = Number.POSITIVE_INFINITY;
  for (const { _zod } of definition.checks ?? []) {
    const { minimum = 0, maximum = most, length } = _zod.def;
    least = Math.max(least, length ?? minimum);
    most = Math.min(most, length ?? maximum);
  }
  return { least, most: Number.isFinite(most) ? most : null };
}

function mappingOf(shape: Record<string, z.ZodType>, indexOf: (schema: z.ZodType) => number): Shape {
  const keys: Record<string, number> = {};
  const needed: string[] = [];
  for (const [key, schema] of Object.entries(shape)) {
    keys[key] = indexOf(schema);
    if ((schema._zod.def as unknown as Definition).type !== 'optional') needed.push(key);
  }
  return { kind: 'mapping', keys, needed };
}
