import type { Locale } from '../mail/locale';
import { digestWords } from './digest-words';

/**
 * A change in percentage points with its sign, as a person reads it.
 *
 * @example formatChange(-2.5, 'en') // '−2.5 points'
 * @example formatChange(0, 'es') // 'sin cambio'
 * @example formatChange(null, 'en') // '–'
 */
export function formatChange(change: number | null, locale: Locale): string {
  if (change === null) return '–';
  const its = digestWords[locale];
  if (change === 0) return its.noChange;
  const size = new Intl.NumberFormat(locale === 'es' ? 'es-US' : 'en-US', {
    minimumFractionDigits: 1,
    maximumFractionDigits: 1,
  }).format(Math.abs(change));
  return its.points(`${change < 0 ? '−' : '+'}${size}`);
}
