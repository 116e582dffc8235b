import { formatDay, formatTime, zoneOf } from '#web/lib/format-time.ts';

/** A time in the reader's zone, with the zone in its title and the exact time in the markup. */
export function Time({ at, dayOnly = false }: { at: string; dayOnly?: boolean }) {
  return (
    <time dateTime={at} title={`${formatTime(at)} ${zoneOf(at)}`} className="whitespace-nowrap">
      {dayOnly ? formatDay(at) : formatTime(at)}
    </time>
  );
}
