import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { FormControl, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
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
import { FieldError } from '../form/field-error';
import type { Answer, Question } from './confirm';

/** The dialog behind {@link Confirm}. */
@Component({
  selector: 'vw-confirm-dialog',
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
    ReactiveFormsModule,
  ],
  templateUrl: './confirm-dialog.html',
  styles: `
    mat-form-field {
      width: 100%;
      margin-top: var(--vw-space-4);
    }
    .grave {
      --mat-button-filled-container-color: var(--vw-vermilion);
      --mat-button-filled-label-text-color: var(--vw-on-vermilion);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfirmDialog {
  protected readonly question = inject<Question>(MAT_DIALOG_DATA);
  private readonly ref = inject<MatDialogRef<ConfirmDialog, Answer>>(MatDialogRef);

  protected readonly reason = new FormControl('', {
    nonNullable: true,
    validators: this.question.reason ? [Validators.required, Validators.maxLength(500)] : [],
  });

  protected accept(): void {
    if (this.reason.invalid) {
      this.reason.markAsTouched();
      return;
    }
    this.ref.close({ reason: this.reason.value.trim() });
  }
}
