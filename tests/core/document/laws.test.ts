import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parse, stringify } from 'yaml';
import { quickCheck } from '../../../core/document/quick-check.ts';
import { readDocument } from '../../../core/document/read-document.ts';
import { assembly } from '../../../core/document/schema.ts';
import { shapeTableOf } from '../../../core/document/shape-table.ts';
import { InputError } from '../../../core/errors.ts';

const HERON = readFileSync(new URL('heron.yaml', import.meta.url), 'utf8');
const SWEEP = `${HERON}sweeps:
  trade: { vary: { boom: { from: 1, to: 2, step: 1 }, wall: [ 1, "max(1, 2)" ] }, states: [ flight ], keep: [ mass ] }
`;
const isAssembly = quickCheck(shapeTableOf(assembly));

/** Reads a text that may be wrong in any way; anything thrown but an InputError with places is a failure. */
function readOrRefuse(text: string): void {
  try {
    readDocument(text, 'a.yaml');
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    expect(error.faults.length).toBeGreaterThan(0);
    const lines = text.split(/\r\n|\r|\n/);
    for (const { at, message } of error.faults) {
      expect(at!.line).toBeLessThanOrEqual(lines.length);
      expect(at!.column).toBeLessThanOrEqual(lines[at!.line - 1]!.length + 1);
      expect(message).not.toMatch(/undefined|\[object|NaN|\n$/);
    }
  }
}

const piece = fc.oneof(
  fc.constantFrom(
    '{',
    '}',
    '[',
    ']',
    ':',
    ': ',
    ',',
    '- ',
    '\n',
    '\n  ',
    '"',
    "'",
    '&a ',
    '*a',
    '!',
    '|',
    '>',
    '#',
    '(',
    ')',
    '\t',
    '?',
  ),
  fc.constantFrom(
    'name',
    'parts:',
    'solid',
    '__proto__',
    'constructor',
    '<<: ',
    '---\n',
    '~',
    '""',
    '\\',
    '\0',
    '\r',
  ),
  fc.string({ maxLength: 4 }),
);

/** A way to a node of the data, by numbers that choose among what is there. */
const way = fc.array(fc.nat(30), { minLength: 1, maxLength: 6 });
const strange = fc.oneof(
  fc.constantFrom<unknown>(
    '',
    'x',
    'true',
    'max(a',
    [],
    {},
    ['1'],
    ['1', '2', '3'],
    { value: '1' },
    { value: '1', u: '1', tol: '1' },
  ),
  fc.constantFrom<unknown>(
    { box: {} },
    { mirror: 'xy' },
    [{ name: 'a' }],
    [[]],
    { a: 'b', c: [] },
    { x: '1', y: '1' },
  ),
);

function replaceAt(data: unknown, steps: readonly number[], value: unknown, key: string | undefined): void {
  let owner = data as Record<string, unknown>;
  for (const [i, step] of steps.entries()) {
    const keys = Object.keys(owner);
    if (keys.length === 0) return;
    const chosen = keys[step % keys.length]!;
    const inner = owner[chosen];
    if (i < steps.length - 1 && typeof inner === 'object' && inner !== null) {
      owner = inner as Record<string, unknown>;
      continue;
    }
    if (key === undefined) owner[chosen] = value;
    else if (!Array.isArray(owner)) owner[key] = value;
    return;
  }
}

const keyName = fc.constantFrom(
  'mass',
  'solid',
  'body',
  'include',
  'cut',
  'at',
  'u',
  'tol',
  'value',
  'parts',
  'rotate',
  'junk',
  'density',
  'states',
);

describe('readDocument', () => {
  it('answers any text, broken at random, with a document or with faults', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(fc.nat(SWEEP.length), fc.nat(12), piece), { minLength: 1, maxLength: 4 }),
        (edits) => {
          let text = SWEEP;
          for (const [at, cut, insert] of edits) text = text.slice(0, at) + insert + text.slice(at + cut);
          readOrRefuse(text);
        },
      ),
      { numRuns: 500 },
    );
  });

  it('answers data changed at random with a document or with faults', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(way, strange, fc.option(keyName, { nil: undefined })), {
          minLength: 1,
          maxLength: 4,
        }),
        (edits) => {
          const data = parse(SWEEP, { schema: 'failsafe' });
          for (const [steps, value, key] of edits) replaceAt(data, steps, structuredClone(value), key);
          readOrRefuse(
            stringify(data, {
              schema: 'failsafe',
              aliasDuplicateObjects: false,
              defaultStringType: 'QUOTE_DOUBLE',
            }),
          );
        },
      ),
      { numRuns: 500 },
    );
  });
});

describe('quickCheck', () => {
  it('answers as the schema does, for data changed at random', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(way, strange, fc.option(keyName, { nil: undefined })), { maxLength: 2 }),
        (edits) => {
          const data = parse(SWEEP, { schema: 'failsafe' });
          for (const [steps, value, key] of edits) replaceAt(data, steps, structuredClone(value), key);
          expect(isAssembly(data)).toBe(assembly.safeParse(data).success);
        },
      ),
      { numRuns: 1000 },
    );
  });

  it('accepts the example', () => {
    expect(isAssembly(parse(SWEEP, { schema: 'failsafe' }))).toBe(true);
  });
});
