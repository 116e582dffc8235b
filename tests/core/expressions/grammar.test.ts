import { describe, expect, it } from 'vitest';
import { namesIn, parseExpression } from '../../../core/expressions/index.ts';
import { evaluateText, faultAt } from './small-machine.ts';

describe('operators', () => {
  it.each([
    ['1 + 2 * 3', 7],
    ['(1 + 2) * 3', 9],
    ['2 - 3 - 4', -5],
    ['24 / 4 / 3', 2],
    ['24 / 4 * 3', 18],
    ['-2^2', -4],
    ['(-2)^2', 4],
    ['2^-1', 0.5],
    ['2^3^2', 512],
    ['(2^3)^2', 64],
    ['2^-2^2', 0.0625],
    ['2 * -3', -6],
    ['2 - -3', 5],
    ['+5', 5],
    ['- -5', 5],
    ['50 %', 0.5],
    ['2 + 50 %', 2.5],
    ['-50 %', -0.5],
    ['2^50 % * 2', 2 * Math.SQRT2],
    ['(20 + 5) %', 0.25],
    ['100 % / 4', 0.25],
    ['1e-5', 0.00001],
    ['.5 + 5. + 1E1', 15.5],
    ['1e2^2', 10000],
    ['pi', Math.PI],
    ['2*pi', 2 * Math.PI],
  ])('%s is %d', (text, value) => {
    expect(evaluateText(text)).toBe(value);
  });
});

describe('numbers with units', () => {
  it.each([
    ['1.2 mm', 0.0012],
    ['1.2mm', 0.0012],
    ['2700 kg/m^3', 2700],
    ['1/2 mm', 500],
    ['1/(2 mm)', 500],
    ['6 mm^2', 6e-6],
    ['(6 mm)^2', 36e-6],
    ['6 / mm', 6000],
    ['6 /mm^2', 6e6],
    ['5 s^-1', 5],
    ['120 g*mm^2', 1.2e-7],
    ['120 g * mm^2', 1.2e-7],
    ['8 mm * 2', 0.016],
    ['8 mm / 2', 0.004],
    ['8 mm / 2 mm', 4],
    ['8 mm / boom', 0.008 / 0.42],
    ['boom / 2 mm', 210],
    ['boom / 70', 0.006],
    ['-2 mm^2', -2e-6],
    ['10 kg*m/s^2 - 10 N', 0],
    ['8 mm - wall / 2', 0.0074],
    ['-boom / 2', -0.21],
    ['boom * 0.8', 0.336],
    ['5 % * boom', 0.021],
    ['2^2 mm / 1 mm', Number.NaN],
  ])('%s in SI', (text, value) => {
    if (Number.isNaN(value)) expect(faultAt(text)).toEqual(['EXPRESSION_WRONG_DIMENSION', '2 mm']);
    else expect(evaluateText(text)).toBeCloseTo(value, 14);
  });

  it('takes the unit before any operator, even a power', () => {
    expect(evaluateText('2 * 3 mm^2')).toBe(6e-6);
    expect(evaluateText('12 kg / 2 m^3')).toBe(6);
    expect(evaluateText('12 kg / 2 / m^3')).toBe(6);
    expect(evaluateText('12 kg / 2 m / m^2')).toBe(6);
  });
});

describe('functions', () => {
  it.each([
    ['sqrt(9)', 3],
    ['abs(-2 mm)', 0.002],
    ['min(3, 1, 2)', 1],
    ['max(3 mm, 1 cm)', 0.01],
    ['max(0, centre.x)', 0],
    ['sin(30 deg)', 0.5],
    ['sin(180 deg)', 0],
    ['cos(90 deg)', 0],
    ['cos(3690 deg)', 0],
    ['sin(pi / 2 * 1 rad)', 1],
    ['tan(45 deg)', 1],
    ['asin(1) / 1 deg', 90],
    ['acos(0.5) / 1 deg', 60],
    ['atan(1) / 1 rad', Math.PI / 4],
    ['atan2(1 mm, -1 mm) / 1 deg', 135],
    ['hypot(3 mm, 4 mm)', 0.005],
    ['hypot(2, 3, 6)', 7],
    ['floor(-1.5)', -2],
    ['ceil(-1.5)', -1],
    ['round(2.5)', 3],
    ['round(-2.5)', -3],
    ['round(0.49999999999999994)', 0],
    ['if(1 < 2, 3, 4)', 3],
    ['if(boom >= 1 m, 3 mm, 4 mm)', 0.004],
    ['if(n == 3, 1, 1 / nothing)', 1],
    ['if(n != 3, 1 / nothing, 2)', 2],
    ['if((n > 2), if(n <= 3, 5, 6), 7)', 5],
    ['sqrt(boom * boom)', 0.42],
  ])('%s', (text, value) => {
    expect(evaluateText(text)).toBeCloseTo(value, 13);
  });
});

describe('comparisons', () => {
  it.each([
    ['<', 'yes', 'no', 'no'],
    ['<=', 'yes', 'yes', 'no'],
    ['>', 'no', 'no', 'yes'],
    ['>=', 'no', 'yes', 'yes'],
    ['==', 'no', 'yes', 'no'],
    ['!=', 'yes', 'no', 'yes'],
  ])('%s below, at and above: %s, %s, %s', (operator, ...answers) => {
    const holds = [2, 3, 4].map((k) => evaluateText(`if(${k} ${operator} n, 1, 0)`) === 1);
    expect(holds).toEqual(answers.map((answer) => answer === 'yes'));
    const folded = [2, 3, 4].map((k) => evaluateText(`if(${k} ${operator} 3, 1, 0)`) === 1);
    expect(folded).toEqual(holds);
  });
});

