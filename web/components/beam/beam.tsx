import { useRef } from 'react';
import { beamOf, type PrintedLimit } from '#core/figures/index.ts';
import type { LimitResult } from '#core/record/record.ts';
import { useWidth } from '#web/components/use-width.ts';
import { type LabelRoom, layOutBeam } from './beam-layout.ts';

const EDGE = 12;

/**
 * The picture of one limit: the allowed span between its stops, the fulcrum, the poise at the value. Off the span it
 * tips to the side that is too heavy.
 *
 * @param baseline the released value [SI], where a one-sided beam has its fulcrum
 * @param room letters of the longest labels in the list
 */
export function BeamPicture({
  limit,
  printed,
  baseline,
  room,
}: {
  limit: Pick<LimitResult, 'value' | 'min' | 'max' | 'name'>;
  printed: PrintedLimit;
  baseline: number | null;
  room: LabelRoom;
}) {
  const frame = useRef<HTMLDivElement>(null);
  const width = useWidth(frame, 520);
  const beam = beamOf({ ...limit, baseline });
  const at = layOutBeam(beam, room, Math.max(220, width));
  const outside = beam.tips !== null;
  const tone = outside ? 'stroke-outside' : 'stroke-ink';
  return (
    <div ref={frame} className="w-full min-w-0">
      <svg
        viewBox={`0 0 ${at.width} ${at.height}`}
        width="100%"
        role="img"
        aria-label={inWords(limit, printed)}
      >
        <path
          d={`M${at.fulcrum} ${at.y + 3}l-9 16h18z`}
          className="fill-paper stroke-ink"
          strokeWidth="1.3"
        />
        <g transform={`rotate(${at.tip} ${at.fulcrum} ${at.y})`} fill="none">
          <path d={`M${EDGE} ${at.y}H${at.width - EDGE}`} className="stroke-rule" strokeWidth="2" />
          {!beam.lowStop && beam.highStop && (
            <path d={`M${at.low} ${at.y - 3}v6`} className="stroke-rule" strokeWidth="2" />
          )}
          <path d={`M${at.low} ${at.y}H${at.high}`} className={tone} strokeWidth="3" />
          {beam.lowStop && <Stop x={at.low} y={at.y} />}
          {beam.highStop && <Stop x={at.high} y={at.y} />}
          {at.breaks !== null && <Break x={at.breaks} y={at.y} />}
          {at.poise !== null && <Poise x={at.poise} y={at.y} outside={outside} />}
        </g>
        {printed.min !== null && (
          <text {...at.lowLabel} textAnchor="end" className={LABEL}>
            {printed.min}
          </text>
        )}
        {printed.max !== null && (
          <text {...at.highLabel} className={LABEL}>
            {printed.max}
          </text>
        )}
      </svg>
    </div>
  );
}

const LABEL = 'fill-ink-soft font-figures text-[13px]';

const Stop = ({ x, y }: { x: number; y: number }) => (
  <path d={`M${x} ${y - 9}V${y + 9}`} className="stroke-ink" strokeWidth="1.6" />
);

/** Two slanted strokes across the arm: not to scale from here on. */
const Break = ({ x, y }: { x: number; y: number }) => (
  <>
    <path d={`M${x - 5} ${y}h10`} className="stroke-paper" strokeWidth="4" />
    <path d={`M${x - 8} ${y + 6}l6-12M${x + 2} ${y + 6}l6-12`} className="stroke-ink" strokeWidth="1.3" />
  </>
);

const Poise = ({ x, y, outside }: { x: number; y: number; outside: boolean }) => (
  <g className={outside ? 'fill-outside stroke-outside' : 'fill-brass-fill stroke-ink'}>
    <path d={`M${x} ${y}v8`} strokeWidth="1.6" />
    <path d={`M${x - 5} ${y + 8}h10l4 14h-18z`} strokeWidth="1.2" />
  </g>
);

/** What the picture says. */
function inWords({ name }: { name: string }, { value, min, max, unit }: PrintedLimit): string {
  const of = unit === '' ? '' : ` ${unit}`;
  const span =
    min !== null && max !== null
      ? `allowed from ${min} to ${max}${of}`
      : min !== null
        ? `allowed from ${min}${of}`
        : `allowed up to ${max}${of}`;
  return `${name}: ${value}${of}, ${span}`;
}
