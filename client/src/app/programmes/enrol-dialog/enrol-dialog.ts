import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatAutocomplete, MatAutocompleteTrigger } from '@angular/material/autocomplete';
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
import { dateAt } from '@shared/calendar/instant-of';
import { catchError, debounceTime, of, switchMap } from 'rxjs';
import { newId } from '../../api/new-id';
import { showInForm } from '../../problems/form-problems';
import { Session } from '../../session/session';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { reachWords, scopeWord } from '../programme-words';
import type { Enrolment, PlaceToEnrol, Programme, ScopeKind } from '../programmes-api';
import { ProgrammesApi } from '../programmes-api';

export interface EnrolQuestion {
  readonly programme: Programme;
  /** The enrolment whose dates are to be changed; absent for a new one. */
  readonly enrolment?: Enrolment;
}

/** Puts a place under a programme or takes it out of a wider enrolment, and says how far that reaches. */
@Component({
  selector: 'vw-enrol-dialog',
  imports: [
    FieldError,
    MatAutocomplete,
    MatAutocompleteTrigger,
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
  templateUrl: './enrol-dialog.html',
  styles: `
    .fields {
      padding-top: var(--vw-space-2);
    }
    .dates {
      display: grid;
      grid-template-columns: repeat(auto-fit, minmax(10rem, 1fr));
      gap: var(--vw-space-3);
    }
    .reach {
      color: var(--vw-kelp-deep);
      font-weight: 600;
    }
    .option-note {
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EnrolDialog {
  private readonly api = inject(ProgrammesApi);
  private readonly session = inject(Session);
  private readonly ref = inject<MatDialogRef<EnrolDialog, Programme>>(MatDialogRef);
  protected readonly question = inject<EnrolQuestion>(MAT_DIALOG_DATA);
  private readonly id = newId();

  protected readonly kinds = (['chain', 'region', 'store', 'unit'] as const).map((kind) => ({
    kind,
    word: scopeWord(kind),
  }));
  protected readonly labels = {
    scopeId: $localize`:@@programmes.place:Which one`,
    fromOn: $localize`:@@programmes.from-on:First day`,
    untilOn: $localize`:@@programmes.until-on:Last day, if there is one`,
  };
  protected readonly form = new FormGroup({
    exception: new FormControl(this.question.enrolment?.exception ?? false, { nonNullable: true }),
    scopeId: new FormControl(this.question.enrolment?.scopeId ?? '', {
      nonNullable: true,
      validators: [Validators.required],
    }),
    fromOn: new FormControl(
      this.question.enrolment?.fromOn ?? dateAt(Date.now(), this.session.timeZone()),
      { nonNullable: true, validators: [Validators.required] },
    ),
    untilOn: new FormControl(this.question.enrolment?.untilOn ?? '', { nonNullable: true }),
  });
  protected readonly kind = signal<ScopeKind>(this.question.enrolment?.scopeKind ?? 'region');
  protected readonly typed = signal('');
  protected readonly chosen = signal<PlaceToEnrol | null>(null);
  protected readonly reach = computed(() => {
    const place = this.chosen();
    return place ? reachWords(place.reach) : '';
  });
  protected readonly places = toSignal(
    toObservable(computed(() => ({ kind: this.kind(), q: this.typed() }))).pipe(
      debounceTime(200),
      switchMap(({ kind, q }) =>
        this.api.places(this.question.programme.id, kind, q).pipe(
          // The list is an aid; what is wrong is told when the form is sent.
          catchError(() => of({ rows: [] as PlaceToEnrol[] })),
        ),
      ),
    ),
    { initialValue: { rows: [] as PlaceToEnrol[] } },
  );
  protected readonly busy = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);
  protected readonly labelOf = (place: PlaceToEnrol | string): string =>
    typeof place === 'string' ? place : place.label;
  protected readonly reachOf = (place: PlaceToEnrol): string => reachWords(place.reach);

  protected chooseKind(kind: ScopeKind): void {
    this.kind.set(kind);
    this.choose(null);
    this.typed.set('');
  }

  protected type(text: string): void {
    this.typed.set(text);
    const exact = this.places().rows.find(({ label }) => label === text) ?? null;
    if (exact?.id !== this.chosen()?.id) this.choose(exact);
  }

  protected choose(place: PlaceToEnrol | null): void {
    this.chosen.set(place);
    this.form.controls.scopeId.setValue(place?.id ?? '');
    if (place) this.typed.set(place.label);
  }

  protected save(): void {
    this.general.set([]);
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    const { exception, scopeId, fromOn, untilOn } = this.form.getRawValue();
    const dates = { fromOn, untilOn: untilOn || null };
    const { programme, enrolment } = this.question;
    const saving = enrolment
      ? this.api.editEnrolment(enrolment.id, { ...dates, version: enrolment.version })
      : this.api.enrol(programme.id, {
          id: this.id,
          scopeKind: this.kind(),
          scopeId,
          exception,
          ...dates,
        });
    this.busy.set(true);
    saving.subscribe({
      next: (changed) => this.ref.close(changed),
      error: (failure: unknown) => {
        this.busy.set(false);
        this.general.set(showInForm(this.form, failure));
        this.tries.update((count) => count + 1);
      },
    });
  }
}
