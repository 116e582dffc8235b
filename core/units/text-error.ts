/** What is wrong with a piece of text, with its place in that text; the reader of a file adds the file's place. */
export class TextError extends Error {
  /** Stable code, AREA_PROBLEM. */
  readonly code: string;
  /** How to mend it; absent when the message says all. */
  readonly hint: string | undefined;
  /** Offsets of the faulty part in the text given, in UTF-16 code units; end is past the last one. */
  readonly start: number;
  readonly end: number;

  constructor(code: string, message: string, span: { start: number; end: number }, hint?: string) {
    super(message);
    this.name = 'TextError';
    this.code = code;
    this.hint = hint;
    this.start = span.start;
    this.end = span.end;
  }
}
