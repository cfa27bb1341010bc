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
  signal,
  viewChild,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { RatePipe } from '../../ui/text/rate-pipe';
import { SparkStrip } from '../../ui/spark-strip/spark-strip';
import { VatGlyph } from '../../ui/vat-glyph/vat-glyph';
import { dayText } from '../due-text/due-text';
import type { GridPlace } from '../grid-keys';
import { gridMove } from '../grid-keys';
import { cellSigns, countWords } from '../state-counts';
import type { Board, BoardRow } from '../tasks-api';
import { boardDays } from './board-days';

/** A store and a day whose tasks were asked for. */
export interface OpenedCell {
  readonly store: BoardRow;
  readonly date: string;
}

/** Rows that Page Up and Page Down move by. */
const JUMP = 10;
/** Below this on-time rate a store's figure is drawn in alarm; common practice, to be discussed. */
const LOW_RATE = 0.8;

/** Stores by days: a grid in which the arrows move cell by cell and Enter opens the cell's tasks. */
@Component({
  selector: 'vw-board-grid',
  imports: [RatePipe, RouterLink, SparkStrip, VatGlyph],
  templateUrl: './board-grid.html',
  styleUrl: './board-grid.scss',
  host: { '(keydown)': 'onKey($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BoardGrid {
  private readonly locale = inject(LOCALE_ID);

  readonly board = input.required<Board>();
  readonly label = input.required<string>();

  readonly opened = output<OpenedCell>();

  private readonly frame = viewChild.required<ElementRef<HTMLElement>>('frame');
  /** Where the focus stands in the grid; the first cell of today's column until it was moved. */
  private readonly moved = signal<GridPlace | null>(null);

  protected readonly lowRate = LOW_RATE;
  protected readonly days = computed(() =>
    boardDays(this.board().from).map((day) => ({
      ...day,
      today: day.date === this.board().today,
      initial: dayText(day.date, this.locale, { weekday: 'narrow' }),
      number: Number(day.date.slice(8)),
      name: dayText(day.date, this.locale, { weekday: 'long', month: 'long', day: 'numeric' }),
    })),
  );
  private readonly todayColumn = computed(() => this.days().findIndex(({ today }) => today));
  protected readonly place = computed<GridPlace>(() => {
    const rows = this.board().rows.length;
    const { row, column } = this.moved() ?? { row: 0, column: Math.max(0, this.todayColumn()) };
    return { row: Math.min(row, Math.max(0, rows - 1)), column };
  });
  protected readonly rows = computed(() => {
    const days = this.days();
    return this.board().rows.map((store) => {
      const counts = new Map(store.cells.map((cell) => [cell.date, cell.counts]));
      return {
        store,
        strip: this.stripWords(store),
        cells: days.map((day) => {
          const of = counts.get(day.date) ?? {};
          const words = countWords(of, this.locale);
          const where = `${store.number} ${store.name}, ${day.name}`;
          return {
            date: day.date,
            rest: day.rest,
            // Each store has its own midnight.
            today: day.date === store.today,
            ...cellSigns(of),
            label: words
              ? `${where}: ${words}`
              : $localize`:@@tasks.board.cell-none:${where}:where:: no tasks`,
          };
        }),
      };
    });
  });

  constructor() {
    let shown = '';
    afterRenderEffect(() => {
      // Today comes into sight where five weeks are wider than the screen; once for each span.
      const { from } = this.board();
      if (from === shown) return;
      shown = from;
      const head = this.frame().nativeElement.querySelector<HTMLElement>('th.today');
      const frame = this.frame().nativeElement;
      if (head) frame.scrollLeft = head.offsetLeft - frame.clientWidth / 2;
    });
  }

  protected onKey(event: KeyboardEvent): void {
    const target = event.target as HTMLElement;
    if (target.dataset['row'] === undefined) return;
    const next = gridMove(this.place(), event, this.rows().length, this.days().length, JUMP);
    if (!next) return;
    event.preventDefault();
    this.moved.set(next);
    const cell = this.frame().nativeElement.querySelector<HTMLElement>(
      `[data-row="${next.row}"][data-column="${next.column}"]`,
    );
    cell?.focus({ preventScroll: true });
    cell?.scrollIntoView({ block: 'nearest', inline: 'nearest' });
  }

  protected stand(row: number, column: number): void {
    this.moved.set({ row, column });
  }

  private stripWords(store: BoardRow): string {
    const known = store.weeks.filter((week) => week !== null);
    if (known.length === 0) return $localize`:@@tasks.board.strip-none:13 weeks, nothing due`;
    const percent = new Intl.NumberFormat(this.locale, { style: 'percent' });
    const low = percent.format(Math.min(...known));
    const last = percent.format(known.at(-1) ?? 0);
    return $localize`:@@tasks.board.strip:13 weeks on time: lowest ${low}:low:, last ${last}:last:`;
  }
}
