import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatOptgroup, MatOption } from '@angular/material/core';
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
import { dateAt } from '@shared/calendar/instant-of';
import { causes } from '@shared/findings/cause';
import { componentKindWords, removalReasons } from '@shared/fleet/fleet-words';
import type { Observable } from 'rxjs';
import { newId } from '../../api/new-id';
import { LanguageChoice } from '../../session/language-choice';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { showFleetFaults } from '../fleet-problem';
import { causeWord } from '../fleet-words';
import { PartFieldset } from '../part-fields/part-fields';
import { partFields, partForm, partLabels } from '../part-fields/part-form';
import type { Part, Removal } from '../unit-api';
import { UnitApi } from '../unit-api';

export interface RemovalQuestion {
  readonly part: Part;
  /** Zone of the store, whose day it is. */
  readonly timeZone: string;
  /** Whether a new part goes in on the same day. */
  readonly replace: boolean;
}

/** Takes a part off, with the day and the cause, and fits the new one where there is one. */
@Component({
  selector: 'vw-removal-dialog',
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
    MatOptgroup,
    MatOption,
    MatSelect,
    PartFieldset,
    ProblemSummary,
    ReactiveFormsModule,
  ],
  templateUrl: './removal-dialog.html',
  styles: `
    .fields {
      padding-top: var(--vw-space-2);
    }
    .pair {
      display: grid;
      grid-template-columns: repeat(auto-fit, minmax(11rem, 1fr));
      gap: var(--vw-space-4) var(--vw-space-3);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RemovalDialog {
  private readonly api = inject(UnitApi);
  private readonly ref = inject<MatDialogRef<RemovalDialog, Part>>(MatDialogRef);
  protected readonly question = inject<RemovalQuestion>(MAT_DIALOG_DATA);
  private readonly language = inject(LanguageChoice).current;
  /** Made once, so that sending twice fits once. */
  private readonly newId = newId();

  protected readonly kindWord = componentKindWords[this.question.part.kind][this.language];
  protected readonly causes = causes.map((value) => this.option(value));
  protected readonly reasons = removalReasons.map((value) => this.option(value));
  protected readonly labels: Readonly<Record<string, string>> = {
    removedOn: $localize`:@@fleet.removed-on:Came off on`,
    cause: $localize`:@@fleet.cause:Cause`,
    ...Object.fromEntries(
      Object.entries(partLabels()).map(([path, label]) => [`fitted.${path}`, label]),
    ),
  };
  protected readonly form = new FormGroup({
    removedOn: new FormControl<string>(dateAt(Date.now(), this.question.timeZone), {
      nonNullable: true,
      validators: [Validators.required],
    }),
    cause: new FormControl<Removal['cause'] | ''>('', {
      nonNullable: true,
      validators: [Validators.required],
    }),
    /** Like the old one until it is said otherwise, but for what is the part's own. */
    fitted: partForm(this.question.part.kind, {
      ...this.question.part,
      serialNumber: '',
      installedOn: this.question.part.installedOn,
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
    this.busy.set(true);
    this.send().subscribe({
      next: (saved) => this.ref.close(saved),
      error: (failure: unknown) => {
        this.busy.set(false);
        this.general.set(showFleetFaults(this.form, failure));
        this.tries.update((count) => count + 1);
      },
    });
  }

  private send(): Observable<Part> {
    const { part, replace } = this.question;
    const { removedOn, cause } = this.form.getRawValue();
    const removal: Removal = {
      version: part.version,
      removedOn,
      cause: cause as Removal['cause'],
    };
    if (!replace) return this.api.remove(part.id, removal);
    const { installedOn: _installedOn, ...fitted } = partFields(this.form.controls.fitted);
    return this.api.replace(part.id, { ...removal, fitted: { ...fitted, id: this.newId } });
  }

  private option(value: Removal['cause']) {
    return { value, label: causeWord(value, this.language) };
  }
}
