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
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { newId } from '../../api/new-id';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import type { Group, GroupKind } from '../fleet-api';
import { FleetApi } from '../fleet-api';
import { showFleetFaults } from '../fleet-problem';

export interface GroupQuestion {
  readonly kind: GroupKind;
  /** The one to rename; absent for a new one. */
  readonly group?: Group;
}

/** Names a chain or a region, new or there already. */
@Component({
  selector: 'vw-group-dialog',
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
          <mat-form-field appearance="outline" subscriptSizing="dynamic">
            <mat-label>{{ labels.name }}</mat-label>
            <input matInput id="field-name" formControlName="name" autocomplete="off" />
            <mat-error><vw-field-error [control]="form.controls.name" /></mat-error>
          </mat-form-field>
        </div>
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" mat-dialog-close i18n="@@fleet.cancel">Cancel</button>
        <button matButton="filled" type="submit" [disabled]="busy()" i18n="@@fleet.save">
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
export class GroupDialog {
  private readonly api = inject(FleetApi);
  private readonly ref = inject<MatDialogRef<GroupDialog, Group>>(MatDialogRef);
  private readonly question = inject<GroupQuestion>(MAT_DIALOG_DATA);
  /** Made once, so that sending twice creates once. */
  private readonly id = newId();

  protected readonly title = titleOf(this.question);
  protected readonly labels = { name: $localize`:@@fleet.name:Name` };
  protected readonly form = new FormGroup({
    name: new FormControl(this.question.group?.name ?? '', {
      nonNullable: true,
      validators: [Validators.required, Validators.maxLength(120)],
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
    const { kind, group } = this.question;
    const value = this.form.getRawValue();
    const saving = group
      ? this.api.editGroup(kind, group.id, { ...value, version: group.version })
      : this.api.createGroup(kind, { ...value, id: this.id });
    this.busy.set(true);
    saving.subscribe({
      next: (saved) => this.ref.close(saved),
      error: (failure: unknown) => {
        this.busy.set(false);
        this.general.set(showFleetFaults(this.form, failure));
        this.tries.update((count) => count + 1);
      },
    });
  }
}

function titleOf({ kind, group }: GroupQuestion): string {
  if (kind === 'chains') {
    return group
      ? $localize`:@@fleet.rename-chain:Rename the chain`
      : $localize`:@@fleet.new-chain:New chain`;
  }
  return group
    ? $localize`:@@fleet.rename-region:Rename the region`
    : $localize`:@@fleet.new-region:New region`;
}
