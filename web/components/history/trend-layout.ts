import type { Trend } from '#core/api/runs.ts';
import {
  decimalsFor,
  formatFixed,
  formatShort,
  PLAIN_ROOM,
  type Scale,
  scaleFor,
  unitText,
} from '#core/figures/index.ts';
import { niceTicks, timeTicks, trendSpan } from './trend-scale.ts';

export interface PlacedPoint {
  readonly x: number;
  readonly y: number;
  /** The value in the unit of the head. */
  readonly text: string;
  readonly point: Trend['points'][number];
}

export interface TrendLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly bottom: number;
  /** Unit of all figures, with its power of ten. */
  readonly head: string;
  readonly points: PlacedPoint[];
  readonly ticks: { y: number; text: string }[];
  readonly times: { x: number; text: string }[];
  readonly stops: { y: number; text: string; name: string; textY: number }[];
  /** Stops too far off to be drawn, in words. */
  readonly off: string[];
}

const TOP = 18;
const FIGURE = 8;
const LINE = 15;

/** The unit in which a trend is shown, with its power of ten. */
export function scaleOf({ shown, points }: Trend): Scale {
  const unit = { text: unitText(shown.unit), factor: shown.factor };
  return scaleFor(
    unit,
    points.map((p) => p.value),
    PLAIN_ROOM,
  );
}

/** Lays out one quantity over time in `width` × `height` pixels, y down. */
export function layOutTrend(trend: Trend, width: number, height: number): TrendLayout {
  const values = trend.points.map((p) => p.value);
  const scale = scaleOf(trend);
  const inScale = (x: number) => x / scale.factor;
  const figures = values.map(inScale);
  const decimals = decimalsFor(figures, 5);
  const stops = trend.limits.flatMap(({ name, min, max }) =>
    [
      { name, side: 'least', value: min },
      { name, side: 'most', value: max },
    ].flatMap((s) => (s.value === null ? [] : [{ ...s, value: inScale(s.value) }])),
  );
  const span = trendSpan(
    figures,
    stops.map((s) => s.value),
  );
  const bottom = height - 30;
  const up = (v: number) => bottom - ((v - span.low) / (span.high - span.low)) * (bottom - TOP);
  const marks = niceTicks(span.low, span.high, Math.max(2, Math.round((bottom - TOP) / 36)));
  const ticks = marks.values.map((v) => ({ y: up(v), text: formatFixed(v, marks.decimals) }));
  const drawn = stops.filter((s) => s.value >= span.low && s.value <= span.high);
  const longest = (texts: string[]) => Math.max(2, ...texts.map((t) => t.length)) * FIGURE;
  const left = longest(ticks.map((t) => t.text)) + 14;
  const right = width - longest(drawn.map((s) => formatShort(s.value))) - 14;
  const from = Date.parse(trend.points[0]!.at);
  const to = Date.parse(trend.points.at(-1)!.at);
  const inset = 8;
  const across = (t: number) =>
    to === from ? (left + right) / 2 : left + inset + ((t - from) / (to - from)) * (right - left - 2 * inset);
  return {
    width,
    height,
    left,
    right,
    bottom,
    head: scale.head,
    points: trend.points.map((point, i) => ({
      point,
      x: across(Date.parse(point.at)),
      y: up(figures[i]!),
      text: formatFixed(figures[i]!, decimals),
    })),
    ticks,
    times: apart(
      timeTicks(from, to, Math.max(2, Math.floor((right - left) / 90))).map((t) => ({
        x: across(t.at),
        text: t.label,
      })),
    ),
    stops: spread(drawn.map((s) => ({ y: up(s.value), text: formatShort(s.value), name: s.name }))),
    off: stops
      .filter((s) => !drawn.includes(s))
      .map((s) => `${s.name}, at ${s.side} ${formatShort(s.value)}`),
  };
}

/** Labels that would touch the one before are left out; at the edge the one before gives way. */
function apart(times: { x: number; text: string }[]): { x: number; text: string }[] {
  const end = ({ x, text }: { x: number; text: string }) => x + text.length * 7 + 12;
  const kept: { x: number; text: string }[] = [];
  for (const time of times) {
    const before = kept.at(-1);
    if (before && time.x < end(before)) {
      if (kept.length > 1) continue;
      kept.pop();
    }
    kept.push(time);
  }
  return kept;
}

/** Labels of stops that lie close together move apart; their lines do not. */
function spread(stops: { y: number; text: string; name: string }[]) {
  const sorted = [...stops].sort((a, b) => a.y - b.y);
  let last = -Infinity;
  return sorted.map((stop) => {
    last = Math.max(stop.y, last + LINE);
    return { ...stop, textY: last };
  });
}

/** The place of the point nearest to x. */
export function nearestPoint(points: readonly PlacedPoint[], x: number): number {
  let best = 0;
  points.forEach((p, i) => {
    if (Math.abs(p.x - x) < Math.abs(points[best]!.x - x)) best = i;
  });
  return best;
}
