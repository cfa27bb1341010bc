import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatOption } from '@angular/material/core';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelect } from '@angular/material/select';
import { pumpFaces, pumpFaceWords } from '@shared/fleet/fleet-words';
import { LanguageChoice } from '../../session/language-choice';
import { FieldError } from '../../ui/form/field-error';
import { fieldId } from '../../ui/form/form-faults';
import type { PartForm } from './part-form';
import { partLabels } from './part-form';

/** The fields of one part, by its kind. */
@Component({
  selector: 'vw-part-fields',
  imports: [
    FieldError,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    ReactiveFormsModule,
  ],
  templateUrl: './part-fields.html',
  styles: `
    .fields {
      display: grid;
      grid-template-columns: repeat(auto-fit, minmax(11rem, 1fr));
      gap: var(--vw-space-4) var(--vw-space-3);
    }
    .plate {
      grid-template-columns: repeat(auto-fit, minmax(8rem, 1fr));
      margin: var(--vw-space-4) 0 0;
      padding: 0;
      border: 0;
    }
    legend {
      margin-bottom: var(--vw-space-3);
      padding: 0;
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PartFieldset {
  protected readonly language = inject(LanguageChoice).current;

  readonly form = input.required<PartForm>();
  /** Path of the part in the whole form, for the ids of its fields. */
  readonly path = input('');
  /** Whether the day of fitting is asked for; a replacement has it from the removal. */
  readonly withDay = input(true);

  protected readonly labels = partLabels();
  protected readonly faces = pumpFaces;
  protected readonly faceWords = pumpFaceWords;
  protected readonly figures = [
    { name: 'volts', step: '1' },
    { name: 'amps', step: '0.1' },
    { name: 'horsepower', step: 'any' },
    { name: 'rpm', step: '1' },
  ] as const;

  protected id(name: string): string {
    return fieldId(this.path() ? `${this.path()}.${name}` : name);
  }
}
