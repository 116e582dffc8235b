/** Steps that read well on an axis. */
const STEPS = [1, 2, 2.5, 5, 10];

/**
 * Round values that cover a span, about `count` of them.
 *
 * @returns the ticks inside [low, high], ascending, and how many decimals they need; low < high
 */
export function niceTicks(low: number, high: number, count: number): { values: number[]; decimals: number } {
  const rough = (high - low) / Math.max(1, count);
  const power = Math.floor(Math.log10(rough));
  const ten = Number(`1e${power}`);
  const step = STEPS.find((s) => s * ten >= rough * 0.8)! * ten;
  const decimals = Math.max(0, -power + (step / ten === 2.5 ? 1 : 0));
  const first = Math.ceil(low / step - 1e-9);
  const last = Math.floor(high / step + 1e-9);
  const values = Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => (first + i) * step);
  return { values, decimals };
}

/** Stops farther off than this many times the spread of the values would flatten the line. */
const FAR = 4;

/**
 * The span of the upright axis: all values, and every stop that is near enough to leave the line readable.
 *
 * @param stops in the unit of the values
 */
export function trendSpan(
  values: readonly number[],
  stops: readonly number[],
): { low: number; high: number; offAbove: number[]; offBelow: number[] } {
  const least = Math.min(...values);
  const most = Math.max(...values);
  const spread = most - least || Math.abs(most) * 0.02 || 1;
  const near = stops.filter((s) => s <= most + FAR * spread && s >= least - FAR * spread);
  const low = Math.min(least, ...near);
  const high = Math.max(most, ...near);
  const pad = (high - low || spread) * 0.08;
  return {
    low: low - pad,
    high: high + pad,
    offAbove: stops.filter((s) => s > most + FAR * spread),
    offBelow: stops.filter((s) => s < least - FAR * spread),
  };
}

const HOUR = 3_600_000;
const DAY = 24 * HOUR;

/** Beginnings of days, months or years, local time, about `count`, each with its label; the first stands at `from`. */
export function timeTicks(from: number, to: number, count: number): { at: number; label: string }[] {
  const span = Math.max(1, to - from);
  const say = (options: Intl.DateTimeFormatOptions) => (d: Date) =>
    new Intl.DateTimeFormat('en-GB', options).format(d);
  const clock = say({ hour: '2-digit', minute: '2-digit' });
  const day = say({ day: 'numeric', month: 'short' });
  const month = (d: Date) => (d.getMonth() === 0 ? String(d.getFullYear()) : say({ month: 'short' })(d));
  if (span < 2 * DAY)
    return everyHours(from, to, Math.max(1, Math.ceil(span / HOUR / count)), (d) =>
      d.getHours() === 0 ? day(d) : clock(d),
    );
  if (span < 62 * DAY) return everyDays(from, to, Math.max(1, Math.ceil(span / DAY / count)), day);
  const months = Math.ceil(span / (30.4 * DAY) / count);
  const step = [1, 2, 3, 6, 12].find((s) => s >= months) ?? 12 * Math.ceil(months / 12);
  return everyMonths(from, to, step, step >= 12 ? say({ year: 'numeric' }) : month);
}

function everyHours(from: number, to: number, step: number, label: (d: Date) => string) {
  const d = new Date(from);
  d.setMinutes(0, 0, 0);
  return walk(d, from, to, (x) => x.setHours(x.getHours() + step), label);
}

function everyDays(from: number, to: number, step: number, label: (d: Date) => string) {
  const d = new Date(from);
  d.setHours(0, 0, 0, 0);
  return walk(d, from, to, (x) => x.setDate(x.getDate() + step), label);
}

function everyMonths(from: number, to: number, step: number, label: (d: Date) => string) {
  const d = new Date(from);
  const first = new Date(d.getFullYear(), Math.floor(d.getMonth() / step) * step, 1);
  return walk(first, from, to, (x) => x.setMonth(x.getMonth() + step), label);
}

function walk(first: Date, from: number, to: number, next: (d: Date) => void, label: (d: Date) => string) {
  const ticks: { at: number; label: string }[] = [];
  for (const d = first; d.getTime() <= to; next(d)) {
    // The one that began before the picture stands at its edge, unless the next begins there as well.
    if (d.getTime() <= from) ticks.length = 0;
    ticks.push({ at: Math.max(from, d.getTime()), label: label(d) });
  }
  return ticks;
}
