import { describe, expect, it } from 'vitest';
import { compileExpression, explainNotFinite } from '../../../core/expressions/index.ts';
import { evaluateText, FILE, faultAt, LOOKUP, VALUES } from './small-machine.ts';

function explain(text: string, values: number[] = VALUES): [part: string, message: string] | undefined {
  const { root } = compileExpression(text, null, LOOKUP, FILE);
  const fault = explainNotFinite(root!, values);
  return fault && [text.slice(fault.start, fault.end), fault.message];
}

describe('a value that is not finite', () => {
  it.each([
    ['wall + boom / nothing * 3', 'boom / nothing', 'this divides by zero'],
    ['1 + sqrt(1 - n)', 'sqrt(1 - n)', 'this is the square root of a negative number'],
    ['cos(asin(n))', 'asin(n)', 'asin needs a number from -1 to 1, and this is 3'],
    ['tan(sweep * n)', 'tan(sweep * n)', 'the tangent of a right angle has no finite value'],
    ['(2 - n)^0.3', '(2 - n)^0.3', 'a negative number has no broken power'],
    ['nothing^-2', 'nothing^-2', 'zero has no negative power'],
    ['1 + 10^(n * 200)', '10^(n * 200)', 'this is larger than any number the machine can hold'],
    ['if(nothing / nothing > 2, n, n)', 'nothing / nothing', 'this divides by zero'],
  ])('in %s is laid to "%s"', (text, part, message) => {
    expect(Number.isFinite(compileExpression(text, null, LOOKUP, FILE).evaluate(VALUES))).toBe(false);
    expect(explain(text)).toEqual([part, message]);
  });

  it('may come with a parameter', () => {
    expect(explain('1 + n', [0, 0, 0, 0, Number.NaN])).toEqual(['n', 'this has no finite value']);
  });

  it('is none where every part has a value, or only the branch not taken has none, or a comparison holds of infinity', () => {
    expect(explain('boom / wall')).toBeUndefined();
    expect(explain('if(nothing == 0, boom, boom / nothing)')).toBeUndefined();
    expect(evaluateText('if(1 / nothing > 2, 5, 6)')).toBe(5);
  });

  it('is found at once in an expression of constants', () => {
    expect(faultAt('1 + 2 / 0')).toEqual(['EXPRESSION_NOT_FINITE', '2 / 0']);
    expect(faultAt('1e999')).toEqual(['EXPRESSION_NOT_FINITE', '1e999']);
    expect(faultAt('1 + 1e999 mm / 1 mm')).toEqual(['EXPRESSION_NOT_FINITE', '1e999 mm']);
    expect(faultAt('tan(90 deg)')).toEqual(['EXPRESSION_NOT_FINITE', 'tan(90 deg)']);
  });
});
