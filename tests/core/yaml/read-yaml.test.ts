import { describe, expect, it } from 'vitest';
import { readYaml } from '../../../core/yaml/read-yaml.ts';
import type { YamlValue } from '../../../core/yaml/value.ts';
import { faultsOf, placesAndCodes, printed } from './faults-of.ts';

const read = (text: string) => readYaml(text, 'a.yaml').root;
const plain = (value: YamlValue) => JSON.parse(JSON.stringify(value));
const faults = (text: string) => faultsOf(() => readYaml(text, 'a.yaml'));
const codes = (text: string) => placesAndCodes(faults(text));

describe('readYaml', () => {
  it('reads every scalar as text', () => {
    expect(plain(read('a: 1.20\nb: yes\nc: null\nd: ~\ne: 2030-01-01\nf: 0x1F\ng: 1e3\nh:\n'))).toEqual({
      a: '1.20',
      b: 'yes',
      c: 'null',
      d: '~',
      e: '2030-01-01',
      f: '0x1F',
      g: '1e3',
      h: '',
    });
  });

  it('reads lists and mappings in both styles', () => {
    const text = 'a: [ 1, { b: 2 } ]\nc:\n  - d\n  - e: f\n    g: h\n  - - i\n';
    expect(plain(read(text))).toEqual({ a: ['1', { b: '2' }], c: ['d', { e: 'f', g: 'h' }, ['i']] });
  });

  it('reads quoted, folded and literal text', () => {
    const text = "a: \"x\\ty\"\nb: 'it''s'\nc: >\n  one\n  two\nd: |\n  one\n  two\n";
    expect(plain(read(text))).toEqual({ a: 'x\ty', b: "it's", c: 'one two\n', d: 'one\ntwo\n' });
  });

  it.each(['\n', '\r\n', '\r'])('reads lines that end with %j', (end) => {
    expect(plain(read(['a:', '  - b', 'c: d', ''].join(end)))).toEqual({ a: ['b'], c: 'd' });
  });

  it('drops a byte order mark and counts columns without it', () => {
    expect(plain(read('\ufeffa: b'))).toEqual({ a: 'b' });
    expect(codes('\ufeff!x a: b')).toEqual(['1:1 YAML_TAG']);
  });

  it('gives an alias the very object its anchor names', () => {
    const root = read('a: &x { b: c }\nd: *x\ne: [ &y f, *y ]') as Record<string, YamlValue>;
    expect(root.d).toBe(root.a);
    expect(root.e).toEqual(['f', 'f']);
  });

  it('takes the last anchor of a name', () => {
    expect(plain(read('a: &x 1\nb: *x\nc: &x 2\nd: *x'))).toEqual({ a: '1', b: '1', c: '2', d: '2' });
  });

  it.each(['__proto__', 'constructor', 'toString', 'hasOwnProperty'])(
    'takes %s for a key like any other',
    (key) => {
      const root = read(`${key}: { a: b }`);
      expect(Object.keys(root)).toEqual([key]);
      expect(Object.hasOwn(root, key)).toBe(true);
      expect(({} as Record<string, unknown>).a).toBeUndefined();
    },
  );

  it('inherits nothing', () => {
    const root = read('a: b');
    expect('constructor' in root).toBe(false);
    expect('__proto__' in root).toBe(false);
  });

  it('takes a quoted "<<" for an ordinary key', () => {
    expect(plain(read('"<<": a'))).toEqual({ '<<': 'a' });
  });
});

