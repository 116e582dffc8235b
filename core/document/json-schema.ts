import * as z from 'zod';
import { assembly } from './schema.ts';

type JsonSchema = Record<string, unknown>;

/**
 * The JSON Schema (draft 2020-12) of the assembly file, for editors. Editors see numbers and booleans where this
 * project reads text, so each text may be a string, a number or a boolean.
 */
export function assemblyJsonSchema(): JsonSchema {
  const made = z.toJSONSchema(assembly, {
    target: 'draft-2020-12',
    io: 'input',
    override: ({ zodSchema, jsonSchema }) => fitForEditors(zodSchema._zod.def.type, jsonSchema as JsonSchema),
  }) as JsonSchema;
  const named = JSON.parse(JSON.stringify(made).replaceAll('__schema0', 'part')) as JsonSchema;
  return { ...named, title: 'Assembly file', description: 'Mass properties of a machine, part by part' };
}

/** Takes one piece of the schema from what this project reads to what an editor sees. */
function fitForEditors(type: string, schema: JsonSchema): void {
  if (type === 'string') schema.type = ['string', 'number', 'boolean'];
  if (type === 'enum' && (schema.enum as string[]).includes('true')) {
    schema.type = 'boolean';
    delete schema.enum;
  }
  if (type === 'tuple') {
    const count = (schema.prefixItems as unknown[]).length;
    Object.assign(schema, { minItems: count, maxItems: count });
  }
  delete schema.propertyNames;
  if (isSolid(schema)) Object.assign(schema, { minProperties: 1, maxProperties: 1 });
}

function isSolid(schema: JsonSchema): boolean {
  const keys = schema.properties as JsonSchema | undefined;
  return keys !== undefined && 'cylinder' in keys;
}
