import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compileExpression } from '../../../core/expressions/index.ts';
import {
  DENSITY,
  getUnit,
  INERTIA,
  LENGTH,
  literalValue,
  parseUnit,
  unitFor,
} from '../../../core/units/index.ts';
import { evaluateText, FILE, faultOf, LOOKUP, MM, VALUES } from './small-machine.ts';

describe('a field', () => {
  it.each([
    ['12', MM, 0.012],
    ['-1.2', MM, -0.0012],
    ['- 1.2', MM, -0.0012],
    ['+1.2', MM, 0.0012],
    ['(1.2)', MM, 0.0012],
    ['2 * 6', MM, 0.012],
    ['n', MM, 0.003],
    ['n * 2', MM, 0.006],
    ['boom', MM, 0.42],
    ['1 in', MM, 0.0254],
    ['1 cm', MM, 0.01],
    ['0', MM, 0],
    ['90', getUnit('deg'), Math.PI / 2],
    ['-90', getUnit('deg'), -Math.PI / 2],
    ['60 * 3', getUnit('deg'), Math.PI],
    ['0.1', getUnit('in'), 0.00254],
    ['1.1', unitFor(DENSITY, FILE), 1100000],
    ['5200', unitFor(INERTIA, FILE), 5.2e-6],
    ['8', parseUnit('mm/mm'), 8],
  ])('reads %s as a bare number in its unit', (text, field, value) => {
    expect(evaluateText(text, field)).toBe(value);
  });

  it('gives every bare decimal the double nearest to its SI value', () => {
    fc.assert(
      fc.property(fc.integer(), fc.integer({ min: 0, max: 12 }), (digits, places) => {
        const size = String(Math.abs(digits)).padStart(places + 1, '0');
        const cut = size.length - places;
        const text = `${digits < 0 ? '-' : ''}${size.slice(0, cut)}${places > 0 ? `.${size.slice(cut)}` : ''}`;
        const nearest = Number(`${digits}e${-3 - places}`) + 0;
        for (const written of [text, `${text} mm`, ` ${text}`, `(${text})`])
          expect(evaluateText(written, MM)).toBe(nearest);
      }),
    );
  });

  it('reads a compound unit the same the first time and the next', () => {
    const field = unitFor(INERTIA, FILE);
    for (const text of ['7 lb * in^2', '9 lb * in^2', '-7 lb * in^2']) {
      const expected = literalValue(text.replace('-', '').split(' ')[0]!, parseUnit('lb*in^2'));
      expect(evaluateText(text, field)).toBe(text.startsWith('-') ? -expected : expected);
    }
    expect(evaluateText('6 /mm')).toBe(6000);
    expect(evaluateText('7 /mm')).toBe(7000);
    expect(evaluateText('6 mm * 2 + boom')).toBeCloseTo(0.432, 15);
    expect(evaluateText('8 mm * 2 + boom')).toBeCloseTo(0.436, 15);
    expect(faultOf('9 lb * in^2', MM).message).toBe(
      'expected a length, and 9 lb*in^2 is a moment of inertia',
    );
  });

  it('names both kinds when it is given another', () => {
    const fault = faultOf('boom * wall', MM);
    expect(fault.message).toBe('expected a length, and boom * wall is an area');
    expect(fault.hint).toBeUndefined();
  });

  it('of no kind leaves a bare number plain', () => {
    expect(compileExpression('1.2', null, LOOKUP, FILE)).toMatchObject({ constant: 1.2 });
  });
});

describe('a compiled expression', () => {
  const compile = (text: string) => compileExpression(text, null, LOOKUP, FILE);

  it('is constant when it reads no parameter, and then knows its value', () => {
    expect(compile('2 mm + 3 mm')).toMatchObject({ constant: 0.005, reads: [], dimension: LENGTH });
    expect(compile('if(1 > 2, boom, 3 mm)')).toMatchObject({ constant: 0.003, reads: [] });
    expect(compile('boom').constant).toBeUndefined();
  });

  it('lists the slots it may read, each once', () => {
    expect(compile('n * boom + wall - boom').reads).toEqual([0, 1, 4]);
    expect(compile('if(n > 2, boom, wall)').reads).toEqual([0, 1, 4]);
  });

  it('reads its parameters from a base on', () => {
    const expression = compile('boom - wall');
    expect(expression.evaluate([9, 9, 9, ...VALUES], 3)).toBe(expression.evaluate(VALUES));
    expect(expression.evaluate(Float64Array.from([5, 3]))).toBe(2);
  });

  it('knows a percentage from other numbers', () => {
    expect(['2 %', '-2 %', '(n) %'].map((text) => compile(text).isPercentage)).toEqual([true, true, true]);
    expect(['0.02', '2 % + 1', '2 % * boom'].map((text) => compile(text).isPercentage)).toEqual([
      false,
      false,
      false,
    ]);
    expect(compile('0.7 %').constant).toBe(0.007);
  });

  it('never gives minus zero', () => {
    for (const text of [
      '-0',
      '-nothing',
      'round(-0.2)',
      'ceil(-0.2)',
      '-(1 - 1)',
      '- 0',
      'ceil(nothing - 0.2)',
      'round(nothing - 0.2)',
    ])
      expect(Object.is(compile(text).evaluate(VALUES), 0)).toBe(true);
  });

  it('gives the same bits with its constants folded or read as parameters', () => {
    const number = fc.integer({ min: -9999, max: 9999 }).map((k) => k / 64);
    const forms = [
      (a: string, b: string) => `${a} ^ 2 - ${b} ^ 3`,
      (a: string, b: string) => `hypot(${a}, ${b}) + abs(${a} * ${b})`,
      (a: string, b: string) => `sin(${a} * 1 deg) * cos(${b} * 1 deg)`,
      (a: string, b: string) => `if(${a} < ${b}, max(${a}, ${b}), min(${a}, 2) / 7)`,
    ];
    fc.assert(
      fc.property(number, number, fc.constantFrom(...forms), (a, b, form) => {
        const folded = compile(form(`(${a})`, `(${b})`));
        const read = compile(form('n', 'nothing'));
        expect(folded.constant).toBe(read.evaluate([0, 0, 0, 0, a, b]));
      }),
    );
  });
});
