import { describe, expect, it } from 'vitest';
import { LineTable } from '../../../core/yaml/line-table.ts';

describe('LineTable', () => {
  it.each([
    ['LF', 'a\nbc\n\nd'],
    ['CRLF', 'a\r\nbc\r\n\r\nd'],
    ['CR', 'a\rbc\r\rd'],
  ])('counts lines that end with %s', (_, text) => {
    const table = new LineTable(text);
    expect(table.placeOf(0)).toEqual({ line: 1, column: 1 });
    expect(table.placeOf(text.indexOf('c'))).toEqual({ line: 2, column: 2 });
    expect(table.placeOf(text.indexOf('d'))).toEqual({ line: 4, column: 1 });
    expect(table.placeOf(text.length)).toEqual({ line: 4, column: 2 });
  });

  it('counts mixed line ends once each', () => {
    const text = 'a\r\nb\rc\nd';
    expect(['a', 'b', 'c', 'd'].map((letter) => new LineTable(text).lineOf(text.indexOf(letter)))).toEqual([
      1, 2, 3, 4,
    ]);
  });

  it('has one line for an empty text', () => {
    expect(new LineTable('').placeOf(0)).toEqual({ line: 1, column: 1 });
  });
});
