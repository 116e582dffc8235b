import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { printFaults } from '../../../cli/output/error-printer.ts';
import { textWidth } from '../../../cli/output/text-width.ts';
import { anyName } from '../../helpers/build-record.ts';

const fault = {
  code: 'UNITS_DIMENSION_MISMATCH',
  message: 'cannot add a mass to a length',
  at: { file: 'bracket.yaml', line: 12, column: 7 },
  length: 5,
};

/** What stands above the carets. */
function underlined(text: string): string {
  const lines = text.split('\n');
  const i = lines.findIndex((line) => /^ +\| +\^+$/.test(line));
  const from = lines[i]!.indexOf('^');
  return lines[i - 1]!.slice(from, lines[i]!.length);
}

describe('printFaults', () => {
  it('prints code, message, place, the line with carets, and the hint', () => {
    const hint = 'both terms of "+" need the same dimension; expected a length such as "4 mm"';
    expect(printFaults([{ ...fault, hint }], () => 'span: 3.2 m + 4 kg')).toBe(
      [
        'error UNITS_DIMENSION_MISMATCH: cannot add a mass to a length',
        '  bracket.yaml:12:7',
        '  12 | span: 3.2 m + 4 kg',
        '     |       ^^^^^',
        'hint: both terms of "+" need the same dimension; expected a length such as "4',
        '  mm"',
        '',
      ].join('\n'),
    );
  });

  it('needs neither place nor text', () => {
    expect(printFaults([{ code: 'FILE_MISSING', message: 'there is no heron.yaml' }], () => undefined)).toBe(
      'error FILE_MISSING: there is no heron.yaml\n',
    );
    expect(printFaults([fault], () => undefined)).toBe(
      'error UNITS_DIMENSION_MISMATCH: cannot add a mass to a length\n  bracket.yaml:12:7\n',
    );
  });

  it('puts the carets under the same text after tabs', () => {
    expect(
      underlined(printFaults([{ ...fault, at: { ...fault.at, column: 9 } }], () => '\t\tspan: 3.2 m')),
    ).toBe('3.2 m'.slice(0, 5));
  });

  it('shows the part of a very long line that is wrong, at once', () => {
    const line = `${'a'.repeat(500_000)}WRONG${'b'.repeat(500_000)}`;
    const started = performance.now();
    const text = printFaults([{ ...fault, at: { ...fault.at, column: 500_001 } }], () => line);
    expect(performance.now() - started).toBeLessThan(500);
    expect(underlined(text)).toBe('WRONG');
    expect(text).toContain('…aaaa');
  });

  it('underlines what is beyond the end of the line as one character', () => {
    expect(printFaults([{ ...fault, at: { ...fault.at, column: 40 } }], () => 'short')).toContain(
      '     |      ^\n',
    );
  });

  it('keeps its width and lets no control character through, whatever a file holds', () => {
    fc.assert(
      fc.property(
        anyName,
        anyName,
        anyName,
        anyName,
        fc.integer({ min: 1, max: 120 }),
        fc.nat({ max: 60 }),
        fc.constantFrom(40, 80),
        fc.boolean(),
        (message, file, source, hint, column, length, width, unicode) => {
          const text = printFaults(
            [{ code: 'X_Y', message, at: { file, line: 7, column }, length, hint }],
            () => source.repeat(4).replaceAll('\n', ''),
            { width, unicode },
          );
          expect(text).not.toMatch(/(?!\n)[\p{Cc}\p{Cf}\p{Cs}]/u);
          for (const line of text.split('\n')) expect(textWidth(line), line).toBeLessThanOrEqual(width);
        },
      ),
      { numRuns: 400 },
    );
  });
});
