import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatAutocomplete, MatAutocompleteTrigger } from '@angular/material/autocomplete';
import { MatButton } from '@angular/material/button';
import { MatOption } from '@angular/material/core';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelect } from '@angular/material/select';
import { finalize } from 'rxjs';
import { toSignal } from '@angular/core/rxjs-interop';
import { showInForm } from '../../problems/form-problems';
import { LanguageChoice } from '../../session/language-choice';
import { Session } from '../../session/session';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { Notices } from '../../ui/notice/notices';
import { AccountApi } from '../account-api';
import { isTimeZone, matchingZones } from './time-zones';

/** Name, language of letters, and the zone in which times are shown. */
@Component({
  selector: 'vw-details-form',
  imports: [
    FieldError,
    MatAutocomplete,
    MatAutocompleteTrigger,
    MatButton,
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
  templateUrl: './details-form.html',
  styleUrl: './section.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DetailsForm {
  private readonly api = inject(AccountApi);
  private readonly session = inject(Session);
  private readonly notices = inject(Notices);
  protected readonly languages = inject(LanguageChoice).all;

  private readonly person = this.session.person();
  protected readonly email = this.person?.email ?? '';
  protected readonly form = new FormGroup({
    name: new FormControl(this.person?.name ?? '', {
      nonNullable: true,
      validators: [Validators.required, Validators.maxLength(120)],
    }),
    locale: new FormControl(this.person?.locale ?? 'en', { nonNullable: true }),
    timeZone: new FormControl(this.person?.timeZone ?? '', {
      nonNullable: true,
      validators: [
        Validators.required,
        (control) =>
          isTimeZone(String(control.value))
            ? null
            : { words: $localize`:@@sign-in.zone-unknown:Choose a zone from the list.` },
      ],
    }),
  });
  protected readonly labels = {
    name: $localize`:@@sign-in.name:Your name`,
    locale: $localize`:@@sign-in.mail-language:Language of letters to you`,
    timeZone: $localize`:@@sign-in.time-zone:Time zone`,
  };
  protected readonly pending = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);

  private readonly typed = toSignal(this.form.controls.timeZone.valueChanges, {
    initialValue: this.form.controls.timeZone.value,
  });

  protected zones(): readonly string[] {
    return matchingZones(this.typed());
  }

  protected save(): void {
    this.general.set([]);
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    this.pending.set(true);
    this.api
      .saveDetails(this.form.getRawValue())
      .pipe(finalize(() => this.pending.set(false)))
      .subscribe({
        next: () => {
          void this.session.refresh();
          this.notices.tell({ text: $localize`:@@sign-in.details-saved:Saved.` });
        },
        error: (failure: unknown) => {
          this.general.set(showInForm(this.form, failure));
          this.tries.update((count) => count + 1);
        },
      });
  }
}
