import { ChangeDetectionStrategy, Component, computed, inject, LOCALE_ID } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { RouterLink } from '@angular/router';
import { ProblemView } from '../../problems/problem-view';
import { PageLoading } from '../../ui/page-states/page-loading';
import { dayText } from '../due-text/due-text';
import { TaskLines } from '../task-lines/task-lines';
import type { TaskQuery } from '../tasks-api';
import { TasksApi } from '../tasks-api';

export interface CellQuestion {
  readonly storeName: string;
  readonly date: string;
  /** The board's filters with this store. */
  readonly filters: TaskQuery;
}

/** The tasks of one cell of the board. */
@Component({
  selector: 'vw-cell-dialog',
  imports: [
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    PageLoading,
    ProblemView,
    RouterLink,
    TaskLines,
  ],
  template: `
    <h2 mat-dialog-title>{{ question.storeName }}</h2>
    <mat-dialog-content>
      <p class="vw-secondary day">{{ day }}</p>
      @if (list.error(); as failure) {
        <vw-problem-view [failure]="failure" (again)="list.reload()" />
      } @else if (tasks(); as tasks) {
        @if (tasks.length > 0) {
          <vw-task-lines [tasks]="tasks" [showStore]="false" (followed)="ref.close()" />
        } @else {
          <p i18n="@@tasks.month.nothing">Nothing is due on this day.</p>
        }
      } @else {
        <vw-page-loading [lines]="2" />
      }
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <a
        matButton
        routerLink="/tasks"
        [queryParams]="inTable"
        (click)="ref.close()"
        i18n="@@tasks.month.in-table"
        >This day in the table</a
      >
      <button matButton="filled" type="button" mat-dialog-close i18n="@@tasks.close">Close</button>
    </mat-dialog-actions>
  `,
  styles: `
    .day {
      margin-bottom: var(--vw-space-2);
    }
    .day::first-letter {
      text-transform: uppercase;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CellDialog {
  protected readonly question = inject<CellQuestion>(MAT_DIALOG_DATA);
  protected readonly ref = inject<MatDialogRef<CellDialog>>(MatDialogRef);

  protected readonly day = dayText(this.question.date, inject(LOCALE_ID), { dateStyle: 'full' });
  protected readonly inTable = {
    ...this.question.filters,
    from: this.question.date,
    to: this.question.date,
  };
  protected readonly list = inject(TasksApi).list(() => ({ ...this.inTable, pageSize: 200 }));
  protected readonly tasks = computed(() => (this.list.hasValue() ? this.list.value().rows : null));
}
