import type { Beam } from '#core/figures/index.ts';

/** Places of a beam's picture in pixels; angles in degrees, y down. */
export interface BeamLayout {
  readonly width: number;
  readonly height: number;
  /** Height of the arm before it tips. */
  readonly y: number;
  /** The span between the stops, or from the one stop to where the arm is drawn back to. */
  readonly low: number;
  readonly high: number;
  readonly fulcrum: number;
  /** Null where there is no value. */
  readonly poise: number | null;
  /** Where the arm is broken because the poise is too far off to be drawn to scale. */
  readonly breaks: number | null;
  readonly tip: number;
  /** Where the labels of the stops stand: they follow the tipped arm, but stay upright. */
  readonly lowLabel: { readonly x: number; readonly y: number };
  readonly highLabel: { readonly x: number; readonly y: number };
}

const EDGE = 12;
const Y = 34;
/** Mean width of a figure in the beam's type. */
const FIGURE = 8.1;
const TIP_DEGREES = 2.4;
/** The arm's end rises by no more than this, so that it stays clear of the row above. */
const RISE = 10;

/**
 * Lays a beam out in `width` pixels. A poise off the span is drawn to scale as far as half the span away; beyond, the
 * arm is broken and the poise hangs at its end.
 *
 * @param labels the printed stops, whose room is kept beside the span
 */
export function layOutBeam(
  beam: Beam,
  labels: { low: string | null; high: string | null },
  width: number,
): BeamLayout {
  const span = beam.high - beam.low;
  const off =
    beam.poise === null ? 0 : Math.max(0, beam.low - beam.poise, beam.poise - beam.high) / (span || 1);
  const far = off > 0.5;
  const room = (label: string | null, tips: boolean) =>
    Math.max(width * 0.1, label === null ? 0 : label.length * FIGURE + 10) + (tips ? width * 0.04 : 0);
  const left = EDGE + room(labels.low, beam.tips === 'low');
  const right = width - EDGE - room(labels.high, beam.tips === 'high');
  // Off the span the poise takes its share of the line, the span what is left.
  const share = far ? 0.16 : off / (1 + off);
  const line = Math.max(20, right - left);
  const low = beam.tips === 'low' ? left + share * line : left;
  const high = beam.tips === 'high' ? left + line - share * line : left + line;
  const at = (value: number) => low + ((value - beam.low) / (span || 1)) * (high - low);
  const fulcrum = at(beam.fulcrum);
  const poise =
    beam.poise === null
      ? null
      : !far
        ? at(beam.poise)
        : beam.tips === 'low'
          ? low - share * line
          : high + share * line;
  const arm = Math.max(fulcrum - EDGE, width - EDGE - fulcrum);
  const angle = Math.min(TIP_DEGREES, (Math.asin(Math.min(1, RISE / arm)) * 180) / Math.PI);
  const tip = beam.tips === 'high' ? angle : beam.tips === 'low' ? -angle : 0;
  const drop = (x: number) => (x - fulcrum) * Math.sin((tip * Math.PI) / 180);
  const breaks = poise !== null && far ? (poise + (beam.tips === 'low' ? low : high)) / 2 : null;
  return {
    width,
    height: 68,
    y: Y,
    low,
    high,
    fulcrum,
    poise,
    breaks,
    tip,
    lowLabel: { x: low - 5, y: Y - 13 + drop(low) },
    highLabel: { x: high + 5, y: Y - 13 + drop(high) },
  };
}
