import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
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
import type { ComponentKind } from '@shared/procedures/step-kind';
import { newId } from '../../api/new-id';
import { showInForm } from '../../problems/form-problems';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { FindingWords } from '../finding-words';
import type { Finding, Settlement } from '../findings-api';
import { FindingsApi } from '../findings-api';
import { centsOf, isMoney } from './cents';

/** What the dialog answers: the finding as it is now, and whether a repair stands behind it. */
export interface Settled {
  readonly finding: Finding;
  readonly repaired: boolean;
}

/** Says what was done about a finding: in words alone, or with the repair that was made. */
@Component({
  selector: 'vw-settle-dialog',
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
  ],
  templateUrl: './settle-dialog.html',
  styleUrl: './settle-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SettleDialog {
  private readonly api = inject(FindingsApi);
  private readonly ref = inject<MatDialogRef<SettleDialog, Settled>>(MatDialogRef);
  protected readonly words = inject(FindingWords);
  protected readonly finding = inject<Finding>(MAT_DIALOG_DATA);
  private readonly repairId = newId();

  protected readonly labels = {
    note: $localize`:@@findings.what-done:What was done`,
    'repair.cause': $localize`:@@findings.cause-confirmed:Cause, now that it was opened`,
    'repair.minutes': $localize`:@@findings.minutes:Minutes of work`,
    'repair.parts': $localize`:@@findings.parts:Parts, $`,
    'repair.labour': $localize`:@@findings.labour:Labour, $`,
  };
  protected readonly form = new FormGroup({
    note: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.maxLength(2000)],
    }),
    repaired: new FormControl(false, { nonNullable: true }),
    repair: new FormGroup({
      cause: new FormControl(this.finding.cause, { nonNullable: true }),
      replaced: new FormControl<ComponentKind[]>([], { nonNullable: true }),
      minutes: new FormControl<number | null>(null, [Validators.min(0), Validators.max(1440)]),
      parts: new FormControl('', { nonNullable: true, validators: [isMoney] }),
      labour: new FormControl('', { nonNullable: true, validators: [isMoney] }),
    }),
  });
  protected readonly repaired = toSignal(this.form.controls.repaired.valueChanges, {
    initialValue: false,
  });
  protected readonly busy = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);

  constructor() {
    this.form.controls.repair.disable();
    this.form.controls.repaired.valueChanges.subscribe((on) => {
      if (on) this.form.controls.repair.enable();
      else this.form.controls.repair.disable();
    });
  }

  protected save(): void {
    this.general.set([]);
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    const repair = this.repair();
    const body: Settlement = {
      version: this.finding.version,
      note: this.form.controls.note.value.trim(),
      repair,
    };
    this.busy.set(true);
    this.api.settle(this.finding.id, body).subscribe({
      next: (finding) => this.ref.close({ finding, repaired: repair !== null }),
      error: (failure: unknown) => {
        this.busy.set(false);
        this.general.set(showInForm(this.form, failure));
        this.tries.update((count) => count + 1);
      },
    });
  }

  private repair(): Settlement['repair'] {
    const { repaired, repair } = this.form.getRawValue();
    if (!repaired) return null;
    return {
      id: this.repairId,
      cause: repair.cause,
      replaced: repair.replaced,
      minutes: repair.minutes,
      partsCents: centsOf(repair.parts) ?? 0,
      labourCents: centsOf(repair.labour) ?? 0,
    };
  }
}
