import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatAutocomplete, MatAutocompleteTrigger } from '@angular/material/autocomplete';
import { MatOption } from '@angular/material/core';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelect } from '@angular/material/select';
import { startWith, switchMap } from 'rxjs';
import { LanguageChoice } from '../../session/language-choice';
import { matchingZones } from '../../sign-in/account/time-zones';
import { FieldError } from '../../ui/form/field-error';
import type { DetailsForm } from './details-form';
import { detailsLabels } from './details-form';

/** Name, language, time zone and home place of a person, as fields. */
@Component({
  selector: 'vw-details-fields',
  imports: [
    FieldError,
    MatAutocomplete,
    MatAutocompleteTrigger,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    ReactiveFormsModule,
  ],
  templateUrl: './details-fields.html',
  styles: `
    :host {
      display: grid;
      grid-template-columns: repeat(auto-fit, minmax(16rem, 1fr));
      gap: var(--vw-space-4) var(--vw-space-3);
      align-items: start;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DetailsFields {
  readonly form = input.required<DetailsForm>();
  /** Whether to ask where the person's days begin. */
  readonly withHome = input(true);

  protected readonly labels = detailsLabels();
  protected readonly languages = inject(LanguageChoice).all;
  private readonly typedZone = toSignal(
    toObservable(this.form).pipe(
      switchMap(({ controls: { timeZone } }) =>
        timeZone.valueChanges.pipe(startWith(timeZone.value)),
      ),
    ),
    { initialValue: '' },
  );

  protected zones(): readonly string[] {
    return matchingZones(this.typedZone());
  }
}
