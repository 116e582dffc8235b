import { describe, expect, it } from 'vitest';
import { faultOf, MM } from './small-machine.ts';

describe('messages', () => {
  it.each([
    ['boom + 3', '"+" needs values of one kind; boom is a length and 3 is a plain number', 'write 3 mm'],
    ['3 + boom', '"+" needs values of one kind; 3 is a plain number and boom is a length', 'write 3 mm'],
    ['boom + load', '"+" needs values of one kind; boom is a length and load is a mass', undefined],
    [
      'boom + n * 2',
      '"+" needs values of one kind; boom is a length and n * 2 is a plain number',
      'multiply n * 2 by 1 mm',
    ],
    [
      '10 Hz - 3 rpm',
      '"-" needs values of one kind; 10 Hz is a frequency and 3 rpm is an angular speed',
      'Hz is 1/s and rpm an angular speed; turns a second are rev/s',
    ],
    ['sin(30)', 'sin needs an angle, and 30 is a plain number', 'write 30 deg'],
    ['floor(boom)', 'floor needs a plain number, and boom is a length', 'divide boom by 1 mm'],
    ['sqrt(boom)', 'the units of a square root have even powers, and boom is a length', undefined],
    ['boom^n', 'boom is a length, so its exponent must be a constant', 'divide boom by 1 mm'],
    ['boom^0.5', 'boom to the power 0.5 has no whole powers of the units of length', undefined],
    ['2^boom', 'an exponent is a plain number, and boom is a length', 'divide boom by 1 mm'],
    ['5 mm %', 'a percentage is of a plain number, and 5 mm is a length', undefined],
    [
      'boom > wall',
      'a comparison is true or false, and a number is wanted here',
      'a comparison stands first in if(condition, value when true, value when false)',
    ],
    ['if(n, 1, 2)', 'the condition of if is a comparison', 'compare with < <= > >= == or !='],
    ['mm', '"mm" is a unit and needs a number before it', 'write 1 mm'],
    ['3 mn', '"mn" is not a unit', 'did you mean mm?'],
    ['2 boom', '"boom" is not a unit', 'to multiply, write 2 * boom'],
    ['2700 kg/m3', 'nothing is named "m3"', 'did you mean m^3?'],
    ['2.7 g/cc', 'nothing is named "cc"', 'did you mean cm^3?'],
    ['3 mm2', '"mm2" is not a unit', 'did you mean mm^2?'],
    ['bom', 'nothing is named "bom"', 'did you mean boom?'],
    ['kgg * 2', 'nothing is named "kgg"', 'did you mean kg?'],
    ['* 2', '"*" stands where a value should', undefined],
    ['sqrtt(2)', 'there is no function "sqrtt"', 'did you mean sqrt?'],
    ['sqrt', '"sqrt" is a function and needs its arguments', 'write sqrt( … )'],
    ['min(1)', 'min takes at least 2 arguments, not 1', undefined],
    ['if(1 < 2)', 'if takes 3 arguments, not 1', 'write if(condition, value when true, value when false)'],
    ['', 'there is no expression', undefined],
    ['1 +', 'a value is missing after "+"', undefined],
    ['2 ** 3', '"*" stands where a value should after "*"', 'a power is written ^'],
    ['1,2', 'a comma stands only between arguments of a function', 'the decimal mark is a point'],
    ['(1', 'this parenthesis is not closed', 'write the missing )'],
    ['boom wall', 'an operator is missing before "wall"', 'to multiply, write boom * wall'],
    ['a < b < c', 'comparisons do not chain', 'write if(a < b, if(b < c, …), …)'],
    ['3 × 4', '"×" has no meaning in an expression', 'write *'],
    [
      '3 mm^x',
      'the power of a unit is a whole number from 1 to 100 or its negative',
      'to raise the whole quantity to a power, put it in parentheses: (3 mm)^2',
    ],
    ['1 / 0', 'this divides by zero', undefined],
    ['1e999', 'this is larger than any number the machine can hold', undefined],
  ])('of %s', (text, message, hint) => {
    const fault = faultOf(text);
    expect(fault.message).toBe(message);
    expect(fault.hint).toBe(hint);
  });

  it('cut a long part short', () => {
    const long = 'boom * boom * boom * boom * boom * boom * boom';
    expect(faultOf(long, MM).message).toBe(
      'expected a length, and boom * boom * boom * boom * boom * boom… is a quantity in m^7',
    );
  });

  it('name both kinds, and the length of a text too long', () => {
    expect(faultOf('load', MM).message).toBe('expected a length, and load is a mass');
    expect(faultOf(`1 + ${'1 + '.repeat(499)}1`).message).toBe(
      'an expression has at most 2000 characters; this one has 2001',
    );
  });
});
