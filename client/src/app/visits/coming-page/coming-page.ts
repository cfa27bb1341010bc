import { ChangeDetectionStrategy, Component, computed, inject, LOCALE_ID } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { dateAt } from '@shared/calendar/instant-of';
import { ProblemView } from '../../problems/problem-view';
import { Session } from '../../session/session';
import { Icon } from '../../ui/icon/icon';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { calendarDay } from '../../ui/text/calendar-day';
import { VatGlyph } from '../../ui/vat-glyph/vat-glyph';
import type { Coming } from '../visits-api';
import { VisitsApi } from '../visits-api';
import { minutesText, taskText } from '../visit-words';

/** Days that are looked ahead. */
const AHEAD = 31;

/** Who comes to the stores in sight, and when, day by day. */
@Component({
  selector: 'vw-coming-page',
  imports: [Icon, MatButton, PageEmpty, PageHeader, PageLoading, ProblemView, RouterLink, VatGlyph],
  templateUrl: './coming-page.html',
  styleUrl: './coming-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComingPage {
  private readonly api = inject(VisitsApi);
  private readonly session = inject(Session);
  private readonly locale = inject(LOCALE_ID);
  protected readonly mayPlan = this.session.can('visits.plan');

  private readonly today = computed(() => dateAt(Date.now(), this.session.timeZone()));
  protected readonly resource = this.api.coming(() => ({ from: this.today(), days: AHEAD }));
  protected readonly days = computed(() => {
    const visits = this.resource.hasValue() ? this.resource.value().visits : [];
    const days = new Map<string, Coming[]>();
    for (const visit of visits) days.set(visit.onDate, [...(days.get(visit.onDate) ?? []), visit]);
    return [...days].map(([date, its]) => ({
      date,
      words: this.dayWords(date),
      visits: its.map((visit) => ({ visit, facts: this.facts(visit) })),
    }));
  });
  protected readonly taskText = taskText;

  private dayWords(date: string): string {
    const words = calendarDay(date, this.locale, {
      weekday: 'long',
      month: 'long',
      day: 'numeric',
    });
    return date === this.today() ? $localize`:@@visits.today:Today, ${words}:day:` : words;
  }

  private facts({ place, stops, minutes, done, tasks }: Coming): string {
    return [
      $localize`:@@visits.stop-of:stop ${place}:place: of ${stops}:count:`,
      minutesText(minutes),
      done > 0 ? $localize`:@@visits.done-of:${done}:done: of ${tasks.length}:count: done` : '',
    ]
      .filter(Boolean)
      .join(' · ');
  }
}
