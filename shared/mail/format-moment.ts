import type { Locale } from './locale';

/** American conventions of both languages, as the stores are there. */
const tags: Readonly<Record<Locale, string>> = { en: 'en-US', es: 'es-US' };

const formats = new Map<string, Intl.DateTimeFormat>();

/**
 * An instant as a person in that zone writes it, the zone named, so that nobody has to guess.
 *
 * @param instant epoch milliseconds
 * @example formatMoment(Date.UTC(2026, 5, 13, 4, 59), 'America/Chicago', 'en') // 'Fri, Jun 12, 11:59 PM CDT'
 * @throws RangeError when the machine knows no such zone
 */
export function formatMoment(instant: number, timeZone: string, locale: Locale): string {
  const key = `${locale} ${timeZone}`;
  let format = formats.get(key);
  if (!format) {
    format = new Intl.DateTimeFormat(tags[locale], {
      weekday: 'short',
      month: 'short',
      day: 'numeric',
      hour: 'numeric',
      minute: '2-digit',
      timeZone,
      timeZoneName: 'short',
    });
    formats.set(key, format);
  }
  // The runtime puts narrow no-break spaces before AM and PM, which old mail programs garble.
  return format.format(instant).replace(/[\u202f\u00a0]/g, ' ');
}

/** A calendar date, `YYYY-MM-DD`, in words: `Jun 12, 2026`. */
export function formatDay(date: string, locale: Locale): string {
  return new Intl.DateTimeFormat(tags[locale], { dateStyle: 'medium', timeZone: 'UTC' }).format(
    Date.parse(`${date}T00:00:00Z`),
  );
}

/** A month, `YYYY-MM`, in words: `November 2026`, `noviembre de 2026`. */
export function formatMonth(month: string, locale: Locale): string {
  return new Intl.DateTimeFormat(tags[locale], {
    month: 'long',
    year: 'numeric',
    timeZone: 'UTC',
  }).format(Date.parse(`${month}-01T00:00:00Z`));
}

/** A whole number with its thousands apart. */
export function formatCount(count: number, locale: Locale): string {
  return new Intl.NumberFormat(tags[locale]).format(count);
}

/** Whole cents as US dollars, without cents where there are none. */
export function formatCents(cents: number, locale: Locale): string {
  return new Intl.NumberFormat(tags[locale], {
    style: 'currency',
    currency: 'USD',
    minimumFractionDigits: cents % 100 === 0 ? 0 : 2,
    maximumFractionDigits: 2,
  }).format(cents / 100);
}

/**
 * A share from 0 to 1 as a percentage to one decimal; a dash where there is none.
 *
 * @example formatRate(0.9144, 'en') // '91.4%'
 */
export function formatRate(rate: number | null, locale: Locale): string {
  if (rate === null) return '–';
  return new Intl.NumberFormat(tags[locale], {
    style: 'percent',
    minimumFractionDigits: 1,
    maximumFractionDigits: 1,
  })
    .format(rate)
    .replace(/[\u202f\u00a0]/g, ' ');
}
