import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import type { ComponentKind } from '@shared/fleet/fleet-words';
import { componentKindWords } from '@shared/fleet/fleet-words';
import { newId } from '../../api/new-id';
import { LanguageChoice } from '../../session/language-choice';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { showFleetFaults } from '../fleet-problem';
import { PartFieldset } from '../part-fields/part-fields';
import { newPart, partFields, partForm, partLabels } from '../part-fields/part-form';
import type { Part } from '../unit-api';
import { UnitApi } from '../unit-api';

export interface PartQuestion {
  readonly unitId: string;
  readonly kind: ComponentKind;
  /** The part to correct; absent for one to fit. */
  readonly part?: Part;
}

/** Fits a part that a unit lacks, or corrects what is written down of one. */
@Component({
  selector: 'vw-part-dialog',
  imports: [
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    PartFieldset,
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
          <vw-part-fields [form]="form" />
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
export class PartDialog {
  private readonly api = inject(UnitApi);
  private readonly ref = inject<MatDialogRef<PartDialog, Part>>(MatDialogRef);
  private readonly question = inject<PartQuestion>(MAT_DIALOG_DATA);
  /** Made once, so that sending twice fits once. */
  private readonly id = newId();

  protected readonly title = titleOf(this.question, inject(LanguageChoice).current);
  protected readonly labels = partLabels();
  protected readonly form = partForm(this.question.kind, this.question.part);
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
    const { part, unitId } = this.question;
    const saving = part
      ? this.api.editPart(part, partFields(this.form))
      : this.api.install(unitId, newPart(this.id, this.form));
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

function titleOf({ kind, part }: PartQuestion, language: 'en' | 'es'): string {
  const word = componentKindWords[kind][language];
  return part
    ? $localize`:@@fleet.part-correct:${word}:kind:: correct what is written down`
    : $localize`:@@fleet.part-add:${word}:kind:: what is fitted`;
}
