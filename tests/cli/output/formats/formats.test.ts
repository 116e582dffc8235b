import fc from 'fast-check';
import { XMLParser, XMLValidator } from 'fast-xml-parser';
import { describe, expect, it } from 'vitest';
import { CSV_COLUMNS, formatCsv } from '#core/record/record-csv.ts';
import { formatJson, formatNdjson } from '../../../../cli/output/formats/json.ts';
import { formatJunit } from '../../../../cli/output/formats/junit.ts';
import { formatMarkdown } from '../../../../cli/output/formats/markdown.ts';
import { plainText } from '../../../../core/figures/index.ts';
import { anyRecord, buildRecord } from '../../../helpers/build-record.ts';

const today = '2026-12-01';
const control = /(?!\n)[\p{Cc}\p{Cf}\p{Cs}]/u;
const runs = { numRuns: 120 };

/** A reader of RFC 4180, written apart from the writer. */
function readCsv(text: string): string[][] {
  const rows: string[][] = [];
  const row: string[] = [];
  let cell = '';
  let quoted = false;
  for (let i = 0; i < text.length; i++) {
    const c = text[i]!;
    if (quoted) {
      if (c !== '"') cell += c;
      else if (text[i + 1] === '"') cell += text[++i];
      else quoted = false;
    } else if (c === '"') quoted = true;
    else if (c === ',' || c === '\n') {
      row.push(cell);
      cell = '';
      if (c === '\n') rows.push(row.splice(0));
    } else cell += c;
  }
  return rows;
}

describe('json', () => {
  it('parses back equal and holds nothing that a terminal would obey', () => {
    fc.assert(
      fc.property(fc.array(anyRecord, { maxLength: 2 }), (records) => {
        const text = formatJson(records);
        expect(JSON.parse(text)).toEqual(JSON.parse(JSON.stringify(records)));
        expect(text).not.toMatch(control);
        expect(text.startsWith('[')).toBe(true);
      }),
      runs,
    );
  });

  it('writes one record a line as ndjson', () => {
    const records = [buildRecord(), buildRecord({ state: 'stowed' })];
    const lines = formatNdjson(records).split('\n');
    expect(lines).toHaveLength(3);
    expect(JSON.parse(lines[1]!)).toEqual(records[1]);
    expect(formatNdjson([])).toBe('');
  });
});

