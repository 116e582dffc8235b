import type { Fault } from '../../../core/errors.ts';
import { InputError } from '../../../core/errors.ts';

/** The faults a reading throws; fails when it throws anything else, or nothing. */
export function faultsOf(read: () => unknown): readonly Fault[] {
  try {
    read();
  } catch (error) {
    if (error instanceof InputError) return error.faults;
    throw error;
  }
  throw new Error('expected an InputError, but nothing was thrown');
}

/** Faults as "line:column CODE", for short expectations. */
export function placesAndCodes(faults: readonly Fault[]): string[] {
  return faults.map((fault) => `${fault.at?.line}:${fault.at?.column} ${fault.code}`);
}

/** Faults as whole sentences, for the one place that pins each message. */
export function printed(faults: readonly Fault[]): string {
  return faults
    .map(({ at, length, code, message, hint }) => {
      const where = at === undefined ? '' : `${at.file}:${at.line}:${at.column} (${length ?? 1}) `;
      return `${where}${code}: ${message}${hint === undefined ? '' : `\n  hint: ${hint}`}`;
    })
    .join('\n');
}
