import { ChangeDetectionStrategy, Component, computed, inject, LOCALE_ID } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import type { PageEvent } from '@angular/material/paginator';
import { MatPaginator, MatPaginatorIntl } from '@angular/material/paginator';
import { daysBetween, isCalendarDate, parseCalendarDate } from '@shared/calendar/calendar-date';
import { ProblemView } from '../../problems/problem-view';
import { TablePages } from '../../ui/data-table/table-pages';
import { Figure } from '../../ui/figure/figure';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { Icon } from '../../ui/icon/icon';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { StateWord } from '../../ui/state-word/state-word';
import { RatePipe } from '../../ui/text/rate-pipe';
import { taskStates } from '../../ui/text/state-word';
import { Address } from '../address';
import { dayText } from '../due-text/due-text';
import { kept } from '../kept';
import { PlaceFilters } from '../place-filters/place-filters';
import { SavedViews } from '../saved-views/saved-views';
import type { Board, BoardQuery } from '../tasks-api';
import { TasksApi } from '../tasks-api';
import { ViewSwitch } from '../view-switch/view-switch';
import { turnBoard } from './board-days';
import type { OpenedCell } from './board-grid';
import { BoardGrid } from './board-grid';
import type { CellQuestion } from './cell-dialog';
import { CellDialog } from './cell-dialog';

/** Stores by days over five weeks, with the figures of all that the filters hold. */
@Component({
  selector: 'vw-task-board',
  imports: [
    BoardGrid,
    Figure,
    FilterSelect,
    Icon,
    MatButton,
    MatIconButton,
    MatPaginator,
    PageEmpty,
    PageHeader,
    PageLoading,
    PlaceFilters,
    ProblemView,
    RatePipe,
    SavedViews,
    StateWord,
    ViewSwitch,
  ],
  providers: [Address, { provide: MatPaginatorIntl, useClass: TablePages }],
  templateUrl: './task-board.html',
  styleUrl: './task-board.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TaskBoard {
  private readonly locale = inject(LOCALE_ID);
  private readonly dialog = inject(MatDialog);
  private readonly format = new Intl.NumberFormat(this.locale);
  protected readonly address = inject(Address);

  private readonly from = computed(() => {
    const asked = this.address.get('from');
    return isCalendarDate(asked) ? asked : undefined;
  });
  protected readonly sort = computed(() => this.address.get('sort') || 'number');
  /** A store's daily checks would hide the visits that are planned here: they come when asked for. */
  private readonly place = computed((): Partial<BoardQuery> => {
    const place = this.address.place() as Partial<BoardQuery>;
    return this.address.get('audience') ? place : { ...place, audience: 'technician' };
  });
  protected readonly resource = inject(TasksApi).board(() => ({
    ...this.place(),
    from: this.from(),
    sort: this.sort() as BoardQuery['sort'],
    page: this.address.count('page', 1),
    pageSize: this.address.count('pageSize', 50),
  }));
  protected readonly board = kept(this.resource);
  protected readonly states = taskStates;
  protected readonly sorts = [
    { value: 'overdue', label: $localize`:@@tasks.board.sort.overdue:most overdue first` },
    { value: 'rate', label: $localize`:@@tasks.board.sort.rate:lowest rate first` },
    { value: '-rate', label: $localize`:@@tasks.board.sort.rate-down:highest rate first` },
    { value: 'name', label: $localize`:@@tasks.board.sort.name:name` },
  ];
  protected readonly byNumber = $localize`:@@tasks.board.sort.number:number`;
  protected readonly span = computed(() => {
    const board = this.board();
    if (!board) return '';
    const style = { month: 'short', day: 'numeric' } as const;
    return `${dayText(board.from, this.locale, style)} – ${dayText(board.to, this.locale, style)}`;
  });
  protected readonly subtitle = computed(() => {
    const board = this.board();
    if (!board) return '';
    const [shown, all] = [board.rows.length, board.total].map((n) => this.format.format(n));
    return shown === all
      ? $localize`:@@tasks.board.span-all:${this.span()}:span:, ${all}:all: stores`
      : $localize`:@@tasks.board.span:${this.span()}:span:, ${shown}:shown: of ${all}:all: stores`;
  });
  protected readonly gridLabel = computed(
    () => $localize`:@@tasks.board.label:Tasks by store and day, ${this.span()}:span:`,
  );

  protected count(value: number): string {
    return this.format.format(value);
  }

  protected onTime({ figures }: Board): string {
    const [onTime, counted] = [figures.onTime, figures.counted].map((n) => this.format.format(n));
    return $localize`:@@tasks.board.on-time:on time, ${onTime}:onTime: of ${counted}:counted:`;
  }

  protected overdue({ figures, today }: Board): string {
    if (!figures.oldestOverdueOn) return $localize`:@@tasks.board.overdue:overdue`;
    const days = daysBetween(parseCalendarDate(figures.oldestOverdueOn), parseCalendarDate(today));
    return days === 1
      ? $localize`:@@tasks.board.overdue-one:overdue, the oldest 1 day`
      : $localize`:@@tasks.board.overdue-oldest:overdue, the oldest ${days}:days: days`;
  }

  protected turn(boards: -1 | 1): void {
    const board = this.board();
    if (board) this.address.ask({ from: turnBoard(board.from, boards) });
  }

  protected turnPage(event: PageEvent): void {
    this.address.ask({
      page: event.pageIndex === 0 ? null : event.pageIndex + 1,
      pageSize: event.pageSize,
    });
  }

  protected open({ store, date }: OpenedCell): void {
    const data: CellQuestion = {
      storeName: `${store.number} ${store.name}`,
      date,
      filters: { ...this.place(), sort: undefined, store: store.storeId },
    };
    this.dialog.open<CellDialog, CellQuestion>(CellDialog, {
      data,
      width: '34rem',
      maxWidth: 'calc(100vw - 24px)',
      autoFocus: 'dialog',
    });
  }
}
