import type { YamlMapping, YamlValue } from '../yaml/value.ts';
import type { Shape, ShapeTable } from './shape-table.ts';

type Check = (value: unknown) => boolean;

/**
 * Makes a plain yes-or-no check from a table of shapes. It answers as the schema's `safeParse(value).success` does, some
 * ten times as fast from the first call: files are nearly always right, and only wrong ones need the issues.
 */
export function quickCheck({ root, shapes }: ShapeTable): Check {
  const checks: Check[] = [];
  const at =
    (index: number): Check =>
    (value) =>
      checks[index]!(value);
  for (const shape of shapes) checks.push(checkOf(shape, at));
  return checks[root]!;
}

function checkOf(shape: Shape, at: (index: number) => Check): Check {
  switch (shape.kind) {
    case 'text':
      return (value) => typeof value === 'string';
    case 'choice':
      return choice(new Set(shape.words));
    case 'union':
      return anyOf(shape.of.map(at));
    case 'list':
      return listOf(at(shape.of), shape.least, shape.most ?? Number.POSITIVE_INFINITY);
    case 'tuple':
      return tupleOf(shape.of.map(at));
    case 'record':
      return recordOf(at(shape.of));
    case 'mapping':
      return mappingOf(new Map(Object.entries(shape.keys).map(([key, of]) => [key, at(of)])), shape.needed);
  }
}

function choice(words: ReadonlySet<unknown>): Check {
  return (value) => words.has(value);
}

function anyOf(checks: readonly Check[]): Check {
  return (value) => {
    for (const check of checks) if (check(value)) return true;
    return false;
  };
}

function listOf(check: Check, least: number, most: number): Check {
  return (value) => {
    if (!Array.isArray(value) || value.length < least || value.length > most) return false;
    for (const item of value as YamlValue[]) if (!check(item)) return false;
    return true;
  };
}

function tupleOf(checks: readonly Check[]): Check {
  return (value) => {
    if (!Array.isArray(value) || value.length !== checks.length) return false;
    for (let i = 0; i < checks.length; i++) if (!checks[i]!(value[i])) return false;
    return true;
  };
}

function isMapping(value: unknown): value is YamlMapping {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function recordOf(check: Check): Check {
  return (value) => {
    if (!isMapping(value)) return false;
    for (const key in value) if (!check(value[key])) return false;
    return true;
  };
}

function mappingOf(checks: ReadonlyMap<string, Check>, needed: readonly string[]): Check {
  return (value) => {
    if (!isMapping(value)) return false;
    for (const key of needed) if (!(key in value)) return false;
    for (const key in value) {
      const check = checks.get(key);
      if (check === undefined || !check(value[key])) return false;
    }
    return true;
  };
}
