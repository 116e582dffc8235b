import type * as z from 'zod';
import type { PathStep, YamlValue } from '../yaml/value.ts';

/** The pieces of a zod definition that this folder looks at. */
export interface Definition {
  type: string;
  shape?: Record<string, z.ZodType>;
  innerType?: z.ZodType;
  options?: readonly z.ZodType[];
  element?: z.ZodType;
  items?: readonly z.ZodType[];
  valueType?: z.ZodType;
  entries?: Record<string, string>;
  checks?: readonly {
    _zod: { def: { check: string; minimum?: number; maximum?: number; length?: number } };
  }[];
}

/** A schema's definition, without `optional`. */
export function definitionOf(schema: z.ZodType): Definition {
  const definition = schema._zod.def as unknown as Definition;
  return definition.type === 'optional' ? definitionOf(definition.innerType!) : definition;
}

/** The three shapes a value can have. */
export type ValueShape = 'text' | 'list' | 'mapping';

export function shapeOfValue(value: YamlValue): ValueShape {
  if (typeof value === 'string') return 'text';
  return Array.isArray(value) ? 'list' : 'mapping';
}

const SHAPE_OF_TYPE: Record<string, ValueShape> = {
  string: 'text',
  enum: 'text',
  tuple: 'list',
  array: 'list',
  object: 'mapping',
  record: 'mapping',
};

/** The first branch of a union that fits a value's shape, else -1. */
export function branchFor(options: readonly z.ZodType[], shape: ValueShape): number {
  return options.findIndex((option) => SHAPE_OF_TYPE[definitionOf(option).type] === shape);
}

/** The definition that judges the value at a path, through unions by the value's shape. */
export function definitionAt(
  schema: z.ZodType,
  path: readonly PathStep[],
  root: YamlValue,
): Definition | undefined {
  let definition: Definition | undefined = definitionOf(schema);
  let value: YamlValue | undefined = root;
  for (const step of path) {
    const inner: z.ZodType | undefined = childSchema(narrow(definition, value), step);
    if (inner === undefined) return undefined;
    definition = definitionOf(inner);
    value = childValue(value, step);
  }
  return definition;
}

/** A union's branch for a value; any other definition as it is. */
export function narrow(definition: Definition, value: YamlValue | undefined): Definition {
  if (definition.type !== 'union' || value === undefined) return definition;
  const branch = branchFor(definition.options!, shapeOfValue(value));
  return branch < 0 ? definition : narrow(definitionOf(definition.options![branch]!), value);
}

function childSchema(definition: Definition, step: PathStep): z.ZodType | undefined {
  switch (definition.type) {
    case 'object':
      return Object.hasOwn(definition.shape!, step) ? definition.shape![step] : undefined;
    case 'record':
      return definition.valueType;
    case 'array':
      return definition.element;
    case 'tuple':
      return definition.items![Number(step)];
    default:
      return undefined;
  }
}

/** The value one step further, if there is one. */
export function childValue(value: YamlValue | undefined, step: PathStep): YamlValue | undefined {
  if (value === undefined || typeof value === 'string') return undefined;
  return (value as Record<PathStep, YamlValue>)[step];
}

/** The value at a path, if there is one. */
export function valueAt(root: YamlValue, path: readonly PathStep[]): YamlValue | undefined {
  return path.reduce<YamlValue | undefined>(childValue, root);
}

/** What a schema expects, in words: "text", "a list of 3 items", "xy, xz or yz". */
export function expectation(definition: Definition): string {
  switch (definition.type) {
    case 'enum':
      return oneOf(Object.keys(definition.entries!));
    case 'tuple':
      return `a list of ${definition.items!.length} items`;
    case 'array':
      return 'a list';
    case 'object':
    case 'record':
      return 'a mapping';
    case 'union':
      return oneOf(definition.options!.map((option) => expectation(definitionOf(option))));
    default:
      return 'text';
  }
}

/** "a", "a or b", "a, b or c". */
export function oneOf(words: readonly string[]): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} or ${words.at(-1)}`;
}
