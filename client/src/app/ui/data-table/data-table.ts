import { NgTemplateOutlet } from '@angular/common';
import type { ElementRef } from '@angular/core';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  contentChildren,
  DOCUMENT,
  inject,
  input,
  linkedSignal,
  model,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { MatCheckbox } from '@angular/material/checkbox';
import type { PageEvent } from '@angular/material/paginator';
import { MatPaginator, MatPaginatorIntl } from '@angular/material/paginator';
import { RouterLink } from '@angular/router';
import { Icon } from '../icon/icon';
import type { CellContext } from './cell';
import { Cell } from './cell';
import { isShown, readColumnChoice, writeColumnChoice } from './column-choice';
import type { ColumnOption } from './column-menu';
import { ColumnMenu } from './column-menu';
import type { SortOrder, TableColumn } from './table-column';
import { ariaSort, nextSort } from './table-column';
import { TablePages } from './table-pages';
import { visibleRange } from './visible-range';

/** Height of a row in the long form, which must be the same for all; the style sheet uses it too. */
const ROW_HEIGHT = 45;
const EXTRA_ROWS = 12;

export interface PageChange {
  /** From 1. */
  readonly page: number;
  readonly pageSize: number;
}

/**
 * A table whose rows, order and pages come from the server. It only shows and asks: bind `sort`,
 * `page` and the filters to the address. Project `[tools]` (filters, export) over it and
 * `[empty]` (the next step) for no rows. On a narrow screen each row becomes a card.
 */
@Component({
  selector: 'vw-data-table',
  imports: [ColumnMenu, Icon, MatCheckbox, MatPaginator, NgTemplateOutlet, RouterLink],
  providers: [{ provide: MatPaginatorIntl, useClass: TablePages }],
  templateUrl: './data-table.html',
  styleUrl: './data-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DataTable<Row> {
  private readonly storage = inject(DOCUMENT).defaultView?.localStorage;

  /** Names the table in what is remembered on this device. */
  readonly tableId = input.required<string>();
  /** What the table lists, for screen readers. */
  readonly caption = input.required<string>();
  readonly columns = input.required<readonly TableColumn<Row>[]>();
  readonly rows = input.required<readonly Row[]>();
  readonly rowId = input.required<(row: Row) => string>();
  /** Where a row leads: router commands. The link is the first column's cell. */
  readonly rowLink = input<(row: Row) => readonly unknown[] | null>();
  /** Name of a row, for the box that selects it. */
  readonly rowName = input<(row: Row) => string>(() => '');
  readonly sort = input<SortOrder>('');
  readonly busy = input(false);
  /** All rows there are; with it the pages are shown. */
  readonly total = input<number | null>(null);
  /** From 1. */
  readonly page = input(1);
  readonly pageSize = input(50);
  /** Draws only the rows in sight; for lists of hundreds and more without pages. */
  readonly long = input(false);
  readonly selectable = input(false);
  readonly selected = model<ReadonlySet<string>>(new Set());

  readonly sortChange = output<SortOrder>();
  readonly pageChange = output<PageChange>();
  /** The last rows of a long table came into sight: time to ask for more. */
  readonly endReached = output();

  private readonly cells = contentChildren<Cell<Row>>(Cell);
  private readonly frame = viewChild.required<ElementRef<HTMLElement>>('frame');
  private readonly choice = linkedSignal(() =>
    this.storage ? readColumnChoice(this.tableId(), this.storage) : {},
  );
  private readonly scrolled = signal({ top: 0, height: 900 });

  protected readonly shown = computed(() =>
    this.columns().filter((column) => isShown(column, this.choice())),
  );
  protected readonly options = computed<readonly ColumnOption[]>(() =>
    this.columns()
      .filter((column) => column.choice !== undefined)
      .map((column) => ({
        key: column.key,
        label: column.label,
        shown: isShown(column, this.choice()),
      })),
  );
  private readonly templates = computed(
    () => new Map(this.cells().map((cell) => [cell.vwCell(), cell.template])),
  );
  protected readonly range = computed(() => {
    const count = this.rows().length;
    if (!this.long()) return { start: 0, end: count };
    const { top, height } = this.scrolled();
    return visibleRange(top, height, ROW_HEIGHT, count, EXTRA_ROWS);
  });
  protected readonly drawn = computed(() => {
    const { start, end } = this.range();
    return this.rows()
      .slice(start, end)
      .map((row, index) => ({ row, id: this.rowId()(row), index: start + index }));
  });
  protected readonly above = computed(() => this.range().start * ROW_HEIGHT);
  protected readonly below = computed(() => (this.rows().length - this.range().end) * ROW_HEIGHT);
  protected readonly span = computed(() => this.shown().length + (this.selectable() ? 1 : 0));
  protected readonly allSelected = computed(
    () =>
      this.rows().length > 0 && this.rows().every((row) => this.selected().has(this.rowId()(row))),
  );
  protected readonly someSelected = computed(() => this.selected().size > 0 && !this.allSelected());

  protected readonly ariaSort = ariaSort;

  protected template(key: string): CellTemplate<Row> {
    return this.templates().get(key) ?? null;
  }

  protected context(row: Row): CellContext<Row> {
    return { $implicit: row };
  }

  protected link(row: Row): readonly unknown[] | null {
    return this.rowLink()?.(row) ?? null;
  }

  protected sortBy(name: string): void {
    this.sortChange.emit(nextSort(this.sort(), name));
  }

  protected chooseColumn(option: ColumnOption): void {
    const choice = { ...this.choice(), [option.key]: option.shown };
    this.choice.set(choice);
    if (this.storage) writeColumnChoice(this.tableId(), choice, this.storage);
  }

  protected turnPage(event: PageEvent): void {
    this.pageChange.emit({ page: event.pageIndex + 1, pageSize: event.pageSize });
    this.frame().nativeElement.scrollTop = 0;
  }

  protected select(id: string, on: boolean): void {
    const next = new Set(this.selected());
    if (on) next.add(id);
    else next.delete(id);
    this.selected.set(next);
  }

  protected selectAll(on: boolean): void {
    this.selected.set(new Set(on ? this.rows().map((row) => this.rowId()(row)) : []));
  }

  protected onScroll(): void {
    if (!this.long()) return;
    const { scrollTop, clientHeight, scrollHeight } = this.frame().nativeElement;
    this.scrolled.set({ top: scrollTop, height: clientHeight });
    if (scrollHeight - scrollTop - clientHeight < clientHeight) this.endReached.emit();
  }

  /** Arrow keys go from one row's link to the next. */
  protected onKey(event: KeyboardEvent): void {
    const step = event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0;
    const target = event.target as HTMLElement;
    if (step === 0 || !target.matches('.row-link')) return;
    const links = [...this.frame().nativeElement.querySelectorAll<HTMLElement>('.row-link')];
    const next = links[links.indexOf(target) + step];
    if (!next) return;
    event.preventDefault();
    next.focus();
    next.scrollIntoView({ block: 'nearest' });
  }
}

type CellTemplate<Row> = Cell<Row>['template'] | null;
