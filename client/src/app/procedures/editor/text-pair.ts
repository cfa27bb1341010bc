import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { CdkTextareaAutosize } from '@angular/cdk/text-field';
import { ReactiveFormsModule } from '@angular/forms';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { FieldError } from '../../ui/form/field-error';
import { fieldId } from '../../ui/form/form-faults';
import type { TextPairForm } from './draft-form';

/** One text in English and Spanish, side by side; one under the other where it is narrow. */
@Component({
  selector: 'vw-text-pair',
  imports: [
    CdkTextareaAutosize,
    FieldError,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    ReactiveFormsModule,
  ],
  template: `
    <mat-form-field appearance="outline" subscriptSizing="dynamic">
      <mat-label>{{ label() }} · English</mat-label>
      <textarea
        matInput
        cdkTextareaAutosize
        lang="en"
        [id]="idOf('en')"
        [cdkAutosizeMinRows]="rows()"
        [formControl]="pair().controls.en"
        [maxlength]="longest()"
      ></textarea>
      <mat-error><vw-field-error [control]="pair().controls.en" /></mat-error>
    </mat-form-field>
    <mat-form-field appearance="outline" subscriptSizing="dynamic">
      <mat-label>{{ label() }} · Español</mat-label>
      <textarea
        matInput
        cdkTextareaAutosize
        lang="es"
        [id]="idOf('es')"
        [cdkAutosizeMinRows]="rows()"
        [formControl]="pair().controls.es"
        [maxlength]="longest()"
      ></textarea>
      <mat-error><vw-field-error [control]="pair().controls.es" /></mat-error>
    </mat-form-field>
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: repeat(auto-fit, minmax(min(16rem, 100%), 1fr));
      gap: var(--vw-space-3);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TextPair {
  readonly pair = input.required<TextPairForm>();
  readonly label = input.required<string>();
  /** Path of the pair in the form, for the summary of problems. */
  readonly path = input.required<string>();
  readonly rows = input(1);
  readonly longest = input(400);

  protected idOf(language: 'en' | 'es'): string {
    return fieldId(`${this.path()}.${language}`);
  }
}
