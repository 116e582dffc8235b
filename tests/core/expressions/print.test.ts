import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseExpression, printExpression } from '../../../core/expressions/index.ts';
import { randomAst, withoutPlaces } from './random-ast.ts';

describe('printExpression', () => {
  it.each([
    ['((1+2))*3', '(1 + 2) * 3'],
    ['1-(2-3)', '1 - (2 - 3)'],
    ['(1-2)-3', '1 - 2 - 3'],
    ['(-2)^2', '(-2)^2'],
    ['-2^2', '-2^2'],
    ['(6 mm)^2', '(6 mm)^2'],
    ['6mm^2', '6 mm^2'],
    ['5 s^-1', '5 /s'],
    ['(2^3)^2', '(2^3)^2'],
    ['2^(3^2)', '2^3^2'],
    ['(a+b)%', '(a + b) %'],
    ['if(a<b,1,-(2))', 'if(a < b, 1, -2)'],
    ['1/(2*3)', '1 / (2 * 3)'],
  ])('writes %s as %s', (text, printed) => {
    expect(printExpression(parseExpression(text))).toBe(printed);
  });

  it('gives a text that reads back as the same tree', () => {
    fc.assert(
      fc.property(randomAst, (ast) => {
        const text = printExpression(ast);
        fc.pre(text.length <= 2000);
        expect(withoutPlaces(parseExpression(text))).toEqual(withoutPlaces(ast));
      }),
      { numRuns: 2000 },
    );
  });
});