describe('faults of syntax', () => {
  it.each([
    ['', 'EXPRESSION_SYNTAX', ''],
    ['   ', 'EXPRESSION_SYNTAX', '   '],
    ['1 +', 'EXPRESSION_SYNTAX', '+'],
    ['* 2', 'EXPRESSION_SYNTAX', '*'],
    ['2 ** 3', 'EXPRESSION_SYNTAX', '*'],
    ['(1', 'EXPRESSION_SYNTAX', '('],
    ['1)', 'EXPRESSION_SYNTAX', ')'],
    ['boom wall', 'EXPRESSION_SYNTAX', 'wall'],
    ['2 (3)', 'EXPRESSION_SYNTAX', '('],
    ['1 2', 'EXPRESSION_SYNTAX', '2'],
    ['1,2', 'EXPRESSION_SYNTAX', ','],
    ['a < b < c', 'EXPRESSION_SYNTAX', '<'],
    ['a = b', 'EXPRESSION_SYNTAX', '='],
    ['3 × 4', 'EXPRESSION_SYNTAX', '×'],
    ['3 mm²', 'EXPRESSION_SYNTAX', '²'],
    ['3 mm^x', 'EXPRESSION_SYNTAX', 'mm^x'],
    ['3 mm^0', 'EXPRESSION_SYNTAX', 'mm^0'],
    ['3 mm^1.5', 'EXPRESSION_SYNTAX', 'mm^1.5'],
    ['3 mm^', 'EXPRESSION_SYNTAX', 'mm^'],
    ['3 m^60*m^60', 'EXPRESSION_SYNTAX', 'm^60*m^60'],
    ['sqrt', 'EXPRESSION_SYNTAX', 'sqrt'],
    ['sqrt()', 'EXPRESSION_SYNTAX', 'sqrt()'],
    ['sqrt(1, 2)', 'EXPRESSION_SYNTAX', 'sqrt(1, 2)'],
    ['min(1)', 'EXPRESSION_SYNTAX', 'min(1)'],
    ['if(1 < 2, 3)', 'EXPRESSION_SYNTAX', 'if(1 < 2, 3)'],
    ['pi(2)', 'EXPRESSION_SYNTAX', 'pi'],
    ['centre.', 'EXPRESSION_SYNTAX', '.'],
    ['"1"', 'EXPRESSION_SYNTAX', '"'],
    ['mm', 'EXPRESSION_UNIT_WITHOUT_NUMBER', 'mm'],
    ['2 * mm', 'EXPRESSION_UNIT_WITHOUT_NUMBER', 'mm'],
    ['boom / mm', 'EXPRESSION_UNIT_WITHOUT_NUMBER', 'mm'],
    ['(2) mm', 'EXPRESSION_SYNTAX', 'mm'],
    ['3 mn', 'EXPRESSION_UNKNOWN_UNIT', 'mn'],
    ['2 boom', 'EXPRESSION_UNKNOWN_UNIT', 'boom'],
    ['sqrtt(2)', 'EXPRESSION_UNKNOWN_NAME', 'sqrtt'],
    ['2 * bom', 'EXPRESSION_UNKNOWN_NAME', 'bom'],
    ['toString', 'EXPRESSION_UNKNOWN_NAME', 'toString'],
  ])('%s is %s at "%s"', (text, code, part) => {
    expect(faultAt(text)).toEqual([code, part]);
  });

  it('come for texts too long or nested too deep, and not before', () => {
    expect(evaluateText(`${'1 + '.repeat(499)}1`)).toBe(500);
    expect(faultAt(`${'1 + '.repeat(500)}1`)[0]).toBe('EXPRESSION_TOO_LONG');
    expect(evaluateText(`${'('.repeat(100)}1${')'.repeat(100)}`)).toBe(1);
    expect(evaluateText(`${'(1) + -1 + '.repeat(150)}abs(1)`)).toBe(1);
    for (const deep of [
      `${'('.repeat(101)}1${')'.repeat(101)}`,
      `${'-'.repeat(101)}1`,
      `1${'^1'.repeat(101)}`,
      `${'abs('.repeat(101)}1${')'.repeat(101)}`,
    ])
      expect(faultAt(deep)[0]).toBe('EXPRESSION_SYNTAX');
  });
});

describe('namesIn', () => {
  it('lists every use with its place, in the order of the text', () => {
    expect(namesIn(parseExpression('boom - max(wall, centre.x) * 2 mm + pi * boom'))).toEqual([
      { name: 'boom', start: 0, end: 4 },
      { name: 'wall', start: 11, end: 15 },
      { name: 'centre.x', start: 17, end: 25 },
      { name: 'boom', start: 41, end: 45 },
    ]);
  });

  it('places a name without its parentheses or plus', () => {
    const places = namesIn(parseExpression('(boom) + +wall')).map(({ start, end }) => [start, end]);
    expect(places).toEqual([
      [1, 5],
      [10, 14],
    ]);
  });

  it('takes an accented letter for the same however it was typed', () => {
    expect(namesIn(parseExpression('la\u0308nge_1'))[0]?.name).toBe('l\u00e4nge_1');
  });
});
