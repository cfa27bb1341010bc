import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import type { Observable } from 'rxjs';
import { map } from 'rxjs';
import { ConfirmDialog } from './confirm-dialog';

export interface Question {
  readonly title: string;
  readonly text: string;
  /** The act by its own name ("Retire the unit"), never a bare OK. */
  readonly yes: string;
  readonly no?: string;
  /** Marks an act that cannot be undone. */
  readonly grave?: boolean;
  /** Asks for a reason in words and refuses to go on without one. */
  readonly reason?: string;
}

export interface Answer {
  readonly reason: string;
}

/** Asks before an act that cannot be undone. Where it can be, offer undo instead. */
@Injectable({ providedIn: 'root' })
export class Confirm {
  private readonly dialog = inject(MatDialog);

  /** Emits once: the answer, or null for no. */
  ask(question: Question): Observable<Answer | null> {
    return (
      this.dialog
        .open<ConfirmDialog, Question, Answer>(ConfirmDialog, {
          data: question,
          width: '28rem',
          maxWidth: 'calc(100vw - 32px)',
          autoFocus: question.reason ? 'textarea' : '[data-no]',
          role: 'alertdialog',
        })
        .afterClosed()
        // A button that only closes the dialog answers with an empty text.
        .pipe(map((answer) => answer || null))
    );
  }
}
