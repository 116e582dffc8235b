const NEWLINE = 10;
const SPACE = 32;
const POWERS = Float64Array.from({ length: 23 }, (_, i) => Number(`1e${i}`));

/** Reads words and numbers from the bytes of a text file without making strings of them. */
export class TextScanner {
  private readonly bytes: Uint8Array;
  private at = 0;
  /** Where the last word starts and ends. */
  private from = 0;
  private to = 0;
  /** The line of the last word, from 1. */
  line = 1;

  constructor(bytes: Uint8Array) {
    this.bytes = bytes;
  }

  /** Moves to the next word; false at the end of the file. */
  next(): boolean {
    const { bytes } = this;
    let at = this.at;
    while (at < bytes.length && bytes[at]! <= SPACE) if (bytes[at++] === NEWLINE) this.line++;
    this.from = at;
    while (at < bytes.length && bytes[at]! > SPACE) at++;
    this.to = at;
    this.at = at;
    return this.to > this.from;
  }

  /** Moves to the next word on this line; false at its end, which is not passed. */
  nextOnLine(): boolean {
    const { bytes } = this;
    let at = this.at;
    while (at < bytes.length && bytes[at]! <= SPACE && bytes[at] !== NEWLINE) at++;
    this.from = at;
    while (at < bytes.length && bytes[at]! > SPACE) at++;
    this.to = at;
    this.at = at;
    return this.to > this.from;
  }

  /** Whether nothing follows the last word. */
  get atEnd(): boolean {
    return this.to === this.bytes.length;
  }

  skipLine(): void {
    const end = this.bytes.indexOf(NEWLINE, this.at);
    this.at = end < 0 ? this.bytes.length : end;
  }

  /** Whether the last word is `word`, given in lower case; capitals count as small letters. */
  is(word: string): boolean {
    if (this.to - this.from !== word.length) return false;
    for (let i = 0; i < word.length; i++)
      if (lowerCase(this.bytes[this.from + i]!) !== word.charCodeAt(i)) return false;
    return true;
  }

  /** The last word, at most 40 characters of it. */
  word(): string {
    let text = '';
    for (let i = this.from; i < Math.min(this.to, this.from + 40); i++)
      text += String.fromCharCode(this.bytes[i]!);
    return text;
  }

  /**
   * The last word as a decimal number, correctly rounded; NaN where it is none. Up to 15 digits and powers of ten up to 22
   * are exact in doubles, so one multiplication or division rounds once (W. D. Clinger, PLDI 1990); the rest goes to the engine.
   */
  number(): number {
    const { bytes } = this;
    let i = this.from;
    const sign = bytes[i];
    if (sign === 43 || sign === 45) i++;
    let digits = 0;
    let mantissa = 0;
    let exponent = 0;
    let point = false;
    for (; i < this.to; i++) {
      const c = bytes[i]!;
      if (c >= 48 && c <= 57) {
        mantissa = mantissa * 10 + (c - 48);
        if (mantissa > 0) digits++;
        if (point) exponent--;
        if (digits > 15) return this.slowNumber();
      } else if (c === 46 && !point) point = true;
      else break;
    }
    if (i === this.from || (i < this.to && (bytes[i]! | 32) !== 101)) return this.slowNumber();
    if (i < this.to) {
      let power = 0;
      let j = i + 1;
      const down = bytes[j] === 45;
      if (down || bytes[j] === 43) j++;
      if (j === this.to || this.to - j > 4) return this.slowNumber();
      for (; j < this.to; j++) {
        const c = bytes[j]! - 48;
        if (c < 0 || c > 9) return Number.NaN;
        power = power * 10 + c;
      }
      exponent += down ? -power : power;
    }
    if (exponent < -22 || exponent > 22 || mantissa === 0) return this.slowNumber();
    const size = exponent < 0 ? mantissa / POWERS[-exponent]! : mantissa * POWERS[exponent]!;
    return sign === 45 ? -size : size;
  }

  private slowNumber(): number {
    if (this.to - this.from > 400) return Number.NaN;
    let text = '';
    for (let i = this.from; i < this.to; i++) text += String.fromCharCode(this.bytes[i]!);
    return /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(text) ? Number(text) : Number.NaN;
  }
}

const lowerCase = (c: number): number => (c >= 65 && c <= 90 ? c + 32 : c);
