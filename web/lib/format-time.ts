const DAY = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' });
const TIME = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });
const ZONE = new Intl.DateTimeFormat('en-GB', { timeZoneName: 'short' });

/** An ISO time as a day, such as 14 Nov 2026, in the reader's zone. */
export function formatDay(iso: string): string {
  return DAY.format(new Date(iso));
}

/** An ISO time as day and time, such as 14 Nov 2026, 09:12, in the reader's zone. */
export function formatTime(iso: string): string {
  const at = new Date(iso);
  return `${DAY.format(at)}, ${TIME.format(at)}`;
}

/** The name of the reader's zone at that time, such as UTC or CET. */
export function zoneOf(iso: string): string {
  return ZONE.formatToParts(new Date(iso)).find((part) => part.type === 'timeZoneName')?.value ?? '';
}
