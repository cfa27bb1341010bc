import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { addDays } from '@shared/calendar/calendar-date';
import { dateAt } from '@shared/calendar/instant-of';
import { Session } from '../../session/session';
import { FieldError } from '../../ui/form/field-error';

export interface Deferred {
  readonly dueOn: string;
  readonly reason: string;
}

/** Asks to which day tasks are moved and why. The data is how many tasks. */
@Component({
  selector: 'vw-defer-dialog',
  imports: [
    FieldError,
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    ReactiveFormsModule,
  ],
  template: `
    <form [formGroup]="form" (ngSubmit)="accept()" novalidate>
      <h2 mat-dialog-title>
        @if (count === 1) {
          <ng-container i18n="@@tasks.defer-title-one">Defer 1 task</ng-container>
        } @else {
          <ng-container i18n="@@tasks.defer-title">Defer {{ count }} tasks</ng-container>
        }
      </h2>
      <mat-dialog-content>
        <div class="vw-form fields">
          <mat-form-field appearance="outline" subscriptSizing="dynamic">
            <mat-label i18n="@@tasks.defer-to">New due day</mat-label>
            <input matInput type="date" formControlName="dueOn" [min]="tomorrow" />
            <mat-hint i18n="@@tasks.defer-hint"
              >The window moves along; the next occurrence stays where the rule puts it.</mat-hint
            >
            <mat-error><vw-field-error [control]="form.controls.dueOn" /></mat-error>
          </mat-form-field>
          <mat-form-field appearance="outline" subscriptSizing="dynamic">
            <mat-label i18n="@@tasks.reason">Reason</mat-label>
            <textarea matInput rows="3" formControlName="reason"></textarea>
            <mat-error><vw-field-error [control]="form.controls.reason" /></mat-error>
          </mat-form-field>
        </div>
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" mat-dialog-close i18n="@@tasks.cancel">Cancel</button>
        <button matButton="filled" type="submit" i18n="@@tasks.defer">Defer</button>
      </mat-dialog-actions>
    </form>
  `,
  styles: `
    .fields {
      padding-top: var(--vw-space-2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DeferDialog {
  private readonly ref = inject<MatDialogRef<DeferDialog, Deferred>>(MatDialogRef);
  protected readonly count = inject<number>(MAT_DIALOG_DATA);

  protected readonly tomorrow = addDays(dateAt(Date.now(), inject(Session).timeZone()), 1);
  protected readonly form = new FormGroup({
    dueOn: new FormControl('', { nonNullable: true, validators: [Validators.required] }),
    reason: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.maxLength(500)],
    }),
  });

  protected accept(): void {
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      return;
    }
    const { dueOn, reason } = this.form.getRawValue();
    this.ref.close({ dueOn, reason: reason.trim() });
  }
}
