import { describe, expect, it } from 'vitest';
import { beamOf } from '../../../core/figures/index.ts';

describe('beamOf', () => {
  it('stands on the middle of a two-sided span', () => {
    expect(beamOf({ value: -69.3, min: -75, max: -60 })).toMatchObject({
      low: -75,
      high: -60,
      fulcrum: -67.5,
      tips: null,
    });
  });

  it('draws a one-sided arm back by twice the distance or a quarter of the limit, whichever is more', () => {
    expect(beamOf({ value: 237.11, min: null, max: 250 }).low).toBe(250 - 62.5);
    expect(beamOf({ value: 100, min: null, max: 250 }).low).toBe(-50);
    expect(beamOf({ value: 20, min: 10, max: null })).toMatchObject({
      low: 10,
      high: 30,
      lowStop: true,
      highStop: false,
    });
  });

  it('stands on the baseline of a one-sided limit where that is on the arm', () => {
    expect(beamOf({ value: 237, min: null, max: 250, baseline: 240 }).fulcrum).toBe(240);
    expect(beamOf({ value: 237, min: null, max: 250, baseline: 400 }).fulcrum).toBe(250 - 62.5 / 2);
  });

  it('tips to the side on which the value is off the span', () => {
    expect(beamOf({ value: 1.0147, min: 1.02, max: 1.06 }).tips).toBe('low');
    expect(beamOf({ value: 251, min: null, max: 250 }).tips).toBe('high');
    expect(beamOf({ value: 250, min: null, max: 250 }).tips).toBeNull();
  });

  it('has an arm of some length where limit and value are zero', () => {
    const beam = beamOf({ value: 0, min: null, max: 0 });
    expect(beam.high - beam.low).toBeGreaterThan(0);
  });
});
