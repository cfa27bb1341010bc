import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { CdkTextareaAutosize } from '@angular/cdk/text-field';
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
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { newId } from '../../api/new-id';
import { showInForm } from '../../problems/form-problems';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import type { Programme } from '../programmes-api';
import { ProgrammesApi } from '../programmes-api';

/** Name and description of a programme, new or there already. */
@Component({
  selector: 'vw-programme-dialog',
  imports: [
    CdkTextareaAutosize,
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
    ProblemSummary,
    ReactiveFormsModule,
  ],
  template: `
    <form [formGroup]="form" (ngSubmit)="save()" novalidate>
      <h2 mat-dialog-title>{{ title }}</h2>
      <mat-dialog-content>
        <div class="vw-form fields">
          <vw-problem-summary
            [form]="form"
            [labels]="labels"
            [general]="general()"
            [tries]="tries()"
          />
          <mat-form-field appearance="outline">
            <mat-label>{{ labels.name }}</mat-label>
            <input matInput id="field-name" formControlName="name" autocomplete="off" />
            <mat-error><vw-field-error [control]="form.controls.name" /></mat-error>
          </mat-form-field>
          <mat-form-field appearance="outline">
            <mat-label>{{ labels.description }}</mat-label>
            <textarea
              matInput
              cdkTextareaAutosize
              cdkAutosizeMinRows="2"
              id="field-description"
              formControlName="description"
            ></textarea>
            <mat-error><vw-field-error [control]="form.controls.description" /></mat-error>
          </mat-form-field>
        </div>
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" mat-dialog-close i18n="@@programmes.cancel">Cancel</button>
        <button matButton="filled" type="submit" [disabled]="busy()" i18n="@@programmes.save">
          Save
        </button>
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
export class ProgrammeDialog {
  private readonly api = inject(ProgrammesApi);
  private readonly ref = inject<MatDialogRef<ProgrammeDialog, Programme>>(MatDialogRef);
  private readonly programme = inject<Programme | null>(MAT_DIALOG_DATA);
  private readonly id = newId();

  protected readonly title = this.programme
    ? $localize`:@@programmes.edit-programme:Name and description`
    : $localize`:@@programmes.new-programme:New programme`;
  protected readonly labels = {
    name: $localize`:@@programmes.name:Name`,
    description: $localize`:@@programmes.description:What it is for`,
  };
  protected readonly form = new FormGroup({
    name: new FormControl(this.programme?.name ?? '', {
      nonNullable: true,
      validators: [Validators.required, Validators.maxLength(120)],
    }),
    description: new FormControl(this.programme?.description ?? '', {
      nonNullable: true,
      validators: [Validators.maxLength(2000)],
    }),
  });
  protected readonly busy = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);

  protected save(): void {
    this.general.set([]);
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    const value = this.form.getRawValue();
    const saving = this.programme
      ? this.api.edit(this.programme.id, { ...value, version: this.programme.version })
      : this.api.create({ ...value, id: this.id });
    this.busy.set(true);
    saving.subscribe({
      next: (programme) => this.ref.close(programme),
      error: (failure: unknown) => {
        this.busy.set(false);
        this.general.set(showInForm(this.form, failure));
        this.tries.update((count) => count + 1);
      },
    });
  }
}
