import type { Locale } from '../mail/locale';
import { digestWords } from './digest-words';

/**
 * A change in percentage points with its sign, to one decimal, as it stands in a column.
 *
 * @example formatPoints(-2.5, 'en') // '−2.5'
 * @example formatPoints(null, 'en') // '–'
 */
export function formatPoints(change: number | null, locale: Locale): string {
  if (change === null) return '–';
  const size = new Intl.NumberFormat(locale === 'es' ? 'es-US' : 'en-US', {
    minimumFractionDigits: 1,
    maximumFractionDigits: 1,
  }).format(Math.abs(change));
  if (change === 0) return size;
  return `${change < 0 ? '−' : '+'}${size}`;
}

/**
 * The same as a person reads it on its own.
 *
 * @example formatChange(-2.5, 'en') // '−2.5 points'
 * @example formatChange(0, 'es') // 'sin cambio'
 * @example formatChange(null, 'en') // '–'
 */
export function formatChange(change: number | null, locale: Locale): string {
  if (change === null) return '–';
  const its = digestWords[locale];
  return change === 0 ? its.noChange : its.points(formatPoints(change, locale));
}
