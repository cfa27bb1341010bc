import { ChangeDetectionStrategy, Component, computed, inject, LOCALE_ID } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { dateAt } from '@shared/calendar/instant-of';
import { addToMonth, isMonth, monthOf } from '@shared/compliance/month';
import { ProblemView } from '../../problems/problem-view';
import { Session } from '../../session/session';
import { Icon } from '../../ui/icon/icon';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageLoading } from '../../ui/page-states/page-loading';
import { Address } from '../address';
import { dayText } from '../due-text/due-text';
import { kept } from '../kept';
import { PlaceFilters } from '../place-filters/place-filters';
import { SavedViews } from '../saved-views/saved-views';
import { TaskLines } from '../task-lines/task-lines';
import type { CalendarQuery } from '../tasks-api';
import { TasksApi } from '../tasks-api';
import { ViewSwitch } from '../view-switch/view-switch';
import { MonthGrid } from './month-grid';

/** The tasks of a month counted by day and state; a day chosen lists its tasks beside it. */
@Component({
  selector: 'vw-task-month',
  imports: [
    Icon,
    MatButton,
    MatIconButton,
    MonthGrid,
    PageHeader,
    PageLoading,
    PlaceFilters,
    ProblemView,
    RouterLink,
    SavedViews,
    TaskLines,
    ViewSwitch,
  ],
  providers: [Address],
  templateUrl: './task-month.html',
  styleUrl: './task-month.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TaskMonth {
  private readonly locale = inject(LOCALE_ID);
  protected readonly address = inject(Address);

  private readonly thisMonth = monthOf(dateAt(Date.now(), inject(Session).timeZone()));
  protected readonly month = computed(() => {
    const asked = this.address.get('month');
    return isMonth(asked) ? asked : this.thisMonth;
  });
  protected readonly day = computed(() => {
    const asked = this.address.get('day');
    return asked.startsWith(this.month()) ? asked : '';
  });
  protected readonly resource = inject(TasksApi).calendar(() => ({
    ...(this.address.place() as Partial<CalendarQuery>),
    unit: this.address.get('unit') || undefined,
    month: this.month(),
    day: this.day() || undefined,
  }));
  protected readonly calendar = kept(this.resource);
  protected readonly title = computed(() =>
    dayText(`${this.month()}-01`, this.locale, { month: 'long', year: 'numeric' }),
  );
  protected readonly dayTitle = computed(() =>
    this.day() ? dayText(this.day(), this.locale, { dateStyle: 'full' }) : '',
  );
  protected readonly dayTotal = computed(
    () => this.calendar()?.days.find(({ date }) => date === this.day())?.total ?? 0,
  );
  /** The filters with the day, for the table. */
  protected readonly inTable = computed(() => ({
    ...this.address.place(),
    from: this.day(),
    to: this.day(),
  }));

  protected turn(months: number): void {
    const month = addToMonth(this.month(), months);
    this.address.ask({ month: month === this.thisMonth ? null : month, day: null });
  }

  protected toThisMonth(): void {
    this.address.ask({ month: null, day: null });
  }

  protected choose(date: string): void {
    this.address.ask({ day: date === this.day() ? null : date });
  }
}
