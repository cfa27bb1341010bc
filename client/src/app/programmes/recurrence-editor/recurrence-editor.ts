import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  linkedSignal,
  LOCALE_ID,
  model,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';
import { MatOption } from '@angular/material/core';
import { MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelect } from '@angular/material/select';
import type { Weekday } from '@shared/calendar/calendar-date';
import { addMonths, isCalendarDate } from '@shared/calendar/calendar-date';
import { readLocalDateTime } from '@shared/calendar/local-date-time';
import { recurrenceProblems } from '@shared/programmes/recurrence-problems';
import type { Recurrence } from '@shared/programmes/recurrence-set';
import { DateList } from './date-list';
import { NextDates } from './next-dates';
import { nthWord, unitWord } from './pattern-words';
import type { PlainPattern, PlainUnit } from './plain-pattern';
import { patternFrom, toPattern, toRuleText } from './plain-pattern';

/**
 * Writes a recurrence in plain words or as RFC 5545 text; the sentence and the next dates, or what
 * is wrong with which part, stand beside it all the while.
 */
@Component({
  selector: 'vw-recurrence-editor',
  imports: [
    DateList,
    MatButton,
    MatButtonToggle,
    MatButtonToggleGroup,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    NextDates,
  ],
  templateUrl: './recurrence-editor.html',
  styleUrl: './recurrence-editor.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RecurrenceEditor {
  private readonly locale = inject(LOCALE_ID);

  readonly recurrence = model.required<Recurrence>();

  private readonly wantsText = signal(false);
  /** What the plain controls show; null where only the text can say it. */
  protected readonly pattern = computed(() => {
    const { rrules, startsLocal } = this.recurrence();
    return rrules.length === 1 ? toPattern(rrules[0] as string, startsLocal) : null;
  });
  protected readonly asText = computed(() => this.wantsText() || this.pattern() === null);
  protected readonly date = computed(() => this.recurrence().startsLocal.slice(0, 10));
  protected readonly time = computed(() => this.recurrence().startsLocal.slice(11, 16));
  /** As it was typed, spaces and empty lines too, for as long as it says the same. */
  protected readonly text = linkedSignal<readonly string[], string>({
    source: () => this.recurrence().rrules,
    computation: (rrules, before) =>
      before && ruleLines(before.value).join('\n') === rrules.join('\n')
        ? before.value
        : rrules.join('\n'),
  });

  protected readonly faulty = computed(() => recurrenceProblems(this.recurrence()).length > 0);

  protected readonly units: readonly PlainUnit[] = ['DAILY', 'WEEKLY', 'MONTHLY', 'YEARLY'];
  protected readonly weekdays = ([0, 1, 2, 3, 4, 5, 6] as const).map((weekday) => ({
    weekday: weekday as Weekday,
    // 5 January 2026 was a Monday.
    short: this.dayName(5 + weekday, 'short'),
    long: this.dayName(5 + weekday, 'long'),
  }));
  protected readonly months = Array.from({ length: 12 }, (_, index) => ({
    month: index + 1,
    name: new Intl.DateTimeFormat(this.locale, { month: 'long', timeZone: 'UTC' }).format(
      Date.UTC(2026, index, 1),
    ),
  }));
  protected readonly monthDays = [...Array.from({ length: 31 }, (_, index) => index + 1), -1];
  protected readonly nths = [1, 2, 3, 4, 5, -1].map((nth) => ({ nth, word: nthWord(nth) }));
  protected readonly hours = computed(() => {
    const [own, minute] = this.time().split(':');
    return Array.from({ length: 24 }, (_, hour) => ({
      hour,
      name: `${String(hour).padStart(2, '0')}:${minute}`,
    })).filter(({ hour }) => hour !== Number(own));
  });
  protected readonly unitWord = unitWord;
  protected readonly legends = {
    rdates: $localize`:@@programmes.rdates:Also on these days`,
    exdates: $localize`:@@programmes.exdates:Not on these days`,
  };

  protected change(patch: Partial<PlainPattern>): void {
    const { startsLocal } = this.recurrence();
    const pattern = { ...(this.pattern() ?? patternFrom(startsLocal)), ...patch };
    this.patch({ rrules: [toRuleText(pattern, startsLocal)] });
  }

  protected choose(ends: PlainPattern['ends']): void {
    const date = this.date();
    const inAYear = isCalendarDate(date) ? addMonths(date, 12) : '';
    this.change({ ends, ...(ends === 'on' ? { until: inAYear } : {}) });
  }

  protected changeUntil(until: string): void {
    if (isCalendarDate(until)) this.change({ until });
  }

  protected changeStart(date: string, time: string): void {
    const startsLocal = readLocalDateTime(`${date}T${time}`);
    if (!startsLocal) return;
    // The hours of a rule stand beside the start's own, so both change together.
    const pattern = this.pattern();
    this.patch({
      startsLocal,
      ...(pattern && !this.asText() ? { rrules: [toRuleText(pattern, startsLocal)] } : {}),
    });
  }

  protected changeText(text: string): void {
    this.text.set(text);
    this.patch({ rrules: ruleLines(text) });
  }

  protected patch(patch: Partial<Recurrence>): void {
    this.recurrence.set({ ...this.recurrence(), ...patch });
  }

  protected showText(wanted: boolean): void {
    this.wantsText.set(wanted);
  }

  private dayName(day: number, weekday: 'short' | 'long'): string {
    return new Intl.DateTimeFormat(this.locale, { weekday, timeZone: 'UTC' }).format(
      Date.UTC(2026, 0, day),
    );
  }
}

/** The rules in a text, one on a line; as a whole line of a calendar file too. */
function ruleLines(text: string): string[] {
  return text
    .split('\n')
    .map((line) => line.trim().replace(/^RRULE:/i, ''))
    .filter(Boolean);
}
