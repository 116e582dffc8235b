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
/** Half of a poise at its foot. */
const POISE = 9;

/** Letters of the longest label at either end, so that the stops of a list stand under one another. */
export interface LabelRoom {
  readonly low: number;
  readonly high: number;
}

/**
 * Lays a beam out in `width` pixels. The stops are at the same places whatever the value is; a poise off the span is
 * drawn to scale as far as there is room, and beyond that the arm is broken and the poise hangs at its end.
 */
export function layOutBeam(beam: Beam, labels: LabelRoom, width: number): BeamLayout {
  const span = beam.high - beam.low || 1;
  const room = (letters: number) => EDGE + Math.max(width * 0.12, letters * FIGURE + 8);
  const low = room(labels.low);
  const high = Math.max(low + 20, width - room(labels.high));
  const at = (value: number) => low + ((value - beam.low) / span) * (high - low);
  const [least, most] = [EDGE + POISE, width - EDGE - POISE];
  const exact = beam.poise === null ? null : at(beam.poise);
  const poise = exact === null ? null : Math.min(most, Math.max(least, exact));
  const far = exact !== poise;
  const fulcrum = at(beam.fulcrum);
  const arm = Math.max(fulcrum - EDGE, width - EDGE - fulcrum);
  const angle = Math.min(TIP_DEGREES, (Math.asin(Math.min(1, RISE / arm)) * 180) / Math.PI);
  const tip = beam.tips === 'high' ? angle : beam.tips === 'low' ? -angle : 0;
  const drop = (x: number) => (x - fulcrum) * Math.sin((tip * Math.PI) / 180);
  return {
    width,
    height: 68,
    y: Y,
    low,
    high,
    fulcrum,
    poise,
    breaks: poise !== null && far ? (poise + (beam.tips === 'low' ? low : high)) / 2 : null,
    tip,
    lowLabel: { x: low - 5, y: Y - 13 + drop(low) },
    highLabel: { x: high + 5, y: Y - 13 + drop(high) },
  };
}
