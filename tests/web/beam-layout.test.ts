import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { beamOf } from '#core/figures/index.ts';
import { layOutBeam } from '#web/components/beam/beam-layout.ts';

const ROOM = { low: 4, high: 4 };
const lay = (limit: Parameters<typeof beamOf>[0], width = 520) => layOutBeam(beamOf(limit), ROOM, width);

describe('the picture of a beam', () => {
  it('hangs the poise between the stops where the value is within, and lies level', () => {
    const at = lay({ value: 5, min: 0, max: 10 });
    expect(at.poise).toBeCloseTo((at.low + at.high) / 2);
    expect(at.fulcrum).toBeCloseTo(at.poise!);
    expect(at.tip).toBe(0);
    expect(at.breaks).toBeNull();
  });
  it('tips to the side that is too heavy', () => {
    expect(lay({ value: 11, min: 0, max: 10 }).tip).toBeGreaterThan(0);
    expect(lay({ value: -1, min: 0, max: 10 }).tip).toBeLessThan(0);
  });
  it('has its stops at the same places whatever the value is', () => {
    const [a, b] = [lay({ value: 5, min: 0, max: 10 }), lay({ value: 900, min: 0, max: 10 })];
    expect([a.low, a.high]).toEqual([b.low, b.high]);
  });
  it('breaks the arm where the poise is too far off to be drawn to scale', () => {
    const at = lay({ value: 900, min: 0, max: 10 });
    expect(at.breaks).toBeGreaterThan(at.high);
    expect(at.breaks).toBeLessThan(at.poise!);
  });
  it('has no poise where there is no value', () => {
    expect(lay({ value: null, min: 0, max: 10 }).poise).toBeNull();
  });
  it('keeps everything on the picture, and the poise on its side of the stop', () => {
    const number = fc.double({ min: -1e4, max: 1e4, noNaN: true });
    fc.assert(
      fc.property(number, number, fc.double({ min: 1e-3, max: 1e4, noNaN: true }), (value, min, span) => {
        const max = min + span;
        const at = lay({ value, min, max }, 300);
        expect(at.poise).toBeGreaterThanOrEqual(0);
        expect(at.poise).toBeLessThanOrEqual(300);
        if (value > max) expect(at.poise).toBeGreaterThanOrEqual(at.high - 1e-6);
        if (value < min) expect(at.poise).toBeLessThanOrEqual(at.low + 1e-6);
        expect(at.y + Math.abs(at.width * Math.sin((at.tip * Math.PI) / 180)) + 22).toBeLessThan(
          at.height + 22,
        );
      }),
    );
  });
});
