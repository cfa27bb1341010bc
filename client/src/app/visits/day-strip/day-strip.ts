import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
  output,
} from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { addDays, parseCalendarDate } from '@shared/calendar/calendar-date';
import { Icon } from '../../ui/icon/icon';
import { calendarDay } from '../../ui/text/calendar-day';
import type { Route } from '../visits-api';
import { routeStateWord, stopsText } from '../visit-words';

/** A week of days to choose from, each with its stops and whether they are told. */
@Component({
  selector: 'vw-day-strip',
  imports: [Icon, MatIconButton],
  templateUrl: './day-strip.html',
  styleUrl: './day-strip.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DayStrip {
  private readonly locale = inject(LOCALE_ID);

  readonly week = input.required<readonly string[]>();
  readonly day = input.required<string>();
  /** The present date. */
  readonly today = input.required<string>();
  readonly routes = input.required<readonly Route[]>();

  readonly chosen = output<string>();

  protected readonly days = computed(() =>
    this.week().map((date) => {
      const its = this.routes().filter(({ onDate }) => onDate === date);
      const stops = its.reduce((sum, { visits }) => sum + visits.length, 0);
      const untold = its.filter(({ state, visits }) => state !== 'published' && visits.length > 0);
      const worst = untold.find(({ state }) => state === 'changed') ?? untold[0];
      const words = [
        calendarDay(date, this.locale, { weekday: 'long', month: 'long', day: 'numeric' }),
        stopsText(stops),
        worst ? routeStateWord(worst.state) : '',
      ];
      return {
        date,
        weekday: calendarDay(date, this.locale, { weekday: 'short' }),
        number: calendarDay(date, this.locale, { day: 'numeric' }),
        stops,
        untold: untold.length > 0,
        past: date < this.today(),
        words: words.filter(Boolean).join(', '),
      };
    }),
  );
  protected readonly month = computed(() =>
    calendarDay(this.day(), this.locale, { month: 'long', year: 'numeric' }),
  );

  protected step(days: number): void {
    this.chosen.emit(addDays(parseCalendarDate(this.day()), days));
  }

  protected pick(event: Event): void {
    const { value } = event.target as HTMLInputElement;
    if (value) this.chosen.emit(value);
  }
}