describe('readYaml refuses', () => {
  it.each([
    ['an open bracket', 'a: [ 1, [ 2 ]\n', '1:4 YAML_SYNTAX'],
    ['a bracket open at the next key', 'a: [ 1, [ 2 ]\nb: c', '1:4 YAML_SYNTAX'],
    ['a quote open at the next key', 'a: "b\nc: d', '2:1 YAML_SYNTAX'],
    ['a tab in the indentation', 'a:\n\tb: c', '2:1 YAML_SYNTAX'],
    ['a second colon', 'a: b: c', '1:5 YAML_SYNTAX'],
    ['a line indented too far', 'a: b\n  c: d', '2:4 YAML_SYNTAX'],
    ['an open quote', 'a: "b\\" c', '1:4 YAML_SYNTAX'],
    ['a missing comma', 'a: { b: [ c ] d: e }', '1:15 YAML_SYNTAX'],
    ['a tag', 'a: !!int 3', '1:4 YAML_TAG'],
    ['a tag on a list', 'a: !x [ b ]', '1:4 YAML_TAG'],
    ['a tag with an unknown handle', 'a: !e!x b', '1:8 YAML_TAG'],
    ['a merge key', 'a: &x { b: c }\nd:\n  <<: *x', '3:3 YAML_MERGE_KEY'],
    ['a list as key', '? [ a ]\n: b', '1:3 YAML_KEY_NOT_TEXT'],
    ['a mapping as key', 'x:\n  { a: b }: c', '2:3 YAML_KEY_NOT_TEXT'],
    ['an alias as key', 'a: &x b\n*x : c', '2:1 YAML_KEY_NOT_TEXT'],
    ['a missing key', 'a: b\n: c', '1:4 YAML_KEY_NOT_TEXT'],
    ['an unknown alias', 'a: *b', '1:4 YAML_UNKNOWN_ALIAS'],
    ['an alias inside its own value', 'a: &x [ b, *x ]', '1:12 YAML_ALIAS_CIRCLE'],
    ['a second document', 'a: b\n---\nc: d', '3:1 YAML_SEVERAL_DOCUMENTS'],
    ['an empty file', '', '1:1 YAML_EMPTY'],
    ['a file of comments', '# nothing\n\n# here', '1:1 YAML_EMPTY'],
    ['a file of nothing but a marker', '---\n', '1:1 YAML_EMPTY'],
    ['a list', '- a\n- b', '1:1 YAML_NOT_MAPPING'],
    ['text', 'just text', '1:1 YAML_NOT_MAPPING'],
    ['NUL', 'a: b\nc: d\0e', '2:5 TEXT_CONTROL_CHARACTER'],
    ['a terminal escape', 'a: b # \u001b[31m', '1:8 TEXT_CONTROL_CHARACTER'],
    ['half a surrogate pair', 'a: \ud800', '1:4 TEXT_CONTROL_CHARACTER'],
    ['an escape for NUL', 'a: "b\\0"', '1:4 TEXT_CONTROL_CHARACTER'],
    ['an escape for a terminal escape', 'a: "\\e[31m"', '1:4 TEXT_CONTROL_CHARACTER'],
  ])('%s', (_, text, expected) => {
    expect(codes(text)).toEqual([expected]);
  });

  it('a duplicate key, naming both places', () => {
    const found = faults('a: 1\nb:\n  c: [ { x: 1 } ]\n  d: 3\n  c: 4\n');
    expect(placesAndCodes(found)).toEqual(['5:3 YAML_DUPLICATE_KEY']);
    expect(found[0]!.message).toContain('3:3');
  });

  it('every duplicate key at once', () => {
    expect(codes('a: 1\na: 2\n"a": 3\nb: { c: 1, c: 2 }')).toEqual([
      '2:1 YAML_DUPLICATE_KEY',
      '3:1 YAML_DUPLICATE_KEY',
      '4:12 YAML_DUPLICATE_KEY',
    ]);
  });

  it('more than a hundred aliases, but not a hundred', () => {
    const aliases = (count: number) => `a: &x { b: c }\nd: [ ${Array(count).fill('*x').join(', ')} ]`;
    expect(plain(read(aliases(100))).d).toHaveLength(100);
    expect(codes(aliases(101))).toEqual(['2:6 YAML_ALIASES']);
  });

  it('aliases that multiply, counting them written out', () => {
    const lines = ['a0: &a0 [ x ]'];
    for (let i = 1; i <= 40; i++) lines.push(`a${i}: &a${i} [ *a${i - 1}, *a${i - 1} ]`);
    const start = performance.now();
    expect(faults(lines.join('\n')).map((fault) => fault.code)).toEqual([
      'YAML_ALIASES',
      'YAML_TOO_MANY_NODES',
    ]);
    expect(performance.now() - start).toBeLessThan(1000);
  });

  it('a few aliases of something large, counting its values each time', () => {
    const large = Array(20_000).fill('x').join(', ');
    expect(codes(`a: &x [ ${large} ]\nb: [ ${Array(60).fill('*x').join(', ')} ]`)).toEqual([
      '1:1 YAML_TOO_MANY_NODES',
    ]);
  });

  it('aliases that nest too deep', () => {
    const deep = (name: string, inner: string) =>
      `${name}: &${name} ${'['.repeat(60)}${inner}${']'.repeat(60)}`;
    expect(codes(`${deep('a', 'x')}\n${deep('b', '*a')}`)).toEqual(['2:67 YAML_TOO_DEEP']);
  });

  it.each(['[', '- ', '{ a: ', '? '])('a megabyte of %j, without a stack overflow', (piece) => {
    const start = performance.now();
    expect(faults(piece.repeat(1_000_000 / piece.length)).map((fault) => fault.code)).toEqual([
      'YAML_TOO_DEEP',
    ]);
    expect(performance.now() - start).toBeLessThan(2000);
  });

  it('more than a million values, before they fill the memory', () => {
    const start = performance.now();
    expect(codes(`a: [ ${'x,'.repeat(12_000_000)} ]`)).toEqual(['1:1 YAML_TOO_MANY_NODES']);
    expect(performance.now() - start).toBeLessThan(10_000);
  });

  it('a hundred megabytes, at once', () => {
    const start = performance.now();
    const text = 'x'.repeat(100 * 1024 * 1024);
    expect(codes(text)).toEqual(['1:1 TEXT_TOO_LARGE']);
    expect(performance.now() - start).toBeLessThan(1000);
  });

  it('32 MiB counted in bytes, not in characters', () => {
    expect(codes(`a: ${'é'.repeat(17 * 1024 * 1024)}`)).toEqual(['1:1 TEXT_TOO_LARGE']);
  });

  it('at most twenty faults at a time', () => {
    expect(faults('a: 1\n'.repeat(100))).toHaveLength(20);
  });
});

