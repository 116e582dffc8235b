import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { printLimit, readFigure } from '../../../core/figures/index.ts';
import { buildLimit } from '../../helpers/build-record.ts';

const grams = { text: 'g', factor: 0.001 };
const plain = { text: '', factor: 1 };

describe('printLimit', () => {
  it('prints value, stop and margin so that they add up', () => {
    const printed = printLimit(buildLimit({ value: 0.2371096, max: 0.25 }), grams);
    expect(printed).toMatchObject({
      value: '237.11',
      max: '250',
      margin: '12.89',
      words: 'margin 12.89 g (5.2 % of the limit)',
    });
  });

  it('says short of a lower stop and over an upper one', () => {
    expect(printLimit(buildLimit({ value: 1.0147, min: 1.02, max: 1.06 }), plain).words).toBe(
      'short by 0.0053 (0.5 % of the limit)',
    );
    expect(printLimit(buildLimit({ value: 0.2531, max: 0.25 }), grams).words).toBe(
      'over by 3.10 g (1.2 % of the limit)',
    );
  });

  it('adds digits until a value just outside shows outside', () => {
    expect(printLimit(buildLimit({ value: 0.2500000004, max: 0.25 }), grams).value).toBe('250.0000004');
    expect(printLimit(buildLimit({ value: 0.2499999, max: 0.25 }), grams).value).toBe('249.9999');
  });

  it('marks a value that no digit tells from its stop', () => {
    const just = 0.3 + 2 ** -54;
    const printed = printLimit(buildLimit({ value: just, max: 0.3 }), { text: 'x', factor: 3 });
    expect(printed.value === '>0.1' || readFigure(printed.value) > 0.1).toBe(true);
  });

  it('says that there is no value instead of a zero', () => {
    expect(printLimit(buildLimit({ value: null, max: 0.25 }), grams)).toMatchObject({
      value: '—',
      words: 'no value',
    });
  });

  it('never reads on the wrong side of a stop, at any size and unit', () => {
    const size = fc.oneof(
      fc.double({ min: -1e-9, max: 1e-9, noNaN: true }),
      fc.double({ min: -10, max: 10, noNaN: true }),
      fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e12, max: 1e12 }),
    );
    const near = fc
      .tuple(size, fc.integer({ min: -16, max: 0 }), fc.integer({ min: -3, max: 3 }))
      .map(([stop, e, k]) => ({ stop, value: stop + k * Math.abs(stop) * 10 ** e }));
    fc.assert(
      fc.property(
        near,
        fc.boolean(),
        fc.constantFrom(1, 0.001, 1e-9, 0.45359237, Math.PI / 180),
        ({ stop, value }, upper, factor) => {
          const printed = printLimit(buildLimit(upper ? { value, max: stop } : { value, min: stop }), {
            text: 'u',
            factor,
          });
          const text = (upper ? printed.max : printed.min)!;
          const outside = upper ? value > stop : value < stop;
          if (/^[<>]/.test(printed.value)) expect(outside).toBe(true);
          else if (outside)
            expect(
              upper
                ? readFigure(printed.value) > readFigure(text)
                : readFigure(printed.value) < readFigure(text),
            ).toBe(true);
          else
            expect(
              upper
                ? readFigure(printed.value) <= readFigure(text)
                : readFigure(printed.value) >= readFigure(text),
            ).toBe(true);
        },
      ),
      { numRuns: 3000 },
    );
  });
});
