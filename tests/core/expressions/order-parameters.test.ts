import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  namesIn,
  orderParameters,
  ParameterCircle,
  parseExpression,
} from '../../../core/expressions/index.ts';

const list = (texts: Record<string, string | null>) =>
  Object.entries(texts).map(([name, text]) => ({ name, ast: text === null ? null : parseExpression(text) }));

function circleOf(texts: Record<string, string | null>): ParameterCircle {
  try {
    orderParameters(list(texts));
  } catch (error) {
    if (error instanceof ParameterCircle) return error;
    throw error;
  }
  throw new Error('no circle');
}

describe('orderParameters', () => {
  it('puts every parameter after those it uses, and keeps the listed order otherwise', () => {
    expect(orderParameters(list({ hole: 'boom / 70', wall: null, boom: 'span * 2', span: '3 mm' }))).toEqual([
      'span',
      'boom',
      'hole',
      'wall',
    ]);
  });

  it('passes over names that are not in the list', () => {
    expect(orderParameters(list({ a: 'b + elsewhere', b: '1' }))).toEqual(['b', 'a']);
  });

  it('names the way round a circle and points at its first step', () => {
    const circle = circleOf({ z: 'a + 1', a: '2 * (d + b)', b: 'c', c: '1 + a', d: '1' });
    expect(circle.code).toBe('PARAMETER_CIRCLE');
    expect(circle.message).toBe('parameters use one another in a circle: a → b → c → a');
    expect(circle.path).toEqual(['a', 'b', 'c', 'a']);
    expect(circle).toMatchObject({ parameter: 'a', start: 9, end: 10 });
  });

  it('knows a parameter that uses itself', () => {
    expect(circleOf({ a: '1 + a' })).toMatchObject({
      message: 'the parameter a uses itself',
      path: ['a', 'a'],
      start: 4,
      end: 5,
    });
  });

  it('stands a chain of twenty thousand', () => {
    const chain = Array.from({ length: 20_000 }, (_, i) => ({
      name: `p${i}`,
      ast: parseExpression(`p${i + 1}`),
    }));
    expect(orderParameters(chain)[0]).toBe('p19999');
  });

  it('orders any set without a circle', () => {
    const sets = fc.array(fc.array(fc.nat({ max: 20 }), { maxLength: 4 }), { maxLength: 20 });
    fc.assert(
      fc.property(sets, (uses) => {
        // parameter i may use those with a larger number: never a circle
        const parameters = uses.map((targets, i) => {
          const names = targets.filter((k) => k > i && k < uses.length).map((k) => `p${k}`);
          return { name: `p${i}`, ast: parseExpression(['1', ...names].join(' + ')) };
        });
        const order = orderParameters(parameters);
        expect([...order].sort()).toEqual(parameters.map((p) => p.name).sort());
        for (const { name, ast } of parameters)
          for (const use of namesIn(ast)) expect(order.indexOf(use.name)).toBeLessThan(order.indexOf(name));
      }),
    );
  });
});
