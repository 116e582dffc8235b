/** A place in a text file. Line and column count from 1; column counts UTF-16 code units. */
export interface Place {
  /** Path relative to the project folder, with `/`. */
  file: string;
  line: number;
  column: number;
}

/** One thing wrong with the input, as data: every face (terminal, JSON, page) renders it in its own way. */
export interface Fault {
  /** Stable code, AREA_PROBLEM; the table of all codes is in DEVELOPERS.md. */
  code: string;
  /** What was found and what was expected, one or two plain sentences without a trailing newline. */
  message: string;
  /** Where; absent when the fault belongs to no text (a missing file named on the command line, say). */
  at?: Place;
  /** Length of the faulty text in characters, for the caret line; absent for one character. */
  length?: number;
  /** How to mend it. */
  hint?: string;
}

/** The most faults one reading collects before it stops. */
export const FAULTS_AT_MOST = 20;

/** The input is wrong. Carries every fault found; the message is the first one's. */
export class InputError extends Error {
  readonly faults: readonly Fault[];
  constructor(faults: readonly Fault[]) {
    super(faults[0]?.message ?? 'the input is wrong');
    this.name = 'InputError';
    this.faults = faults;
  }
}

/** Collects faults; `check()` throws when there are any. Past FAULTS_AT_MOST `add` throws at once. */
export class FaultList {
  readonly faults: Fault[] = [];
  add(fault: Fault): void {
    this.faults.push(fault);
    if (this.faults.length >= FAULTS_AT_MOST) this.check();
  }
  /** @throws InputError when anything was added */
  check(): void {
    if (this.faults.length > 0) throw new InputError(this.faults);
  }
}

/** Something doubtful that does not stop the run. Codes are stable and in DEVELOPERS.md. */
export interface Warning {
  code: string;
  message: string;
  at?: { file: string; line: number };
}
