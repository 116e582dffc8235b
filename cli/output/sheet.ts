import { plainText } from '../../core/figures/index.ts';
import { toAscii } from './glyphs.ts';
import type { Ink } from './ink.ts';
import { padEnd, padStart, textWidth, wrap } from './text-width.ts';

type Paint = (text: string) => string;

/** One cell: its text and how it is painted. */
export interface Cell {
  readonly text: string;
  readonly paint?: Paint | undefined;
}

export interface Column {
  readonly head: string;
  /** Figures stand at the right end, names at the left. */
  readonly align: 'left' | 'right';
}

/** A report in the making: lines no wider than the terminal, every text made plain before it is measured. */
export class Sheet {
  readonly ink: Ink;
  readonly width: number;
  readonly #lines: string[] = [];

  constructor(ink: Ink, width: number) {
    this.ink = ink;
    this.width = width;
  }

  /** Text as it will be printed: control characters shown, marks in ASCII where the terminal has no more. */
  plain(text: string): string {
    const safe = plainText(text);
    return this.ink.unicode ? safe : toAscii(safe);
  }

  blank(): void {
    if (this.#lines.length > 0) this.#lines.push('');
  }

  /** A paragraph, wrapped; later lines are set in by `hang`. */
  say(
    text: string,
    { paint, indent = 0, hang = indent }: { paint?: Paint | undefined; indent?: number; hang?: number } = {},
  ): void {
    const lines = wrap(this.plain(text), this.width - hang, this.width - indent);
    lines.forEach((line, i) => {
      this.#lines.push(' '.repeat(i === 0 ? indent : hang) + (paint ?? same)(line));
    });
  }

  /** A section's head on a rule, its qualifier at the right end, or below where both do not fit. */
  head(title: string, qualifier = ''): void {
    this.blank();
    const left = this.plain(title);
    const right = this.plain(qualifier);
    const gap = this.width - textWidth(left) - textWidth(right);
    if (gap >= 2)
      this.#lines.push(`${this.ink.strong(left)}${' '.repeat(gap)}${this.ink.soft(right)}`.trimEnd());
    else {
      this.say(title, { paint: this.ink.strong });
      this.say(qualifier, { paint: this.ink.soft });
    }
    this.rule();
  }

  rule(): void {
    this.#lines.push(this.plain('─').repeat(this.width));
  }

  /** A line put together by the caller, already plain and narrow enough. */
  raw(line: string): void {
    this.#lines.push(line.trimEnd());
  }

  /**
   * Rows under heads, hairlines and no boxes. The first column takes what room the others leave; a first cell that is
   * longer stands on lines of its own above its figures, and so does a table too wide as label and value pairs.
   */
  table(
    columns: readonly Column[],
    rows: readonly (readonly Cell[])[],
    options: { totals?: number; indent?: number } = {},
  ): void {
    if (rows.length === 0) return;
    const heads = columns.map((c) => c.head.split('\n').map((line) => this.plain(line)));
    const texts = rows.map((row) => row.map((cell) => this.plain(cell.text)));
    const indent = options.indent ?? 0;
    const room = this.width - indent;
    const last = columns.length - 1;
    const widths = columns.map((_, k) =>
      Math.max(...heads[k]!.map(textWidth), ...texts.map((row) => textWidth(row[k] ?? ''))),
    );
    const gap = 2;
    const sum = (list: number[]) => list.reduce((a, b) => a + b + gap, -gap);
    // A last column of places or words may wrap below its row instead of pushing the figures out.
    const lastFloats = columns[last]!.align === 'left' && last > 0 && sum(widths) > room;
    if (lastFloats) {
      const least = Math.max(textWidth(heads[last]!.join(' ')), 4);
      const short = Math.max(least, room - sum(widths.slice(0, -1)) - gap);
      widths[last] = Math.min(widths[last]!, Math.max(least, short));
    }
    const others = widths.length > 1 ? sum(widths.slice(1)) + gap : 0;
    const firstLeast = Math.min(widths[0]!, Math.max(8, textWidth(heads[0]!.join(' '))));
    if (others + firstLeast > room) {
      this.#pairs(columns, rows, indent);
      return;
    }
    widths[0] = Math.min(widths[0]!, room - others);
    // Nothing is padded at the end of a line, where colour would keep the spaces.
    const aligned = (text: string, { align }: Column, k: number) =>
      align === 'right' ? padStart(text, widths[k]!) : k === last ? text : padEnd(text, widths[k]!);
    const set = (cells: readonly Cell[]) => {
      const end = cells.findLastIndex((cell) => cell.text.trim() !== '');
      const parts = cells
        .slice(0, end + 1)
        .map((cell, k) => (cell.paint ?? same)(k === end ? cell.text.trimEnd() : cell.text));
      this.#lines.push(' '.repeat(indent) + parts.join(' '.repeat(gap)));
    };
    const depth = Math.max(...heads.map((h) => h.length));
    if (heads.some((h) => h.join('') !== ''))
      for (let d = 0; d < depth; d++)
        set(
          columns.map((c, k) => {
            const text = heads[k]![d - (depth - heads[k]!.length)] ?? '';
            return { text: aligned(text, c, k), paint: this.ink.soft };
          }),
        );
    texts.forEach((row, r) => {
      if (options.totals !== undefined && r === rows.length - options.totals)
        this.#lines.push(
          ' '.repeat(indent) + this.ink.soft(this.plain('─').repeat(Math.min(room, sum(widths)))),
        );
      const cells = rows[r]!;
      const long = textWidth(row[0]!) > widths[0]!;
      if (long)
        for (const line of wrap(row[0]!, room))
          this.#lines.push(' '.repeat(indent) + (cells[0]!.paint ?? same)(line));
      const below: string[] = [];
      set(
        columns.map((c, k) => {
          let text = long && k === 0 ? '' : (row[k] ?? '');
          if (textWidth(text) > widths[k]!) {
            below.push(text);
            text = '';
          }
          return { text: aligned(text, c, k), paint: cells[k]?.paint };
        }),
      );
      for (const text of below)
        for (const line of wrap(text, room - 4)) this.#lines.push(' '.repeat(indent) + padStart(line, room));
    });
  }

  /** A table wider than the sheet, row after row as label and value. */
  #pairs(columns: readonly Column[], rows: readonly (readonly Cell[])[], indent: number): void {
    for (const row of rows) {
      this.say(row[0]?.text ?? '', { indent, paint: row[0]?.paint });
      columns.slice(1).forEach((column, k) => {
        const cell = row[k + 1];
        if (cell && cell.text !== '')
          this.say(`${column.head.replaceAll('\n', ' ')}: ${cell.text}`, {
            indent: indent + 2,
            hang: indent + 4,
            paint: cell.paint,
          });
      });
    }
  }

  text(): string {
    return `${this.#lines.join('\n')}\n`;
  }
}

const same: Paint = (text) => text;
