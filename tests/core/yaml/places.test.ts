import { describe, expect, it } from 'vitest';
import { readYaml } from '../../../core/yaml/read-yaml.ts';
import type { YamlValue } from '../../../core/yaml/value.ts';

const TEXT = [
  'parts:',
  '  - name: boom',
  '    at: [ 1 mm, "a \\"b\\" + c", \'it\'\'s + d\' ]',
  '  - name: tail',
  '    note: |  # kept',
  '      one + two',
  '    empty:',
  '    long: one',
  '      two',
  '    solid: { box: { size: [ 1, 2, 3 ] } }',
].join('\n');

const { root, places } = readYaml(TEXT, 'a.yaml');
const parts = root.parts as Record<string, YamlValue>[];
const at = (line: number, column: number) => ({ file: 'a.yaml', line, column });

describe('Places', () => {
  it('gives the line of a list or mapping by identity', () => {
    expect(parts.map((part) => places.lineOf(part))).toEqual([2, 4]);
    expect(places.placeOfObject(parts[0]!.at as object)).toEqual(at(3, 9));
    expect(places.placeOfObject(root)).toEqual(at(1, 1));
  });

  it('gives the start of the file for a strange object', () => {
    expect(places.placeOfObject({})).toEqual(at(1, 1));
  });

  it('gives the place of a value and of its key, by path', () => {
    expect(places.placeOf(['parts', 1, 'name'])).toEqual(at(4, 11));
    expect(places.placeOfKey(['parts', 1, 'name'])).toEqual(at(4, 5));
    expect(places.placeOf(['parts', 1, 'solid', 'box', 'size', 2])).toEqual(at(10, 35));
  });

  it('gives the same places by a path from an object', () => {
    expect(places.placeOf(['name'], parts[1]!)).toEqual(at(4, 11));
    expect(places.placeOfKey(['solid', 'box'], parts[1]!)).toEqual(at(10, 14));
  });

  it('covers quotes with the length, and gives 1 for text on several lines', () => {
    expect(places.markOf(['parts', 0, 'at', 1])).toEqual({ at: at(3, 17), length: 13 });
    expect(places.markOfKey(['parts', 0, 'at'])).toEqual({ at: at(3, 5), length: 2 });
    expect(places.markOf(['parts', 1, 'note'])).toEqual({ at: at(5, 11), length: 1 });
    expect(places.markOf(['parts', 1, 'long'])).toEqual({ at: at(8, 11), length: 1 });
  });

  it('gives the key for an empty value', () => {
    expect(places.markOf(['parts', 1, 'empty'])).toEqual({ at: at(7, 5), length: 5 });
  });

  it('gives the last value on the way for a path that leads nowhere', () => {
    expect(places.placeOf(['parts', 0, 'mass', 'u'])).toEqual(at(2, 5));
    expect(places.placeOf(['limits'])).toEqual(at(1, 1));
  });

  it('finds a character inside plain, double-quoted and single-quoted text', () => {
    expect(places.markInScalar(['parts', 0, 'at', 0], 2, 2)).toEqual({ at: at(3, 13), length: 2 });
    expect(places.placeInScalar(['parts', 0, 'at', 1], 'a "b" + c'.indexOf('c'))).toEqual(at(3, 28));
    expect(places.markInScalar(['parts', 0, 'at', 1], 2, 3)).toEqual({ at: at(3, 20), length: 5 });
    expect(places.placeInScalar(['parts', 0, 'at', 2], "it's + d".indexOf('d'))).toEqual(at(3, 41));
  });

  it('gives the start of text on several lines for any character inside it', () => {
    expect(places.markInScalar(['parts', 1, 'note'], 6, 3)).toEqual({ at: at(5, 11), length: 1 });
    expect(places.markInScalar(['parts', 1, 'long'], 4, 3)).toEqual({ at: at(8, 11), length: 1 });
  });

  it('stays inside a scalar for an offset past its end', () => {
    expect(places.placeInScalar(['parts', 1, 'name'], 99)).toEqual(at(4, 15));
  });
});
