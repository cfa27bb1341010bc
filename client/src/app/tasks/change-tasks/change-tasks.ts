import { inject, Injectable, signal } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import type { Observable } from 'rxjs';
import { filter, map, Subject, switchMap } from 'rxjs';
import { newId } from '../../api/new-id';
import { problemWords } from '../../problems/problem-words';
import { Confirm } from '../../ui/confirm-dialog/confirm';
import { Notices } from '../../ui/notice/notices';
import type { Selection, TaskChange } from '../tasks-api';
import { TasksApi } from '../tasks-api';
import type { Assigned } from './assign-dialog';
import { AssignDialog } from './assign-dialog';
import { changedWords } from './change-words';
import type { Deferred } from './defer-dialog';
import { DeferDialog } from './defer-dialog';

/** Which tasks, and how many they are for the words of a question. */
export interface Chosen {
  readonly selection: Selection;
  readonly count: number;
}

const size = { width: '30rem', maxWidth: 'calc(100vw - 24px)' };

/** Assigns, excuses and defers, tells what came of it and takes it back. One for each page. */
@Injectable()
export class ChangeTasks {
  private readonly api = inject(TasksApi);
  private readonly dialog = inject(MatDialog);
  private readonly confirm = inject(Confirm);
  private readonly notices = inject(Notices);
  private readonly happened = new Subject<TaskChange>();

  readonly busy = signal(false);
  /** The last change that left some tasks as they were, until it is closed. */
  readonly incomplete = signal<TaskChange | null>(null);
  /** Something changed or was taken back: read again what is on show. */
  readonly changes: Observable<TaskChange> = this.happened;

  assign({ selection, count }: Chosen): void {
    const asked = this.dialog
      .open<AssignDialog, number, Assigned>(AssignDialog, { data: count, ...size })
      .afterClosed();
    this.run(asked, (answer) => this.api.assign({ id: newId(), selection, ...answer }));
  }

  excuse({ selection, count }: Chosen): void {
    const asked = this.confirm.ask({
      title:
        count === 1
          ? $localize`:@@tasks.excuse-title-one:Excuse 1 task?`
          : $localize`:@@tasks.excuse-title:Excuse ${count}:count: tasks?`,
      text: $localize`:@@tasks.excuse-text:An excused task need not be done and counts neither for nor against the store.`,
      yes: $localize`:@@tasks.excuse:Excuse`,
      no: $localize`:@@tasks.cancel:Cancel`,
      reason: $localize`:@@tasks.reason:Reason`,
    });
    this.run(asked, ({ reason }) => this.api.excuse({ id: newId(), selection, reason }));
  }

  defer({ selection, count }: Chosen): void {
    const asked = this.dialog
      .open<DeferDialog, number, Deferred>(DeferDialog, { data: count, ...size })
      .afterClosed();
    this.run(asked, (answer) => this.api.defer({ id: newId(), selection, ...answer }));
  }

  undo(change: TaskChange): void {
    this.busy.set(true);
    this.api.undo(change.id).subscribe({
      next: (undone) => {
        this.busy.set(false);
        this.incomplete.set(null);
        this.notices.tell({ text: $localize`:@@tasks.taken-back:Taken back.` });
        this.happened.next(undone);
      },
      error: (failure: unknown) => this.fail(failure),
    });
  }

  private run<Answer>(
    asked: Observable<Answer | null | undefined>,
    send: (answer: Answer) => Observable<TaskChange>,
  ): void {
    asked
      .pipe(
        filter((answer) => answer !== null && answer !== undefined),
        map((answer) => {
          this.busy.set(true);
          return answer;
        }),
        switchMap(send),
      )
      .subscribe({
        next: (change) => this.tell(change),
        error: (failure: unknown) => this.fail(failure),
      });
  }

  private tell(change: TaskChange): void {
    this.busy.set(false);
    this.incomplete.set(change.results.some(({ left }) => left !== null) ? change : null);
    if (change.changed > 0) {
      this.notices.offerUndo(changedWords(change.kind, change.changed), () => this.undo(change));
    }
    this.happened.next(change);
  }

  private fail(failure: unknown): void {
    this.busy.set(false);
    const { title, advice } = problemWords(failure);
    this.notices.tell({ text: `${title}. ${advice}`, urgent: true });
  }
}
