import { ChangeDetectionStrategy, Component, computed, inject, LOCALE_ID } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { FindingWords } from '../../findings/finding-words';
import { ProblemView } from '../../problems/problem-view';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { calendarDay } from '../../ui/text/calendar-day';
import { PhotoOutbox } from '../../uploads/photo-outbox';
import { StopCard } from '../stop-card/stop-card';
import type { TodayStop } from '../today-api';
import { TodayApi } from '../today-api';
import { minutesText } from '../today-words';

const isLeft = ({ state }: TodayStop['tasks'][number]) =>
  state === 'open' || state === 'due-soon' || state === 'overdue';

/** A technician's day: the route as a line with its stops, then what is due and on no visit. */
@Component({
  selector: 'vw-today-page',
  imports: [MatButton, PageEmpty, PageHeader, PageLoading, ProblemView, RouterLink, StopCard],
  templateUrl: './today-page.html',
  styleUrl: './today-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TodayPage {
  private readonly locale = inject(LOCALE_ID);
  private readonly words = inject(FindingWords);
  protected readonly outbox = inject(PhotoOutbox);

  protected readonly resource = inject(TodayApi).today();
  protected readonly today = computed(() =>
    this.resource.hasValue() ? this.resource.value() : null,
  );
  private readonly stops = computed(() => {
    const today = this.today();
    return today ? [...today.visits, ...today.unplanned] : [];
  });

  protected readonly heading = computed(() => {
    const today = this.today();
    if (!today) return '';
    const day = calendarDay(today.date, this.locale, { weekday: 'long' });
    const named = day.charAt(0).toLocaleUpperCase(this.locale) + day.slice(1);
    const stops = today.visits.length;
    if (stops === 0) return named;
    return stops === 1
      ? $localize`:@@today.one-stop:${named}:day:, 1 stop`
      : $localize`:@@today.stops:${named}:day:, ${stops}:count: stops`;
  });
  protected readonly subtitle = computed(() => {
    const today = this.today();
    if (!today) return '';
    const minutes = today.visits.reduce((sum, stop) => sum + stop.minutes, 0);
    const left = today.visits.flatMap(({ tasks }) => tasks).filter(isLeft).length;
    const date = calendarDay(today.date, this.locale, { month: 'long', day: 'numeric' });
    if (!today.published) return date;
    return $localize`:@@today.left:${date}:date: · ${minutesText(minutes)}:minutes: of work left in ${left}:count: tasks`;
  });
  /** The stop to go to now: the first with work left. */
  protected readonly next = computed(() => this.stops().find(({ tasks }) => tasks.some(isLeft)));
  protected readonly start = computed(() => {
    const stop = this.next();
    const task = stop?.tasks.find(isLeft);
    if (!stop || !task) return null;
    const place = task.unitTag ? `${stop.store.number} ${task.unitTag}` : stop.store.number;
    return {
      link: ['/tasks', task.id, 'sheet'],
      label: $localize`:@@today.start:Start at ${place}:place:`,
      title: this.words.text(task.title),
    };
  });

  /** How a visit stands on the route's line. */
  protected standing(stop: TodayStop): 'done' | 'next' | 'later' {
    if (stop === this.next()) return 'next';
    return stop.tasks.length > 0 && !stop.tasks.some(isLeft) ? 'done' : 'later';
  }
}
