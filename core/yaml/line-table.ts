/** Turns offsets in a text into lines and columns, counted from 1. LF, CR and CRLF each end a line. */
export class LineTable {
  readonly #starts: number[];

  constructor(text: string) {
    this.#starts = text.includes('\r') ? startsWithAnyEnding(text) : startsWithLineFeeds(text);
  }

  /** The line of an offset, from 1. */
  lineOf(offset: number): number {
    let low = 0;
    let high = this.#starts.length;
    while (high - low > 1) {
      const middle = (low + high) >> 1;
      if (this.#starts[middle]! <= offset) low = middle;
      else high = middle;
    }
    return low + 1;
  }

  /** The line and the column (UTF-16 code units, from 1) of an offset. */
  placeOf(offset: number): { line: number; column: number } {
    const line = this.lineOf(offset);
    return { line, column: offset - this.#starts[line - 1]! + 1 };
  }
}

function startsWithLineFeeds(text: string): number[] {
  const starts = [0];
  for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) starts.push(at + 1);
  return starts;
}

function startsWithAnyEnding(text: string): number[] {
  const starts = [0];
  for (const ending of text.matchAll(/\r\n?|\n/g)) starts.push(ending.index + ending[0].length);
  return starts;
}
