import type { PipeTransform } from '@angular/core';
import { inject, LOCALE_ID, Pipe } from '@angular/core';

/** A calendar date (`YYYY-MM-DD`) as the reader's language writes it, in no zone; nothing → "–". */
@Pipe({ name: 'day' })
export class DayPipe implements PipeTransform {
  private readonly locale = inject(LOCALE_ID);

  transform(date: string | null | undefined): string {
    return dayWords(date, this.locale);
  }
}

/** {@link DayPipe} for code. */
export function dayWords(date: string | null | undefined, locale: string): string {
  if (!date) return '–';
  return new Intl.DateTimeFormat(locale, { dateStyle: 'medium', timeZone: 'UTC' }).format(
    new Date(`${date}T00:00:00Z`),
  );
}
