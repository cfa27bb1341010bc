export type ZonedStyle = 'date' | 'time' | 'date-time' | 'day';

const STYLES: Record<ZonedStyle, Intl.DateTimeFormatOptions> = {
  date: { dateStyle: 'medium' },
  time: { timeStyle: 'short' },
  'date-time': { dateStyle: 'medium', timeStyle: 'short' },
  day: { weekday: 'short', month: 'short', day: 'numeric' },
};

/**
 * An instant as a clock in `zone` shows it, with the zone's short name when a clock at the
 * viewer's shows another time at that instant. Dates alone carry no zone name.
 *
 * @param instant epoch milliseconds or an ISO string with offset; anything else gives "–"
 * @param zone IANA name of the place that the time is about
 * @example
 * zonedText('2026-07-01T17:00:00Z', 'America/Phoenix', 'America/Chicago', 'en', 'time')
 * // '10:00 AM MST'
 */
export function zonedText(
  instant: string | number | null | undefined,
  zone: string,
  viewerZone: string,
  locale: string,
  style: ZonedStyle,
): string {
  const date = new Date(instant ?? NaN);
  if (Number.isNaN(date.getTime())) return '–';
  const text = new Intl.DateTimeFormat(locale, { ...STYLES[style], timeZone: zone }).format(date);
  const timed = style === 'time' || style === 'date-time';
  if (!timed || wallClock(date, zone) === wallClock(date, viewerZone)) return text;
  return `${text} ${zoneName(date, zone, locale)}`;
}

/** The zone's short name at that instant, such as CDT. */
export function zoneName(date: Date, zone: string, locale: string): string {
  const parts = new Intl.DateTimeFormat(locale, {
    timeZone: zone,
    timeZoneName: 'short',
  }).formatToParts(date);
  return parts.find((part) => part.type === 'timeZoneName')?.value ?? zone;
}

function wallClock(date: Date, zone: string): string {
  return new Intl.DateTimeFormat('en', {
    timeZone: zone,
    dateStyle: 'short',
    timeStyle: 'short',
  }).format(date);
}
