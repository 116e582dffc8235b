// Mutated examples: whatever stands in a file, the core answers with figures or with faults, never with anything else.
// `npm run fuzz` asks for 20,000 cases; the ordinary run takes a few hundred.
import { readdirSync, readFileSync } from 'node:fs';
import { join, relative } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { InputError } from '#core/errors.ts';
import { loadProject } from '#core/model/load-project.ts';
import { buildRecord } from '#core/record/build-record.ts';
import { rollUp } from '#core/rollup/roll-up.ts';
import { MemorySource } from './helpers/memory-source.ts';

const CASES = Number(process.env.STEELYARD_FUZZ ?? 400);
const examples = join(import.meta.dirname, '..', 'examples');

const files = new Map<string, string | Uint8Array>(
  readdirSync(examples, { recursive: true, encoding: 'utf8' })
    .filter((name) => /\.(ya?ml|stl|obj)$/.test(name) && !name.startsWith('ci'))
    .map((name) => {
      const path = relative(examples, join(examples, name));
      const bytes = readFileSync(join(examples, name));
      return [path, /\.ya?ml$/.test(name) ? bytes.toString('utf8') : new Uint8Array(bytes)];
    }),
);
const assemblies = [...files.keys()].filter((name) => /\.ya?ml$/.test(name));
const corpus = assemblies.map((name) => files.get(name) as string).join('\n');
const tokens = [...new Set(corpus.match(/[\p{L}_][\p{L}\p{N}_.]*|[\d.]+|[^\s\p{L}\p{N}]/gu))];

/** Things that break readers: extremes, structure, units, names of other kinds, text that means something elsewhere. */
const NASTY = [
  '0',
  '-1',
  '1e308',
  '1e-320',
  '1e999',
  '-0',
  'NaN',
  '.inf',
  '1/0',
  'sqrt(-1)',
  '0 deg',
  '360 deg',
  '1e9 mm',
  '&a [*a]',
  '*a',
  '!!js/function x',
  '<<: *a',
  '{',
  '}',
  '[',
  ']',
  '""',
  "''",
  '|',
  '>',
  '? a',
  '- -',
  ':',
  '#',
  '\t',
  '\u0000',
  '\uFEFF',
  '\u2028',
  '٣',
  'é',
  '\ud800',
  '__proto__',
  'constructor',
  'toString',
  'true',
  'null',
  '~',
  '2026-12-01',
  'repeat: { line: { count: 1e9, step: [ 1, 0, 0 ] } }',
  'parts: []',
  'cut: true',
  'include: drone.yaml',
  'max(1, 2)',
  '((((((((((1))))))))))',
  'a'.repeat(3000),
  '%',
  '5 %',
] as const;

type Edit = (text: string, at: number, other: number) => string;

const lineEdit =
  (change: (lines: string[], i: number, j: number) => void): Edit =>
  (text, at, other) => {
    const lines = text.split('\n');
    change(lines, Math.floor(at * lines.length), Math.floor(other * lines.length));
    return lines.join('\n');
  };

/** Replaces the token at a place of the text. */
const tokenEdit =
  (pick: (other: number) => string): Edit =>
  (text, at, other) => {
    const start = Math.floor(at * text.length);
    const match = /[\p{L}\p{N}_.]+|[^\s]/u.exec(text.slice(start));
    if (!match) return text + pick(other);
    const from = start + match.index;
    return text.slice(0, from) + pick(other) + text.slice(from + match[0].length);
  };

const EDITS: readonly Edit[] = [
  tokenEdit((other) => tokens[Math.floor(other * tokens.length)]!),
  tokenEdit((other) => NASTY[Math.floor(other * NASTY.length)]!),
  tokenEdit(() => ''),
  lineEdit((lines, i) => void lines.splice(i, 1)),
  lineEdit((lines, i, j) => void lines.splice(i, 0, lines[j]!)),
  lineEdit((lines, i) => void lines.splice(i, 1, ` ${lines[i]}`)),
  lineEdit((lines, i) => void lines.splice(i, 1, lines[i]!.slice(1))),
  (text, at) => text.slice(0, Math.floor(at * text.length)),
  (text, at, other) => {
    const i = Math.floor(at * text.length);
    return text.slice(0, i) + NASTY[Math.floor(other * NASTY.length)] + text.slice(i);
  },
];

const unit = fc.double({ min: 0, max: 1, maxExcluded: true, noNaN: true });
const edits = fc.array(fc.tuple(fc.nat(EDITS.length - 1), unit, unit), { minLength: 1, maxLength: 4 });

function rollUpAll(name: string, text: string | Uint8Array): number {
  const project = loadProject(name, new MemorySource(new Map([...files, [name, text]])));
  let states = 0;
  for (const { name: state } of project.root.states) {
    const record = buildRecord(rollUp(project, { state }), { tool: 'test', at: '' }, () => '0'.repeat(64));
    expect(JSON.parse(JSON.stringify(record))).toEqual(record);
    states++;
  }
  return states;
}

describe('mutated examples', () => {
  it('the examples themselves roll up, so that there is something to mutate', () => {
    let states = 0;
    for (const name of assemblies) states += rollUpAll(name, files.get(name)!);
    expect(states).toBeGreaterThan(assemblies.length);
  });

  it(
    `give a record or faults with places, in ${CASES} cases`,
    () => {
      fc.assert(
        fc.property(fc.nat(assemblies.length - 1), edits, (which, list) => {
          const name = assemblies[which]!;
          let text = files.get(name) as string;
          for (const [edit, at, other] of list) text = EDITS[edit]!(text, at, other);
          try {
            rollUpAll(name, text);
          } catch (error) {
            expect(error).toBeInstanceOf(InputError);
            for (const fault of (error as InputError).faults) {
              expect(fault.code).toMatch(/^[A-Z]+(_[A-Z0-9]+)+$/);
              // A message may quote what the text says, and nothing else of the kind.
              for (const leak of ['undefined', '[object', 'NaN'])
                if (!text.includes(leak)) expect(fault.message).not.toContain(leak);
              if (fault.at) expect(fault.at.line).toBeLessThanOrEqual(text.split(/\r\n?|\n/).length + 60);
            }
          }
        }),
        { numRuns: CASES },
      );
    },
    Math.max(60_000, CASES * 100),
  );
});
