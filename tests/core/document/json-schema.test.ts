import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import * as z from 'zod';
import { assemblyJsonSchema } from '../../../core/document/json-schema.ts';

const HERON = readFileSync(new URL('heron.yaml', import.meta.url), 'utf8');

type Json = { [key: string]: Json } & { description?: string };

const schema = assemblyJsonSchema() as unknown as Json;
const part = schema.$defs!.part!.properties!;

describe('assemblyJsonSchema', () => {
  it('is of draft 2020-12 and refers to parts by name', () => {
    expect(schema.$schema).toBe('https://json-schema.org/draft/2020-12/schema');
    expect(Object.keys(schema.$defs!)).toEqual(['part']);
    expect(JSON.stringify(schema)).not.toContain('__schema');
  });

  it('describes every key of the file and of a part', () => {
    for (const [key, value] of [...Object.entries(schema.properties!), ...Object.entries(part)]) {
      expect((value as { description?: string }).description, key).toBeTruthy();
    }
  });

  it('lets editors see numbers and booleans where this project reads text', () => {
    expect(part.name!.type).toEqual(['string', 'number', 'boolean']);
    expect(part.cut!.type).toBe('boolean');
  });

  it('offers exactly one solid, and three items for a place', () => {
    const solids = (part.solid!.anyOf as unknown as Json[])[1]!;
    expect(solids).toMatchObject({ minProperties: 1, maxProperties: 1, additionalProperties: false });
    expect(part.at).toMatchObject({ minItems: 3, maxItems: 3 });
  });

  it('accepts the example as an editor sees it, with numbers for text', () => {
    const check = z.fromJSONSchema(schema as never);
    expect(check.safeParse(parse(HERON)).error?.issues).toBeUndefined();
  });

  it('demands a mesh’s file and unit, and one state where there are states', () => {
    const solids = (part.solid!.anyOf as unknown as Json[])[1]!.properties!;
    expect(solids.mesh!.required).toEqual(['file', 'unit']);
    expect(schema.properties!.states!.minProperties).toBe(1);
    expect(schema.properties!.states!.description).toContain('nominal');
  });

  it('refuses an unknown key', () => {
    const check = z.fromJSONSchema(schema as never);
    expect(check.safeParse({ ...parse(HERON), junk: 1 }).success).toBe(false);
  });
});