describe('readYaml says', () => {
  it.each([
    'a: [ 1, 2',
    'a: [ 1, 2\nb: c',
    'a: "b\nc: d"',
    'a:\n\tb: c',
    'a: b: c',
    'a: b\n  c: d',
    'a:\n  - b\n - c',
    'a: "b',
    "a: 'b",
    'a: "\\q"',
    'a: { b: [ c ] d: e }',
    'a: [ , b ]',
    'a: *',
    'a: b\nc',
    'a: [ b ] c',
    '%YAML 3.0\n---\na: b',
    'a: !!int 3',
    'a: { <<: b }',
    '? [ a ]\n: b',
    'a: &boom 1\nb: *bomo',
    'a: &x [ *x ]',
    'a: b\n---\nc: d',
    '',
    '- a',
    'text',
    'a: 1\na: 2',
    'a: b\u0007',
    'a: "\\a"',
    '['.repeat(200),
    `a: &x b\nc: [ ${Array(101).fill('*x').join(', ')} ]`,
  ])('what is wrong with %j and how to mend it', (text) => {
    expect(printed(faults(text))).toMatchSnapshot();
  });

  it('how large a file is that is too large', () => {
    expect(printed(faults('x'.repeat(33 * 1024 * 1024 + 5)))).toMatchSnapshot();
  });
});
