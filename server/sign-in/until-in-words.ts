import { DateTime } from 'luxon';

/**
 * An instant as a letter says it, in the reader's language and zone.
 *
 * @example untilInWords(new Date('2026-06-12T14:00:00Z'), 'en', 'America/Chicago') // Fri, Jun 12, 9:00 AM CDT
 */
export function untilInWords(instant: Date, locale: 'en' | 'es', timeZone: string): string {
  return DateTime.fromJSDate(instant, { zone: timeZone })
    .setLocale(locale === 'es' ? 'es-US' : 'en-US')
    .toLocaleString({
      weekday: 'short',
      month: 'short',
      day: 'numeric',
      hour: 'numeric',
      minute: '2-digit',
      timeZoneName: 'short',
    });
}
