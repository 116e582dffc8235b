import { isBroken, waiverState } from '#core/record/waiver-state.ts';
import type { Fault } from '../../core/errors.ts';
import { plainText } from '../../core/figures/index.ts';
import type { RollUpRecord } from '../../core/record/record.ts';
import { failureText } from './formats/junit.ts';

/** Something a build server can show at a line of a file. */
export interface Annotation {
  level: 'error' | 'warning';
  title: string;
  message: string;
  file?: string | undefined;
  line?: number | undefined;
  column?: number | undefined;
  /** The larger, the sooner it is shown among its level. */
  weight: number;
}

/** Build servers cut long lists off: the worst come first and more are not sent. */
export const ANNOTATIONS_AT_MOST = 10;

/** Broken limits, by how far they are out, then what a waiver covers, then warnings. */
export function annotationsOfRecords(
  records: readonly RollUpRecord[],
  today: string,
  units?: string,
): Annotation[] {
  return records.flatMap((record) => {
    const whole = `${record.assembly}, ${record.state}`;
    const outside = record.limits.filter((l) => l.verdict === 'outside');
    const limits = outside.map((limit): Annotation => {
      const waived =
        waiverState(limit, today) === 'in effect'
          ? ` (waived until ${limit.waiver!.until} by ${limit.waiver!.by})`
          : '';
      return {
        level: isBroken(limit, today) ? 'error' : 'warning',
        title: `${whole}: ${limit.name} outside${waived}`,
        message: failureText(record, limit, units).join('\n'),
        ...limit.at,
        weight: limit.marginOfLimit === null ? Number.MAX_VALUE : 1 + Math.abs(limit.marginOfLimit),
      };
    });
    const warnings = record.warnings.map(
      (w): Annotation => ({
        level: 'warning',
        title: w.code,
        message: w.message,
        file: w.at?.file,
        line: w.at?.line,
        weight: 0,
      }),
    );
    return [...limits, ...warnings];
  });
}

export const annotationsOfFaults = (faults: readonly Fault[]): Annotation[] =>
  faults.map((fault) => ({
    level: 'error',
    title: fault.code,
    message: fault.hint === undefined ? fault.message : `${fault.message}\nhint: ${fault.hint}`,
    file: fault.at?.file,
    line: fault.at?.line,
    column: fault.at?.column,
    weight: 0,
  }));

/**
 * One line each: as a workflow command (`::error file=…,line=…,title=…::…`), which build servers turn into a note
 * beside the line, or as plain text.
 */
export function formatAnnotations(
  annotations: readonly Annotation[],
  style: 'workflow-command' | 'plain',
): string {
  const worst = annotations
    .map((a, i) => ({ a, i }))
    .sort((x, y) => LEVELS[x.a.level] - LEVELS[y.a.level] || y.a.weight - x.a.weight || x.i - y.i)
    .slice(0, ANNOTATIONS_AT_MOST)
    .map(({ a }) => (style === 'plain' ? plainLine(a) : workflowCommand(a)));
  return worst.map((line) => `${line}\n`).join('');
}

const LEVELS = { error: 0, warning: 1 };

function plainLine(a: Annotation): string {
  const at =
    a.file === undefined ? '' : `${[a.file, a.line, a.column].filter((x) => x !== undefined).join(':')}: `;
  return plainText(`${at}${a.level}: ${a.title}: ${a.message.replaceAll('\n', '; ')}`);
}

function workflowCommand(a: Annotation): string {
  const properties = [
    ['file', a.file],
    ['line', a.line],
    ['col', a.column],
    ['title', a.title],
  ] as const;
  const given = properties
    .filter(([, value]) => value !== undefined)
    .map(([key, value]) => `${key}=${property(String(value))}`);
  return `::${a.level} ${given.join(',')}::${data(a.message.split('\n').map(plainText).join('\n'))}`;
}

const data = (text: string) => text.replaceAll('%', '%25').replaceAll('\r', '%0D').replaceAll('\n', '%0A');
const property = (text: string) => data(plainText(text)).replaceAll(':', '%3A').replaceAll(',', '%2C');