describe('csv', () => {
  it('reads back with every row as long as its head, figures to the last bit', () => {
    fc.assert(
      fc.property(anyRecord, (record) => {
        const text = formatCsv([record]);
        expect(text).not.toMatch(control);
        const [head, ...rows] = readCsv(text);
        expect(head).toEqual([...CSV_COLUMNS]);
        for (const row of rows) expect(row).toHaveLength(CSV_COLUMNS.length);
        const column = (name: string) => CSV_COLUMNS.indexOf(name as (typeof CSV_COLUMNS)[number]);
        const parts = rows.filter((r) => r[column('kind')] === 'part' && r[column('on')] === 'basic');
        expect(parts.map((r) => Number(r[column('mass_kg')]))).toEqual(record.parts.map((p) => p.basic.mass));
        expect(parts.map((r) => Number(r[column('inertia_xy_kg_m2')]) + 0)).toEqual(
          record.parts.map((p) => p.basic.inertia[0][1]! + 0),
        );
        const limits = rows.filter((r) => r[column('kind')] === 'limit');
        expect(limits.map((r) => (r[column('value')] === '' ? null : Number(r[column('value')])))).toEqual(
          record.limits.map((l) => (l.value === null ? null : l.value)),
        );
        expect(limits.map((r) => r[column('name')]!.replace(/^'/, ''))).toEqual(
          record.limits.map((l) => plainText(l.name).replace(/^'/, '')),
        );
      }),
      runs,
    );
  });

  it('says units, sign, point and axes in every row that has a tensor', () => {
    const [, ...rows] = readCsv(formatCsv([buildRecord()]));
    for (const row of rows.filter((r) => r[CSV_COLUMNS.indexOf('inertia_xx_kg_m2')] !== ''))
      expect(row.slice(6, 10)).toEqual([
        'SI',
        'negative',
        expect.stringMatching(/^(centre|origin)$/),
        'body',
      ]);
  });

  it('leaves no text that a spreadsheet would run', () => {
    const record = buildRecord({
      parts: [{ path: '=HYPERLINK("x")', particles: [{ mass: 1, at: [0, 0, 0] }] }],
    });
    expect(formatCsv([record])).toContain(`"'=HYPERLINK(""x"")"`);
  });
});

describe('junit', () => {
  const parser = new XMLParser({
    ignoreAttributes: false,
    attributeNamePrefix: '',
    isArray: (name) => ['testsuite', 'testcase'].includes(name),
    processEntities: true,
    trimValues: false,
  });

  it('is well formed for any names, a suite a record and a case a limit', () => {
    fc.assert(
      fc.property(fc.array(anyRecord, { maxLength: 3 }), (records) => {
        const text = formatJunit(records, { today });
        expect(XMLValidator.validate(text)).toBe(true);
        expect(text).not.toMatch(control);
        const { testsuites } = parser.parse(text);
        const suites = testsuites.testsuite ?? [];
        expect(suites).toHaveLength(records.length);
        suites.forEach((suite: { testcase?: unknown[]; name: string }, i: number) => {
          expect(suite.testcase ?? []).toHaveLength(records[i]!.limits.length);
        });
      }),
      runs,
    );
  });

  it('fails a broken limit with value, limit, margin, parts and places, and skips a waived one', () => {
    const heaviest = [{ path: 'tail<plane>', at: { file: 'tailplane.yaml', line: 12 }, value: 0.02064 }];
    const record = buildRecord({
      limits: [
        { name: 'take-off mass', id: 'MP-003', value: 0.2531, max: 0.25, heaviest },
        { name: 'least', value: 0.2, min: 0.1 },
        {
          name: 'waived',
          value: 0.3,
          max: 0.2,
          waiver: { until: '2027-01-31', by: 'M. Okafor', reason: 'first flights' },
        },
      ],
    });
    const { testsuites } = parser.parse(formatJunit([record], { today }));
    expect(testsuites).toMatchObject({ tests: '3', failures: '1', skipped: '1' });
    const [broken, least, waived] = testsuites.testsuite[0].testcase;
    expect(broken).toMatchObject({ name: 'MP-003 take-off mass', file: 'heron.yaml', line: '88' });
    expect(broken.failure['#text']).toBe(
      'take-off mass: 253.10 g is outside max 250 g; over by 3.10 g (1.2 % of the limit) (predicted)\ntail<plane>: 20.64 g (tailplane.yaml:12)\nlimit at heron.yaml:88',
    );
    expect(least.failure).toBeUndefined();
    expect(waived.skipped.message).toBe('waived until 2027-01-31 by M. Okafor: first flights');
    const later = parser.parse(formatJunit([record], { today: '2027-02-01' }));
    expect(later.testsuites.failures).toBe('2');
  });
});

describe('markdown', () => {
  it('says the verdict before anything else', () => {
    const record = buildRecord({ limits: [{ name: 'take-off mass', value: 0.2531, max: 0.25 }] });
    const lines = formatMarkdown([record], { today }).split('\n').filter(Boolean);
    expect(lines.slice(0, 3)).toEqual([
      '## Heron tail boom, flight',
      '**✕ 1 limit: 1 outside**',
      '- take\\-off mass: 253.10 g is outside max 250 g; over by 3.10 g (1.2 % of the limit) (predicted)'.replace(
        /[()]/g,
        '\\$&',
      ),
    ]);
  });

  it('keeps every table whole and lets no markup of a name through', () => {
    fc.assert(
      fc.property(anyRecord, (record) => {
        const text = formatMarkdown([record], { today });
        expect(text).not.toMatch(control);
        expect(text.replaceAll('<br>', '')).not.toMatch(/[<>]/);
        const cells = (line: string) => line.replace(/\\./g, '').split('|').length;
        const lines = text.split('\n');
        lines.forEach((line, i) => {
          if (line.startsWith('| ') && lines[i - 1]?.startsWith('| '))
            expect(cells(line)).toBe(cells(lines[i - 1]!));
        });
      }),
      runs,
    );
  });
});
