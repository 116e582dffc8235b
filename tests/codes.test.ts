import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

const root = join(import.meta.dirname, '..');

/** Codes as the source writes them; those put together from a kind are spelled out. */
function codesInSource(): Set<string> {
  const codes = new Set(
    ['FRAME', 'MATERIAL', 'MATURITY', 'PARAMETER', 'PART', 'QUANTITY', 'STATE'].map(
      (kind) => `MODEL_UNKNOWN_${kind}`,
    ),
  );
  for (const folder of ['core', 'cli'])
    for (const name of readdirSync(join(root, folder), { recursive: true, encoding: 'utf8' })) {
      if (!name.endsWith('.ts')) continue;
      const text = readFileSync(join(root, folder, name), 'utf8');
      for (const [, code] of text.matchAll(/'((?:[A-Z]+_)+[A-Z]+)'/g))
        if (AREAS.test(code!)) codes.add(code!);
    }
  return codes;
}

const AREAS =
  /^(ASSEMBLY|BODY|CALL|CUT|DENSITY|EXPRESSION|FILE|GIT|GROWTH|INCLUDE|LIMIT|MESH|MODEL|OVERRIDE|PARAMETER|PART|PUSH|RECORD|REPEAT|ROTATION|SET|SOLID|TEXT|TRAY|UNITS|YAML)_/;

/** Names in capitals that are constants, not codes. */
const CONSTANTS = new Set<string>([]);

const table = new Set(
  [...readFileSync(join(root, 'DEVELOPERS.md'), 'utf8').matchAll(/`((?:[A-Z]+_)+[A-Z]+)`/g)].map(
    ([, code]) => code!,
  ),
);

/** Codes of problems that the server answers with. */
function codesOfServer(): string[] {
  const found = new Set(['BODY_NOT_RIGHT', 'QUERY_NOT_RIGHT']);
  for (const name of readdirSync(join(root, 'server'), { recursive: true, encoding: 'utf8' })) {
    if (!name.endsWith('.ts')) continue;
    const text = readFileSync(join(root, 'server', name), 'utf8');
    const said =
      /(?:ProblemError\(\s*(?:\d+|[^,()]+\? \d+ : \d+),|conflict\(|badRequest\(|code:)\s*'([A-Z_]+)'/g;
    for (const [, code] of text.matchAll(said)) found.add(code!);
  }
  return [...found].sort();
}

describe('the table of codes in server/README.md', () => {
  it('has every code that the server can answer with, and no other', () => {
    const text = readFileSync(join(root, 'server', 'README.md'), 'utf8');
    const rows = [...text.matchAll(/^\| `([A-Z_]+)`/gm)].map(([, code]) => code!);
    expect(rows.sort()).toEqual(codesOfServer());
  });
});

describe('the table of codes in DEVELOPERS.md', () => {
  it('has every code that the source can report', () => {
    const missing = [...codesInSource()].filter((code) => !table.has(code) && !CONSTANTS.has(code));
    expect(missing).toEqual([]);
  });

  it('has none that the source no longer knows', () => {
    const source = codesInSource();
    const stale = [...table].filter((code) => AREAS.test(code) && !source.has(code));
    expect(stale).toEqual([]);
  });
});
