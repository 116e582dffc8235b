import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compileExpression, ExpressionError } from '../../../core/expressions/index.ts';
import { parseUnit, TextError } from '../../../core/units/index.ts';
import { FILE, LOOKUP, MM, VALUES } from './small-machine.ts';

const words = fc.constantFrom(
  ...'boom wall n pi if sqrt min atan2 mm g kg/m^3 deg rpm 1 2.5 1e3 1e999 .5 0 + - * / ^ % ( ) , < == != = . e ² µ \t'.split(
    / /,
  ),
);
const soup = fc.array(words, { maxLength: 25 }).map((list) => list.join(' '));
const glued = fc.array(words, { maxLength: 25 }).map((list) => list.join(''));
const anything = fc.oneof(soup, glued, fc.string({ unit: 'binary' }), fc.string({ maxLength: 3000 }));

describe('any text at all', () => {
  it('gives an expression or an ExpressionError whose place lies in the text', () => {
    fc.assert(
      fc.property(anything, fc.constantFrom(null, MM), (text, field) => {
        try {
          const expression = compileExpression(text, field, LOOKUP, FILE);
          expect(typeof expression.evaluate(VALUES)).toBe('number');
        } catch (error) {
          expect(error).toBeInstanceOf(ExpressionError);
          const { start, end, code, message } = error as ExpressionError;
          expect(code).toMatch(/^EXPRESSION_[A-Z_]+$/);
          expect(message).not.toBe('');
          expect(0 <= start && start <= end && end <= text.length).toBe(true);
        }
      }),
      { numRuns: 5000 },
    );
  });

  it('gives a unit or a TextError', () => {
    fc.assert(
      fc.property(anything, (text) => {
        try {
          expect(parseUnit(text).factor).toBeGreaterThan(0);
        } catch (error) {
          expect(error).toBeInstanceOf(TextError);
        }
      }),
      { numRuns: 2000 },
    );
  });
});
