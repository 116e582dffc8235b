import type { Beam } from '../../core/figures/index.ts';
import type { Ink } from './ink.ts';
import { textWidth } from './text-width.ts';

const MARKS = {
  unicode: { arm: '─', low: '├', high: '┤', fulcrum: '△', poise: '▼' },
  ascii: { arm: '-', low: '|', high: '|', fulcrum: '^', poise: 'v' },
};

/** Least cells of an arm on which a poise still says something. */
const ARM_AT_LEAST = 9;

/** Columns that a stop's label takes beside the arm, with a poise off the span beyond it. */
export const labelWidth = (label: string | null, tips: boolean): number =>
  label === null ? 0 : textWidth(label) + (tips ? 2 : 0);

/**
 * The beam of a limit in a line of `width` columns: arm, stops with their labels outside, fulcrum, poise. A poise off
 * the span hangs beyond the label, so the two never meet.
 *
 * @param sides columns kept for the labels at both ends, so that the stops of a list stand in one column
 * @returns undefined where the labels leave no arm to speak of
 */
export function drawBeam(
  beam: Beam,
  labels: { min: string | null; max: string | null },
  sides: { low: number; high: number },
  width: number,
  ink: Ink,
): string | undefined {
  const marks = ink.unicode ? MARKS.unicode : MARKS.ascii;
  const outside = beam.tips !== null;
  const tone = outside ? ink.outside : (text: string) => text;
  const poise = (outside ? ink.outside : ink.brass)(marks.poise);
  const length = width - (beam.lowStop ? sides.low + 2 : 0) - (beam.highStop ? sides.high + 2 : 0);
  if (length < ARM_AT_LEAST) return undefined;
  const place = (value: number) => {
    const share = (value - beam.low) / (beam.high - beam.low);
    return Math.round(Math.min(1, Math.max(0, Number.isFinite(share) ? share : 0.5)) * (length - 1));
  };
  const arm: string[] = Array.from({ length }, () => tone(marks.arm));
  arm[place(beam.fulcrum)] = marks.fulcrum;
  if (beam.poise !== null && !outside) arm[place(beam.poise)] = poise;
  let line = arm.join('');
  if (beam.lowStop) {
    const label = labels.min ?? '';
    const room = sides.low - labelWidth(label, beam.tips === 'low');
    const left = beam.tips === 'low' ? `${poise} ${ink.soft(label)}` : ink.soft(label);
    line = `${' '.repeat(Math.max(0, room))}${left} ${marks.low}${line}`;
  }
  if (beam.highStop) {
    const label = labels.max ?? '';
    const right = beam.tips === 'high' ? `${ink.soft(label)} ${poise}` : ink.soft(label);
    const room = sides.high - labelWidth(label, beam.tips === 'high');
    line = `${line}${marks.high} ${right}${' '.repeat(Math.max(0, room))}`;
  }
  return line;
}
