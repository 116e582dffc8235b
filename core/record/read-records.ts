import type * as z from 'zod';
import { FAULTS_AT_MOST, type Fault, InputError } from '../errors.ts';
import type { RollUpRecord } from './record.ts';
import { recordSchema } from './record-schema.ts';

/**
 * Records from text: the array that `run --format json` prints, one record alone, or NDJSON.
 *
 * @param file its name in faults
 * @throws InputError RECORD_NOT_JSON, RECORD_SHAPE
 */
export function readRecords(text: string, file: string): RollUpRecord[] {
  const values = parse(text, file);
  const faults: Fault[] = [];
  const records = values.flatMap((value, i) => {
    const result = recordSchema.safeParse(value);
    // The value itself, not the checked copy: that has lost the keys of later versions.
    if (result.success) return [value as RollUpRecord];
    for (const issue of result.error.issues.slice(0, 3)) faults.push(shapeFault(issue, i, file));
    return [];
  });
  if (values.length === 0)
    faults.push({ code: 'RECORD_SHAPE', message: `expected records in ${file}, found none`, hint: HINT });
  if (faults.length > 0) throw new InputError(faults.slice(0, FAULTS_AT_MOST));
  return records;
}

const HINT = 'records are what `steelyard run --format json` prints';

function parse(text: string, file: string): unknown[] {
  try {
    const value: unknown = JSON.parse(text);
    return Array.isArray(value) ? value : [value];
  } catch (whole) {
    try {
      return text
        .split('\n')
        .filter((line) => line.trim() !== '')
        .map((line) => JSON.parse(line) as unknown);
    } catch {
      const why = whole instanceof Error ? whole.message.replace(/\s+/g, ' ').slice(0, 120) : '';
      throw new InputError([
        {
          code: 'RECORD_NOT_JSON',
          message: `expected JSON in ${file}, found other text (${why})`,
          hint: HINT,
          at: { file, line: 1, column: 1 },
        },
      ]);
    }
  }
}

function shapeFault(issue: z.core.$ZodIssue, index: number, file: string): Fault {
  const path = issue.path.map(String).join('.');
  return {
    code: 'RECORD_SHAPE',
    message: `expected a record of schema steelyard-record/1 in ${file}, found at ${path || 'its head'} of record ${index + 1}: ${issue.message}`,
    hint: HINT,
  };
}
