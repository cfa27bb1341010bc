import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatOption } from '@angular/material/core';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelect } from '@angular/material/select';
import { dateAt } from '@shared/calendar/instant-of';
import { problemWords } from '../../problems/problem-words';
import { Session } from '../../session/session';
import { FieldError } from '../../ui/form/field-error';
import { TasksApi } from '../tasks-api';

export interface Assigned {
  /** Null for nobody. */
  readonly technicianId: string | null;
  readonly reason: string;
}

const NOBODY = 'nobody';

/** Asks to whom tasks are given. The data is how many tasks. */
@Component({
  selector: 'vw-assign-dialog',
  imports: [
    FieldError,
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    ReactiveFormsModule,
  ],
  template: `
    <form [formGroup]="form" (ngSubmit)="accept()" novalidate>
      <h2 mat-dialog-title>
        @if (count === 1) {
          <ng-container i18n="@@tasks.assign-title-one">Assign 1 task</ng-container>
        } @else {
          <ng-container i18n="@@tasks.assign-title">Assign {{ count }} tasks</ng-container>
        }
      </h2>
      <mat-dialog-content>
        <div class="vw-form fields">
          @if (failure(); as words) {
            <p class="fault" role="alert">{{ words }}</p>
          }
          <mat-form-field appearance="outline" subscriptSizing="dynamic">
            <mat-label i18n="@@tasks.assign-to">Technician</mat-label>
            <mat-select formControlName="technician">
              @for (person of technicians(); track person.id) {
                <mat-option [value]="person.id">{{ person.name }}</mat-option>
              }
              <mat-option [value]="nobody" i18n="@@tasks.assign-nobody">nobody</mat-option>
            </mat-select>
            <mat-error><vw-field-error [control]="form.controls.technician" /></mat-error>
          </mat-form-field>
          <mat-form-field appearance="outline" subscriptSizing="dynamic">
            <mat-label i18n="@@tasks.reason-if-any">Reason, if there is one</mat-label>
            <textarea matInput rows="2" formControlName="reason"></textarea>
            <mat-error><vw-field-error [control]="form.controls.reason" /></mat-error>
          </mat-form-field>
        </div>
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" mat-dialog-close i18n="@@tasks.cancel">Cancel</button>
        <button matButton="filled" type="submit" i18n="@@tasks.assign">Assign</button>
      </mat-dialog-actions>
    </form>
  `,
  styles: `
    .fields {
      padding-top: var(--vw-space-2);
    }
    .fault {
      color: var(--vw-vermilion);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AssignDialog {
  private readonly ref = inject<MatDialogRef<AssignDialog, Assigned>>(MatDialogRef);
  protected readonly count = inject<number>(MAT_DIALOG_DATA);
  protected readonly nobody = NOBODY;

  private readonly plan = inject(TasksApi).technicians(
    () => true,
    dateAt(Date.now(), inject(Session).timeZone()),
  );
  protected readonly technicians = computed(() =>
    this.plan.hasValue() ? this.plan.value().technicians : [],
  );
  protected readonly failure = computed(() => {
    const error = this.plan.error();
    return error ? problemWords(error).title : '';
  });
  protected readonly form = new FormGroup({
    technician: new FormControl('', { nonNullable: true, validators: [Validators.required] }),
    reason: new FormControl('', { nonNullable: true, validators: [Validators.maxLength(500)] }),
  });

  protected accept(): void {
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      return;
    }
    const { technician, reason } = this.form.getRawValue();
    this.ref.close({
      technicianId: technician === NOBODY ? null : technician,
      reason: reason.trim(),
    });
  }
}
