import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  linkedSignal,
  LOCALE_ID,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { dateAt } from '@shared/calendar/instant-of';
import type { TaskState } from '@shared/tasks/task-state';
import { FilterDates } from '../../findings/filter-dates/filter-dates';
import { ProblemView } from '../../problems/problem-view';
import { LanguageChoice } from '../../session/language-choice';
import { Session } from '../../session/session';
import { Cell } from '../../ui/data-table/cell';
import type { PageChange } from '../../ui/data-table/data-table';
import { DataTable } from '../../ui/data-table/data-table';
import { ExportMenu } from '../../ui/data-table/export-menu';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { StateWord } from '../../ui/state-word/state-word';
import { Address } from '../address';
import type { Chosen } from '../change-tasks/change-tasks';
import { ChangeTasks } from '../change-tasks/change-tasks';
import { LeftTasks } from '../change-tasks/left-tasks';
import { dayText, dueClock, urgencyText, windowLeft } from '../due-text/due-text';
import { kept } from '../kept';
import { PlaceFilters } from '../place-filters/place-filters';
import { SavedViews } from '../saved-views/saved-views';
import { StateFilter } from '../state-filter/state-filter';
import type { Task, TaskQuery } from '../tasks-api';
import { TasksApi } from '../tasks-api';
import { ViewSwitch } from '../view-switch/view-switch';
import { SelectionBar } from './selection-bar';
import { setFilters } from './set-filters';
import { taskColumns } from './task-columns';
import { shownStates, statesInAddress, tableFilters } from './task-filters';

/** The server changes no more than this at once. */
const MOST_AT_ONCE = 2000;

/** All tasks in sight as a table: filtered, ordered, chosen and changed many at a time. */
@Component({
  selector: 'vw-task-table',
  imports: [
    Cell,
    DataTable,
    ExportMenu,
    FilterDates,
    FilterSelect,
    LeftTasks,
    MatButton,
    PageEmpty,
    PageHeader,
    PageLoading,
    PlaceFilters,
    ProblemView,
    SavedViews,
    SelectionBar,
    StateFilter,
    StateWord,
    ViewSwitch,
  ],
  providers: [Address, ChangeTasks],
  templateUrl: './task-table.html',
  styleUrl: './task-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TaskTable {
  private readonly api = inject(TasksApi);
  private readonly locale = inject(LOCALE_ID);
  private readonly language = inject(LanguageChoice).current;
  protected readonly address = inject(Address);
  protected readonly changing = inject(ChangeTasks);
  protected readonly mayPlan = inject(Session).can('tasks.plan');

  private readonly get = (key: string): string => this.address.get(key);
  protected readonly filters = computed(() => tableFilters(this.get));
  protected readonly states = computed(() => shownStates(this.get));
  protected readonly sort = computed(() => this.address.get('sort') || 'due');
  protected readonly page = computed(() => this.address.count('page', 1));
  protected readonly pageSize = computed(() => this.address.count('pageSize', 50));
  private readonly ordered = computed<TaskQuery>(() => ({
    ...this.filters(),
    sort: this.sort() as TaskQuery['sort'],
  }));
  protected readonly list = this.api.list(() => ({
    ...this.ordered(),
    page: this.page(),
    pageSize: this.pageSize(),
  }));
  protected readonly shown = kept(this.list);
  protected readonly rows = computed(() => this.shown()?.rows ?? []);
  protected readonly csv = computed(() => this.api.exportAddress(this.ordered(), 'csv'));
  protected readonly xlsx = computed(() => this.api.exportAddress(this.ordered(), 'xlsx'));
  protected readonly set = computed(() => setFilters(this.get, this.locale));
  protected readonly columns = taskColumns(this.locale, (both) => both[this.language] || both.en);
  protected readonly assigned = [
    { value: 'yes', label: $localize`:@@tasks.unassigned.yes:nobody` },
    { value: 'no', label: $localize`:@@tasks.unassigned.no:somebody` },
  ];

  /** A new page or filter begins with nothing chosen. */
  protected readonly selected = linkedSignal<unknown, ReadonlySet<string>>({
    source: () => [this.filters(), this.page(), this.pageSize()],
    computation: () => new Set(),
  });
  /** All that fit the filters, not the ticked ones of this page alone. */
  protected readonly allMatching = linkedSignal({
    source: this.selected,
    computation: () => false,
  });
  protected readonly total = computed(() => this.shown()?.total ?? 0);
  protected readonly count = computed(() =>
    this.allMatching() ? this.total() : this.selected().size,
  );
  protected readonly offerAll = computed(() => {
    const wholePage = this.rows().length > 0 && this.selected().size === this.rows().length;
    const more = this.total() > this.rows().length && this.total() <= MOST_AT_ONCE;
    return wholePage && more && !this.allMatching() ? this.total() : 0;
  });

  protected readonly none: ReadonlySet<string> = new Set();
  protected readonly id = (task: Task): string => task.id;
  protected readonly link = (task: Task): readonly unknown[] => ['/tasks', task.id];
  protected readonly name = (task: Task): string =>
    [task.storeNumber, task.unitTag, task.ruleName, dayText(task.dueOn, this.locale)]
      .filter(Boolean)
      .join(', ');

  constructor() {
    this.changing.changes.pipe(takeUntilDestroyed()).subscribe(() => {
      this.selected.set(new Set());
      this.list.reload();
    });
  }

  protected level(task: Task): number {
    return windowLeft(task, Date.now());
  }

  protected due(task: Task): string {
    return dueClock(task, this.locale);
  }

  protected until(task: Task): string {
    return urgencyText(task, dateAt(Date.now(), task.timeZone), this.locale);
  }

  protected showStates(states: readonly TaskState[]): void {
    this.address.ask({ state: statesInAddress(states) });
  }

  protected turn({ page, pageSize }: PageChange): void {
    this.address.ask({ page: page === 1 ? null : page, pageSize });
  }

  protected chosen(): Chosen {
    if (this.allMatching()) {
      const { total } = this;
      return {
        selection: { kind: 'matching', filters: this.filters(), seen: total() },
        count: total(),
      };
    }
    const tasks = this.rows()
      .filter(({ id }) => this.selected().has(id))
      .map(({ id, version }) => ({ id, version }));
    return { selection: { kind: 'tasks', tasks }, count: tasks.length };
  }
}
