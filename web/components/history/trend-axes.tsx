import type { TrendLayout } from './trend-layout.ts';

/** Graduations of value and time. */
export const Axes = ({ at }: { at: TrendLayout }) => (
  // biome-ignore lint/a11y/noAriaHiddenOnFocusable: nothing in it takes the focus
  <g aria-hidden="true">
    {at.ticks.map(({ y, text }) => (
      <g key={text}>
        <path d={`M${at.left} ${y}H${at.right}`} className="stroke-rule" />
        <text x={at.left - 9} y={y + 4} textAnchor="end" className="fig soft">
          {text}
        </text>
      </g>
    ))}
    <path d={`M${at.left} ${at.bottom}H${at.right}`} className="stroke-edge" />
    {at.times.map(({ x, text }) => (
      <g key={`${x}`}>
        <path d={`M${x} ${at.bottom}v5`} className="stroke-edge" />
        <text x={x} y={at.bottom + 20} className="soft">
          {text}
        </text>
      </g>
    ))}
  </g>
);

/** The limits as strong lines, each with its name and its figure. */
export const Stops = ({ at }: { at: TrendLayout }) => (
  <g>
    {at.stops.map(({ y, text, name, textY }) => (
      <g key={`${name} ${text}`}>
        <path d={`M${at.left} ${y}H${at.right}`} className="stroke-ink" strokeWidth="1.5" />
        <text x={at.right + 8} y={textY + 4} className="fig">
          {text}
        </text>
        <text x={at.left + 8} y={y - 5} className="soft">
          {name}
        </text>
      </g>
    ))}
  </g>
);
