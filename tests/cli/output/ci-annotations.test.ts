import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  ANNOTATIONS_AT_MOST,
  annotationsOfFaults,
  annotationsOfRecords,
  formatAnnotations,
} from '../../../cli/output/ci-annotations.ts';
import { anyName, anyRecord, buildRecord } from '../../helpers/build-record.ts';

const today = '2026-12-01';

/** Reads a workflow command as a build server does. */
function readCommand(line: string) {
  const [, level, list, message] = /^::(error|warning) (.*?)::(.*)$/.exec(line)!;
  const undo = (text: string) =>
    text
      .replaceAll('%2C', ',')
      .replaceAll('%3A', ':')
      .replaceAll('%0A', '\n')
      .replaceAll('%0D', '\r')
      .replaceAll('%25', '%');
  const properties = Object.fromEntries(
    list!
      .split(',')
      .map((pair) => pair.split('='))
      .map(([key, ...rest]) => [key, undo(rest.join('='))]),
  );
  return { level, ...properties, message: undo(message!) };
}

describe('annotations', () => {
  it('point at the line of the limit, with % : , and line ends escaped', () => {
    const record = buildRecord({
      limits: [{ name: '50% mass, a:b', value: 0.2531, max: 0.25, at: { file: 'a,b:c.yaml', line: 9 } }],
    });
    const text = formatAnnotations(annotationsOfRecords([record], today), 'workflow-command');
    expect(text).toMatch(
      /^::error file=a%2Cb%3Ac\.yaml,line=9,title=Heron tail boom%2C flight%3A 50%25 mass%2C a%3Ab outside::50%25 mass/,
    );
    expect(text).toContain('%0Alimit at');
    expect(readCommand(text.trimEnd())).toMatchObject({
      file: 'a,b:c.yaml',
      line: '9',
      title: 'Heron tail boom, flight: 50% mass, a:b outside',
    });
  });

  it('put the worst first, errors before warnings, and stop at ten', () => {
    const over = (name: string, value: number) => ({ name, value, max: 0.25 });
    const record = buildRecord({
      limits: [
        over('a little', 0.251),
        over('by far', 0.5),
        ...Array.from({ length: 12 }, (_, i) => over(`more ${i}`, 0.3)),
      ],
      warnings: [{ code: 'A_B', message: 'm', at: null }],
    });
    const lines = formatAnnotations(annotationsOfRecords([record], today), 'plain')
      .trimEnd()
      .split('\n');
    expect(lines).toHaveLength(ANNOTATIONS_AT_MOST);
    expect(lines[0]).toContain('by far');
    expect(lines.join()).not.toContain('A_B');
  });

  it('warn of what a waiver covers, and fail it after its day', () => {
    const record = buildRecord({
      limits: [{ name: 'm', value: 0.3, max: 0.2, waiver: { until: today, by: 'M. Okafor', reason: 'r' } }],
    });
    expect(annotationsOfRecords([record], today)[0]!.level).toBe('warning');
    expect(annotationsOfRecords([record], '2026-12-02')[0]!.level).toBe('error');
  });

  it('carry faults with their column and hint', () => {
    const [a] = annotationsOfFaults([
      { code: 'X_Y', message: 'wrong', hint: 'do so', at: { file: 'a.yaml', line: 3, column: 4 } },
    ]);
    expect(formatAnnotations([a!], 'workflow-command')).toBe(
      '::error file=a.yaml,line=3,col=4,title=X_Y::wrong%0Ahint: do so\n',
    );
    expect(formatAnnotations([a!], 'plain')).toBe('a.yaml:3:4: error: X_Y: wrong; hint: do so\n');
  });

  it('stay one line each whatever the names', () => {
    fc.assert(
      fc.property(
        fc.array(anyRecord, { maxLength: 2 }),
        fc.constantFrom('plain' as const, 'workflow-command' as const),
        anyName,
        (records, style, name) => {
          const all = [
            ...annotationsOfRecords(records, today),
            ...annotationsOfFaults([{ code: 'X_Y', message: name }]),
          ];
          const text = formatAnnotations(all, style);
          expect(text.split('\n').length - 1).toBe(Math.min(10, all.length));
          expect(text).not.toMatch(/(?!\n)[\p{Cc}\p{Cf}\p{Cs}]/u);
        },
      ),
      { numRuns: 100 },
    );
  });
});
