import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
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
import { newId } from '../../api/new-id';
import { showInForm } from '../../problems/form-problems';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import type { SavedView } from './saved-views-api';
import { SavedViewsApi } from './saved-views-api';

export interface ViewQuestion {
  readonly page: string;
  /** The filters to keep. */
  readonly query: string;
  readonly mayShare: boolean;
  /** The view to change; absent for a new one. */
  readonly view?: SavedView;
}

/** Asks for the name of a view and keeps it. */
@Component({
  selector: 'vw-view-dialog',
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
    ProblemSummary,
    ReactiveFormsModule,
  ],
  template: `
    <form [formGroup]="form" (ngSubmit)="save()" novalidate>
      <h2 mat-dialog-title>
        @if (question.view) {
          <ng-container i18n="@@tasks.views.edit">Change the view</ng-container>
        } @else {
          <ng-container i18n="@@tasks.views.save">Save this view</ng-container>
        }
      </h2>
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
            <input matInput id="field-name" autocomplete="off" formControlName="name" />
            <mat-hint i18n="@@tasks.views.hint">It keeps the filters and the order.</mat-hint>
            <mat-error><vw-field-error [control]="form.controls.name" /></mat-error>
          </mat-form-field>
          @if (question.view) {
            <mat-checkbox formControlName="replace" i18n="@@tasks.views.replace">
              Keep the filters now set in it
            </mat-checkbox>
          }
          @if (question.mayShare) {
            <mat-checkbox formControlName="shared" i18n="@@tasks.views.share">
              Offer it to everybody here; each sees only their own stores
            </mat-checkbox>
          }
        </div>
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" mat-dialog-close i18n="@@tasks.cancel">Cancel</button>
        <button
          matButton="filled"
          type="submit"
          [disabled]="busy()"
          i18n="@@tasks.views.save-button"
        >
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
export class ViewDialog {
  private readonly api = inject(SavedViewsApi);
  private readonly ref = inject<MatDialogRef<ViewDialog, SavedView>>(MatDialogRef);
  protected readonly question = inject<ViewQuestion>(MAT_DIALOG_DATA);
  private readonly id = newId();

  protected readonly labels = { name: $localize`:@@tasks.views.name:Name` };
  protected readonly form = new FormGroup({
    name: new FormControl(this.question.view?.name ?? '', {
      nonNullable: true,
      validators: [Validators.required, Validators.maxLength(80)],
    }),
    replace: new FormControl(false, { nonNullable: true }),
    shared: new FormControl(this.question.view?.shared ?? false, { nonNullable: true }),
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
    const { name, replace, shared } = this.form.getRawValue();
    const { view, query, page } = this.question;
    const saving = view
      ? this.api.edit({ ...view, name, shared, query: replace ? query : view.query })
      : this.api.save({ id: this.id, page, name, query, shared });
    this.busy.set(true);
    saving.subscribe({
      next: (saved) => this.ref.close(saved),
      error: (failure: unknown) => {
        this.busy.set(false);
        this.general.set(showInForm(this.form, failure));
        this.tries.update((count) => count + 1);
      },
    });
  }
}
