import type { Recurrence } from './recurrence-set';

export function recurrenceWords(recurrence: Recurrence) {
  const text = recurrence.rrules.join(' + ');
  return { en: text, es: text };
}
