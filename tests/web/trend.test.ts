import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Trend } from '#core/api/runs.ts';
import { layOutTrend, nearestPoint } from '#web/components/history/trend-layout.ts';
import { niceTicks, timeTicks, trendSpan } from '#web/components/history/trend-scale.ts';

describe('ticks', () => {
  it('are round and lie inside the span', () => {
    expect(niceTicks(212, 256, 4)).toEqual({ values: [220, 230, 240, 250], decimals: 0 });
    expect(niceTicks(0.012, 0.019, 3)).toMatchObject({ decimals: 3 });
    expect(niceTicks(0, 0.5, 6).values.map((v) => v.toFixed(1))).toEqual([
      '0.0',
      '0.1',
      '0.2',
      '0.3',
      '0.4',
      '0.5',
    ]);
  });
  it('of any span are few, ascending, inside, and differ as printed', () => {
    const number = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(number, fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (low, span) => {
        const { values, decimals } = niceTicks(low, low + span, 4);
        expect(values.length).toBeLessThanOrEqual(6);
        for (const v of values) expect(v).toBeGreaterThanOrEqual(low - span * 1e-6 - 1e-9);
        for (const v of values) expect(v).toBeLessThanOrEqual(low + span * (1 + 1e-6) + 1e-9);
        expect(new Set(values.map((v) => v.toFixed(decimals))).size).toBe(values.length);
      }),
    );
  });
  it('of time stand at beginnings, the first at the edge', () => {
    const ticks = timeTicks(Date.parse('2026-08-03T12:00:00'), Date.parse('2026-11-14T12:00:00'), 6);
    expect(ticks[0]!.at).toBe(Date.parse('2026-08-03T12:00:00'));
    expect(ticks.slice(1).map((t) => new Date(t.at).getDate())).toEqual([1, 1, 1]);
  });
});

describe('the span of a trend', () => {
  it('takes in a stop that is near and leaves out one that would flatten the line', () => {
    const { low, high, offAbove } = trendSpan([220, 225, 230], [250, 4000]);
    expect(high).toBeGreaterThan(250);
    expect(high).toBeLessThan(300);
    expect(low).toBeLessThan(220);
    expect(offAbove).toEqual([4000]);
  });
  it('is a span even where all values are one', () => {
    const { low, high } = trendSpan([5, 5], []);
    expect(high).toBeGreaterThan(low);
    const zero = trendSpan([0], []);
    expect(zero.high).toBeGreaterThan(zero.low);
  });
});

const trend = (values: number[], limits: Trend['limits'] = []): Trend => ({
  assembly: 'boom',
  state: 'flight',
  quantity: 'mass',
  on: 'predicted',
  unit: 'kg',
  shown: { unit: 'g', factor: 1e-3 },
  limits,
  points: values.map((value, i) => ({
    run: String(i),
    at: new Date(Date.UTC(2026, 7, 1 + i)).toISOString(),
    value,
    verdict: 'within',
    released: false,
    label: `c${i}`,
  })),
  of: values.length,
});

describe('the picture of a trend', () => {
  it('is drawn in the unit of the file, heavier higher, later to the right', () => {
    const at = layOutTrend(
      trend([0.221, 0.25, 0.23], [{ name: 'take-off', min: null, max: 0.24 }]),
      800,
      250,
    );
    expect(at.head).toBe('g');
    expect(at.points.map((p) => p.text)).toEqual(['221.00', '250.00', '230.00']);
    expect(at.points[1]!.y).toBeLessThan(at.stops[0]!.y);
    expect(at.points[2]!.y).toBeGreaterThan(at.stops[0]!.y);
    expect(at.points[0]!.x).toBeLessThan(at.points[1]!.x);
    expect(at.stops[0]!.text).toBe('240');
  });
  it('keeps labels of stops apart and says which stop is too far off', () => {
    const limits = [
      { name: 'one', min: null, max: 0.23 },
      { name: 'two', min: null, max: 0.2301 },
      { name: 'far', min: null, max: 90 },
    ];
    const at = layOutTrend(trend([0.22, 0.225], limits), 800, 250);
    const [a, b] = at.stops;
    expect(b!.textY - a!.textY).toBeGreaterThanOrEqual(15);
    expect(at.off).toEqual(['far, at most 90000']);
  });
  it('finds the point under the pointer', () => {
    const { points } = layOutTrend(trend([1, 2, 3, 4]), 800, 250);
    expect(nearestPoint(points, points[2]!.x + 3)).toBe(2);
    expect(nearestPoint(points, -50)).toBe(0);
  });
});
