import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  LOCALE_ID,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { dateAt } from '@shared/calendar/instant-of';
import { ProblemView } from '../../problems/problem-view';
import { Session } from '../../session/session';
import { PageTitle } from '../../shell/page-title';
import { Icon } from '../../ui/icon/icon';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageLoading } from '../../ui/page-states/page-loading';
import { StateWord } from '../../ui/state-word/state-word';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { gaugeLevels } from '../../ui/vat-gauge/gauge-levels';
import { VatGauge } from '../../ui/vat-gauge/vat-gauge';
import type { Chosen } from '../change-tasks/change-tasks';
import { ChangeTasks } from '../change-tasks/change-tasks';
import { LeftTasks } from '../change-tasks/left-tasks';
import { dayText, dueClock } from '../due-text/due-text';
import type { Task } from '../tasks-api';
import { TasksApi } from '../tasks-api';
import { WhyTask } from './why-task';

/** One task as a planner sees it: its window, whose it is, why it is here, what can be done. */
@Component({
  selector: 'vw-task-page',
  imports: [
    Icon,
    LeftTasks,
    MatButton,
    PageHeader,
    PageLoading,
    ProblemView,
    RouterLink,
    StateWord,
    TimeInZonePipe,
    VatGauge,
    WhyTask,
  ],
  providers: [ChangeTasks],
  templateUrl: './task-page.html',
  styleUrl: './task-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TaskPage {
  private readonly locale = inject(LOCALE_ID);
  protected readonly changing = inject(ChangeTasks);

  readonly id = input.required<string>();

  protected readonly resource = inject(TasksApi).one(() => this.id());
  protected readonly task = computed(() =>
    this.resource.hasValue() ? this.resource.value() : null,
  );
  protected readonly mayFindings = inject(Session).can('findings.read');
  protected readonly title = computed(() => this.task()?.ruleName ?? '');
  protected readonly where = computed(() => {
    const task = this.task();
    if (!task) return '';
    return [`${task.storeNumber} ${task.storeName}`, task.unitTag].filter(Boolean).join(' · ');
  });
  protected readonly undecided = computed(() =>
    ['planned', 'open', 'due-soon', 'overdue'].includes(this.task()?.state ?? ''),
  );

  constructor() {
    const pageTitle = inject(PageTitle);
    effect(() => {
      if (this.title()) pageTitle.set(`${this.title()}, ${this.where()}`);
    });
    this.changing.changes.pipe(takeUntilDestroyed()).subscribe(() => this.resource.reload());
  }

  /** The window alone: the oil stands at the rim when it opens and at the floor when it closes. */
  protected levels(task: Task) {
    const [opensAt, dueAt, closesAt] = [task.opensAt, task.dueAt, task.closesAt].map(
      Date.parse,
    ) as [number, number, number];
    const until = task.outcomeAt ? Date.parse(task.outcomeAt) : Date.now();
    return gaugeLevels({ startedAt: opensAt, opensAt, dueAt, closesAt }, until);
  }

  /** The words at the marks of the gauge. */
  protected marks(task: Task) {
    const on = (instant: string) =>
      dayText(dateAt(Date.parse(instant), task.timeZone), this.locale, {
        month: 'short',
        day: 'numeric',
      });
    return {
      opens: $localize`:@@tasks.gauge.opens:opens ${on(task.opensAt)}:day:`,
      due: $localize`:@@tasks.gauge.due:due ${on(task.dueAt)}:day:`,
      closes: $localize`:@@tasks.gauge.closes:late from ${on(task.closesAt)}:day:`,
    };
  }

  protected due(task: Task): string {
    return dueClock(task, this.locale);
  }

  protected day(date: string): string {
    return dayText(date, this.locale, { dateStyle: 'medium' });
  }

  protected chosen({ id, version }: Task): Chosen {
    return { selection: { kind: 'tasks', tasks: [{ id, version }] }, count: 1 };
  }
}
