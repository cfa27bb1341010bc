import type { ElementRef } from '@angular/core';
import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
  output,
  viewChild,
} from '@angular/core';
import type { Month } from '@shared/compliance/month';
import { VatGlyph } from '../../ui/vat-glyph/vat-glyph';
import { dayText } from '../due-text/due-text';
import { countWords, ordered } from '../state-counts';
import type { Calendar } from '../tasks-api';
import { monthWeeks } from './month-days';

/** How many states a day writes out before it says only how many more. */
const MOST_LINES = 4;

/** A month as a grid of days, each with its tasks counted by state. Arrows move day by day. */
@Component({
  selector: 'vw-month-grid',
  imports: [VatGlyph],
  templateUrl: './month-grid.html',
  styleUrl: './month-grid.scss',
  host: { '(keydown)': 'onKey($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MonthGrid {
  private readonly locale = inject(LOCALE_ID);

  readonly month = input.required<string>();
  readonly days = input.required<Calendar['days']>();
  readonly today = input.required<string>();
  readonly chosen = input('');

  readonly choose = output<string>();
  /** The month before (-1) or after (1) was asked for. */
  readonly turn = output<-1 | 1>();

  private readonly table = viewChild.required<ElementRef<HTMLElement>>('table');

  protected readonly weekdays = Array.from({ length: 7 }, (_, day) => ({
    // The first of January 2024 was a Monday.
    short: dayText(`2024-01-0${day + 1}`, this.locale, { weekday: 'short' }),
    long: dayText(`2024-01-0${day + 1}`, this.locale, { weekday: 'long' }),
    rest: day > 4,
  }));
  private readonly byDate = computed(() => new Map(this.days().map((day) => [day.date, day])));
  protected readonly weeks = computed(() =>
    monthWeeks(this.month() as Month).map((week) => ({
      key: week.find((date) => date !== null) ?? '',
      days: week.map((date, weekday) => ({ date, weekday, ...this.describe(date) })),
    })),
  );
  protected readonly label = computed(() => {
    const month = dayText(`${this.month()}-01`, this.locale, { month: 'long', year: 'numeric' });
    return $localize`:@@tasks.month.label:Tasks due in ${month}:month:`;
  });
  /** The one day that Tab reaches. */
  protected readonly entry = computed(() => {
    const inMonth = (date: string) => date.startsWith(this.month());
    return [this.chosen(), this.today()].find(inMonth) ?? `${this.month()}-01`;
  });

  /** The month was turned by a key: the focus goes along into the next one. */
  private follow = false;

  constructor() {
    afterRenderEffect(() => {
      this.weeks();
      if (!this.follow) return;
      this.follow = false;
      this.table().nativeElement.querySelector<HTMLElement>('[tabindex="0"]')?.focus();
    });
  }

  protected onKey(event: KeyboardEvent): void {
    const date = (event.target as HTMLElement).dataset['date'];
    if (!date) return;
    if (event.key === 'PageUp' || event.key === 'PageDown') {
      event.preventDefault();
      this.follow = true;
      this.turn.emit(event.key === 'PageUp' ? -1 : 1);
      return;
    }
    const step = steps[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const days = [...this.table().nativeElement.querySelectorAll<HTMLElement>('[data-date]')];
    const at = days.findIndex((day) => day.dataset['date'] === date);
    days[Math.min(days.length - 1, Math.max(0, at + step))]?.focus();
  }

  private describe(date: string | null) {
    const day = date ? this.byDate().get(date) : undefined;
    const states = day ? ordered(day.counts) : [];
    const lines = states.length > MOST_LINES ? states.slice(0, MOST_LINES - 1) : states;
    const rest = states.slice(lines.length).reduce((sum, { count }) => sum + count, 0);
    const name = date ? dayText(date, this.locale, { dateStyle: 'full' }) : '';
    const words = day ? countWords(day.counts, this.locale) : '';
    return {
      number: date ? Number(date.slice(8)) : 0,
      lines,
      rest,
      label: words
        ? $localize`:@@tasks.month.day:${name}:day:: ${words}:counts:`
        : $localize`:@@tasks.month.day-none:${name}:day:: no tasks`,
    };
  }
}

const steps: Readonly<Record<string, number>> = {
  ArrowRight: 1,
  ArrowLeft: -1,
  ArrowDown: 7,
  ArrowUp: -7,
};
