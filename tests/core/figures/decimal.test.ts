import { describe, expect, it } from 'vitest';
import {
  decimalsFor,
  formatFixed,
  formatPercent,
  formatShort,
  formatSignificant,
} from '../../../core/figures/index.ts';

describe('figures', () => {
  it('give a column the decimals that its largest figure needs', () => {
    expect(decimalsFor([230.42, 0.001])).toBe(2);
    expect(decimalsFor([-61.641, 0.1])).toBe(3);
    expect(decimalsFor([2_500_000])).toBe(0);
    expect(decimalsFor([0, Number.NaN])).toBe(4);
  });

  it('carry a true minus, and none on a printed zero', () => {
    expect(formatFixed(-61.641, 2)).toBe('−61.64');
    expect(formatFixed(-0.001, 2)).toBe('0.00');
    expect(formatFixed(null, 2)).toBe('—');
  });

  it('take an exponent where plain digits would be long', () => {
    expect(formatSignificant(1.25e-12)).toBe('1.2500e−12');
    expect(formatFixed(1.5e300, 4)).toBe('1.5000e+300');
    expect(formatShort(0.1 + 0.2)).toBe('0.3');
  });

  it('say of a small share that it is there', () => {
    expect([0.052, 0, 0.0001, -0.25].map((x) => formatPercent(x))).toEqual([
      '5.2',
      '0.0',
      'under 0.1',
      '−25.0',
    ]);
  });
});
