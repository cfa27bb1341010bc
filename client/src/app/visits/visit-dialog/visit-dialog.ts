import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatOption } from '@angular/material/core';
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
import { MatSelect } from '@angular/material/select';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { VatGlyph } from '../../ui/vat-glyph/vat-glyph';
import type { Technician, Visit } from '../visits-api';
import { taskText } from '../visit-words';

export interface VisitQuestion {
  readonly visit: Visit;
  readonly technicianId: string;
  readonly onDate: string;
  readonly technicians: readonly Technician[];
  /** The present date: no visit is planned before it. */
  readonly today: string;
}

export interface VisitAnswer {
  readonly note: string;
  readonly taskIds: readonly string[];
  readonly technicianId: string;
  readonly onDate: string;
}

/** Changes what a visit holds, says, and whose day it is on. */
@Component({
  selector: 'vw-visit-dialog',
  imports: [
    FieldError,
    MatButton,
    MatCheckbox,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    ProblemSummary,
    ReactiveFormsModule,
    VatGlyph,
  ],
  templateUrl: './visit-dialog.html',
  styles: `
    .fields {
      padding-top: var(--vw-space-2);
    }
    fieldset {
      margin: 0;
      padding: 0;
      border: 0;
    }
    legend {
      padding: 0;
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
    }
    .task {
      display: flex;
      gap: var(--vw-space-2);
      align-items: center;
    }
    .fault {
      color: var(--vw-vermilion);
      font-size: var(--vw-text-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VisitDialog {
  protected readonly question = inject<VisitQuestion>(MAT_DIALOG_DATA);
  private readonly ref = inject<MatDialogRef<VisitDialog, VisitAnswer>>(MatDialogRef);

  protected readonly form = new FormGroup({
    technicianId: new FormControl(this.question.technicianId, { nonNullable: true }),
    onDate: new FormControl(this.question.onDate, {
      nonNullable: true,
      validators: [
        Validators.required,
        (control) =>
          String(control.value) >= this.question.today
            ? null
            : { words: $localize`:@@visits.fault.past:This day is over.` },
      ],
    }),
    note: new FormControl(this.question.visit.note, {
      nonNullable: true,
      validators: Validators.maxLength(500),
    }),
    taskIds: new FormControl<readonly string[]>(
      this.question.visit.tasks.map(({ id }) => id),
      {
        nonNullable: true,
        validators: (control) =>
          (control.value as readonly string[]).length > 0
            ? null
            : {
                words: $localize`:@@visits.fault.no-task:Keep at least one task, or take the visit off its day.`,
              },
      },
    ),
  });
  protected readonly labels = {
    technicianId: $localize`:@@visits.technician:Technician`,
    onDate: $localize`:@@visits.day:Day`,
    note: $localize`:@@visits.note:Note for the technician`,
    taskIds: $localize`:@@visits.tasks-label:Tasks`,
  };
  protected readonly tries = signal(0);
  protected readonly taskText = taskText;

  protected isDone(task: Visit['tasks'][number]): boolean {
    return task.state === 'done' || task.state === 'done-late';
  }

  protected toggle(id: string): void {
    const { taskIds } = this.form.controls;
    const next = new Set(taskIds.value);
    if (!next.delete(id)) next.add(id);
    taskIds.setValue([...next]);
    taskIds.markAsTouched();
  }

  protected save(): void {
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    this.ref.close(this.form.getRawValue());
  }
}
