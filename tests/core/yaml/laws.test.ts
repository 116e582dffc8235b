import fc from 'fast-check';
import { dump } from 'js-yaml';
import { describe, expect, it } from 'vitest';
import {
  isAlias,
  isMap,
  isScalar,
  isSeq,
  LineCounter,
  type Node,
  parse,
  parseDocument,
  stringify,
} from 'yaml';
import type { Places } from '../../../core/yaml/places.ts';
import { readYaml } from '../../../core/yaml/read-yaml.ts';
import type { PathStep, YamlValue } from '../../../core/yaml/value.ts';

const word = fc.oneof(
  fc.string({
    unit: fc.constantFrom(...'ab1 .-:#,[]{}()"\'|>*&!%@`?~é\\/'.split(''), '\n', '𝄞'),
    maxLength: 12,
  }),
  fc.constantFrom(
    'true',
    'null',
    '~',
    '1.20',
    '12 mm',
    'max(a, b)',
    'constructor',
    '<<',
    '---',
    'a\nb\n',
    '  a',
    'a: b',
  ),
);
const key = word.filter((text) => text !== '' && text !== '<<');
const { value } = fc.letrec<{ value: YamlValue; list: YamlValue[]; map: Record<string, YamlValue> }>(
  (tie) => ({
    value: fc.oneof({ depthSize: 'small', withCrossShrink: true }, word, tie('list'), tie('map')),
    list: fc.array(tie('value'), { maxLength: 4 }),
    map: fc.dictionary(key, tie('value'), { maxKeys: 4, noNullPrototype: true }),
  }),
);
const root = fc.dictionary(key, value, { minKeys: 1, maxKeys: 5, noNullPrototype: true });
const lineEnd = fc.constantFrom('\n', '\r\n');

/** The other parser prints text that is empty or has several lines wrongly inside [ ]. */
const fitForFlow = (data: unknown) =>
  JSON.parse(JSON.stringify(data), (_, inner) =>
    typeof inner === 'string' ? inner.replace(/\n/g, '') || 'empty' : inner,
  );

const asPlain = (data: unknown) => JSON.parse(JSON.stringify(data));

function readsAsOracle(text: string): Places {
  const { root: data, places } = readYaml(text, 'a.yaml');
  expect(asPlain(data)).toEqual(asPlain(parse(text, { schema: 'failsafe' })));
  return places;
}

describe('readYaml', () => {
  it('reads what `stringify` of the other parser prints as that parser does', () => {
    fc.assert(
      fc.property(
        root,
        fc.constantFrom<'BLOCK_LITERAL' | 'QUOTE_DOUBLE' | 'PLAIN'>('BLOCK_LITERAL', 'QUOTE_DOUBLE', 'PLAIN'),
        lineEnd,
        (data, style, end) => {
          const text = stringify(data, { schema: 'failsafe', defaultStringType: style }).replaceAll(
            '\n',
            end,
          );
          readsAsOracle(text);
        },
      ),
    );
  });

  it('reads back what `dump` prints', () => {
    fc.assert(
      fc.property(root, fc.integer({ min: -1, max: 3 }), (data, flowLevel) => {
        const text = dump(data, { flowLevel });
        expect(asPlain(readYaml(text, 'a.yaml').root)).toEqual(asPlain(data));
      }),
    );
  });

  it('places every key and every scalar where the other parser does', () => {
    fc.assert(
      fc.property(root, lineEnd, fc.boolean(), (data, end, isFlow) => {
        const text = stringify(isFlow ? fitForFlow(data) : data, {
          schema: 'failsafe',
          collectionStyle: isFlow ? 'flow' : 'any',
        }).replaceAll('\n', end);
        placesAgree(text);
      }),
    );
  });

  it('places what stands behind anchors and aliases where the other parser does', () => {
    placesAgree(
      'a: &x { b: &y "c", d: [ *y, e ] }\nf: &z\n  - g\n  - *x\nh: &w >-\n  folded\n  text\ni: *z\n',
    );
  });
});

/** Compares the place of every key and scalar with the ranges of the other parser. */
function placesAgree(text: string): void {
  const counter = new LineCounter();
  const document = parseDocument(text, { schema: 'failsafe', lineCounter: counter });
  const places = readsAsOracle(text);
  const placeAt = (node: Node) => {
    const { line, col } = counter.linePos(node.range![0]);
    return { file: 'a.yaml', line, column: col };
  };
  const visit = (node: unknown, path: PathStep[]) => {
    if (isMap(node)) {
      for (const pair of node.items) {
        const keyNode = pair.key as Node & { value: string };
        const inner = [...path, keyNode.value];
        expect(places.placeOfKey(inner)).toEqual(placeAt(keyNode));
        visit(pair.value, inner);
      }
    } else if (isSeq(node)) for (const [i, item] of node.items.entries()) visit(item, [...path, i]);
    else if (isAlias(node)) expect(places.placeOf(path)).toEqual(placeAt(node));
    else if (isScalar(node) && node.source !== undefined && isThere(node))
      expect(places.placeOf(path)).toEqual(placeAt(node));
  };
  visit(document.contents, []);
}

function isThere(node: Node): boolean {
  return node.range![1] > node.range![0];
}
