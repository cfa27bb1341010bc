import type { CdkDragDrop } from '@angular/cdk/drag-drop';
import { CdkDrag, CdkDragHandle, CdkDropList } from '@angular/cdk/drag-drop';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  LOCALE_ID,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { ProblemView } from '../../problems/problem-view';
import { FilterBar } from '../../ui/filter-bar/filter-bar';
import { Icon } from '../../ui/icon/icon';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { calendarDay } from '../../ui/text/calendar-day';
import { VatGlyph } from '../../ui/vat-glyph/vat-glyph';
import { PlanDesk } from '../plan-desk';
import type { Carried } from '../route-column/route-column';
import type { Technician, Unplanned } from '../visits-api';
import { minutesText, storesText, tasksText, taskText } from '../visit-words';

/** Stores whose tasks are in no visit yet, what closes first on top. */
@Component({
  selector: 'vw-unplanned-list',
  imports: [
    CdkDrag,
    CdkDragHandle,
    CdkDropList,
    FilterBar,
    Icon,
    MatButton,
    MatCheckbox,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    PageEmpty,
    PageLoading,
    ProblemView,
    VatGlyph,
  ],
  templateUrl: './unplanned-list.html',
  styleUrl: './unplanned-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnplannedList {
  protected readonly desk = inject(PlanDesk);
  private readonly locale = inject(LOCALE_ID);

  private readonly opened = signal<ReadonlySet<string>>(new Set());
  /** Tasks that the planner does not want along. */
  private readonly left = signal<ReadonlySet<string>>(new Set());

  protected readonly stores = computed(() =>
    (this.desk.unplanned()?.rows ?? []).map((row) => {
      const chosen = row.tasks.filter(({ id }) => !this.left().has(id));
      return {
        row,
        open: this.opened().has(row.store.id),
        chosen,
        facts: [
          row.store.city,
          chosen.length === row.tasks.length
            ? tasksText(row.tasks.length)
            : $localize`:@@visits.some-tasks:${chosen.length}:some: of ${tasksText(row.tasks.length)}:tasks:`,
          minutesText(chosen.reduce((sum, { minutes }) => sum + (minutes ?? 0), 0)),
        ].join(' · '),
        until: calendarDay(row.closesOn, this.locale, { month: 'short', day: 'numeric' }),
      };
    }),
  );
  protected readonly total = computed(() => this.desk.unplanned()?.total ?? 0);
  protected readonly technicians = computed(() => this.desk.columns().map((it) => it.technician));
  protected readonly past = computed(() => this.desk.day() < this.desk.today());
  protected readonly taskText = taskText;
  protected readonly storesText = storesText;

  protected dayOf(date: string): string {
    return calendarDay(date, this.locale, { month: 'short', day: 'numeric' });
  }

  protected carried(store: Unplanned, chosen: Unplanned['tasks']): Carried {
    return { kind: 'store', store, taskIds: chosen.map(({ id }) => id) };
  }

  protected toggle(storeId: string): void {
    this.opened.update((opened) => flipped(opened, storeId));
  }

  protected take(taskId: string): void {
    this.left.update((left) => flipped(left, taskId));
  }

  protected add(store: Unplanned, chosen: Unplanned['tasks'], technician: Technician): void {
    this.desk.add(
      store,
      chosen.map(({ id }) => id),
      technician,
    );
  }

  /** A visit brought back here is taken off its day. */
  protected dropped({ item }: CdkDragDrop<unknown>): void {
    const carried = item.data as Carried;
    if (carried.kind !== 'visit') return;
    const route = this.desk
      .columns()
      .map((column) => column.route)
      .find((it) => it?.visits.some(({ id }) => id === carried.visit.id));
    if (route) this.desk.remove(route, carried.visit);
  }

  protected more(): void {
    this.desk.shownStores.update((count) => Math.min(200, count + 30));
  }
}

function flipped(set: ReadonlySet<string>, id: string): ReadonlySet<string> {
  const next = new Set(set);
  if (!next.delete(id)) next.add(id);
  return next;
}
