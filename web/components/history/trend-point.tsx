import { Link } from 'react-router-dom';
import { formatTime } from '#web/lib/format-time.ts';
import { linkTo } from '#web/paths.ts';
import type { PlacedPoint } from './trend-layout.ts';

export const VERDICT_WORDS = {
  within: 'within',
  outside: 'outside a limit',
  unlimited: 'no limits',
} as const;

/** One run on the line: a link, a cross where a limit of it is broken, on the fulcrum where it was released. */
export function PointLink({
  placed,
  index,
  project,
  head,
  current,
  shown,
  dot,
  onFocus,
}: {
  placed: PlacedPoint;
  index: number;
  project: string;
  head: string;
  current: boolean;
  shown: boolean;
  dot: boolean;
  onFocus: () => void;
}) {
  const { x, y, text, point } = placed;
  const outside = point.verdict === 'outside';
  return (
    <Link
      to={linkTo.run(project, point.run)}
      data-point={index}
      tabIndex={current ? 0 : -1}
      aria-label={`${point.label}, ${formatTime(point.at)}, ${text} ${head}, ${VERDICT_WORDS[point.verdict]}${point.released ? ', released' : ''}`}
      onFocus={onFocus}
    >
      {point.released && <path d={`M${x} ${y + 7}l-7 12h14z`} className="fill-brass" />}
      {outside ? (
        <path d={`M${x - 5} ${y - 5}l10 10m0-10l-10 10`} className="stroke-outside" strokeWidth="2" />
      ) : dot || point.released || shown ? (
        <circle cx={x} cy={y} r="3.2" className="fill-paper stroke-ink" strokeWidth="1.4" />
      ) : (
        <circle cx={x} cy={y} r="1.4" className="fill-ink" />
      )}
      {shown && <circle cx={x} cy={y} r="8" className="fill-none stroke-brass" strokeWidth="2" />}
    </Link>
  );
}
