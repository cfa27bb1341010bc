import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
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
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatRadioButton, MatRadioGroup } from '@angular/material/radio';
import { showInForm } from '../../problems/form-problems';
import { ProblemSummary } from '../../ui/form/problem-summary';
import type { CouldNotReason } from '../sheet-words';
import { reasons, reasonWord } from '../sheet-words';
import type { TaskSheet } from '../task-sheet-api';
import { TaskSheetApi } from '../task-sheet-api';

/** Asks why a task could not be done. Closes with true once the server knows. */
@Component({
  selector: 'vw-could-not-dialog',
  imports: [
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatFormField,
    MatInput,
    MatLabel,
    MatRadioButton,
    MatRadioGroup,
    ProblemSummary,
    ReactiveFormsModule,
  ],
  templateUrl: './could-not-dialog.html',
  styles: `
    form,
    mat-radio-group {
      display: grid;
    }
    form {
      gap: var(--vw-space-3);
    }
    mat-radio-button {
      min-height: 44px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CouldNotDialog {
  private readonly api = inject(TaskSheetApi);
  private readonly ref = inject<MatDialogRef<CouldNotDialog, boolean>>(MatDialogRef);
  private readonly sheet = inject<TaskSheet>(MAT_DIALOG_DATA);

  protected readonly reasons = reasons.map((value) => ({ value, label: reasonWord(value) }));
  protected readonly labels = { reason: $localize`:@@task-sheet.reason:Reason` };
  protected readonly form = new FormGroup({
    reason: new FormControl<CouldNotReason | null>(null, Validators.required),
    note: new FormControl('', { nonNullable: true, validators: Validators.maxLength(1000) }),
  });
  protected readonly tries = signal(0);
  protected readonly busy = signal(false);
  protected readonly general = signal<readonly string[]>([]);

  protected send(): void {
    this.tries.update((count) => count + 1);
    this.general.set([]);
    const { reason, note } = this.form.getRawValue();
    if (this.form.invalid || !reason) {
      this.form.markAllAsTouched();
      return;
    }
    this.busy.set(true);
    this.api.couldNot(this.sheet.task.id, { reason, note }).subscribe({
      next: () => this.ref.close(true),
      error: (failure: unknown) => {
        this.busy.set(false);
        this.general.set(showInForm(this.form, failure));
      },
    });
  }
}
