import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
} from '@angular/core';
import { takeUntilDestroyed, toObservable, toSignal } from '@angular/core/rxjs-interop';
import type { ValidatorFn } from '@angular/forms';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatAutocomplete, MatAutocompleteTrigger } from '@angular/material/autocomplete';
import { MatButton } from '@angular/material/button';
import { MatOption } from '@angular/material/core';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatRadioButton, MatRadioGroup } from '@angular/material/radio';
import { MatSelect } from '@angular/material/select';
import { Router, RouterLink } from '@angular/router';
import type { Cause, Severity } from '@shared/findings/cause';
import type { ComponentKind } from '@shared/procedures/step-kind';
import { catchError, debounceTime, distinctUntilChanged, map, of, switchMap } from 'rxjs';
import { newId } from '../../api/new-id';
import { showInForm } from '../../problems/form-problems';
import { Caution } from '../../ui/caution/caution';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { PageHeader } from '../../ui/page-header/page-header';
import { FindingWords } from '../finding-words';
import type { StoreChoice } from '../findings-api';
import { FindingsApi } from '../findings-api';

const text = (value: string | undefined): string => value ?? '';
const idOf = (store: StoreChoice | string): string => (typeof store === 'string' ? '' : store.id);
const isChosen: ValidatorFn = ({ value }) =>
  idOf(value as StoreChoice | string)
    ? null
    : { words: $localize`:@@findings.store-from-list:Choose a store from the list.` };
const needed = { nonNullable: true as const, validators: [Validators.required] };

/** Writes down what somebody saw outside an inspection. `?store=` and `?unit=` come filled in. */
@Component({
  selector: 'vw-report-form',
  imports: [
    Caution,
    FieldError,
    MatAutocomplete,
    MatAutocompleteTrigger,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    MatOption,
    MatRadioButton,
    MatRadioGroup,
    MatSelect,
    PageHeader,
    ProblemSummary,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './report-form.html',
  styleUrl: './report-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReportForm {
  private readonly api = inject(FindingsApi);
  private readonly router = inject(Router);
  protected readonly words = inject(FindingWords);
  private readonly id = newId();

  readonly store = input('', { transform: text });
  readonly unit = input('', { transform: text });

  protected readonly nameOf = (store: StoreChoice | string): string =>
    typeof store === 'string' ? store : `${store.number} ${store.name}`;
  protected readonly labels = {
    storeId: $localize`:@@findings.store:Store`,
    unitId: $localize`:@@findings.unit:Unit`,
    cause: $localize`:@@findings.cause:What it looks like`,
    severity: $localize`:@@findings.severity:How urgent it is`,
    note: $localize`:@@findings.note:What you saw`,
  };
  protected readonly form = new FormGroup({
    storeId: new FormControl<StoreChoice | string>('', {
      nonNullable: true,
      validators: [Validators.required, isChosen],
    }),
    unitId: new FormControl('', { nonNullable: true }),
    componentKind: new FormControl<ComponentKind | ''>('', { nonNullable: true }),
    cause: new FormControl<Cause | ''>('', needed),
    severity: new FormControl<Severity | ''>('', needed),
    note: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.maxLength(2000)],
    }),
  });

  private readonly entered = toSignal(this.form.controls.storeId.valueChanges, {
    initialValue: '' as const,
  });
  private readonly typed = computed(() => this.nameOf(this.entered()));
  private readonly storeId = computed(() => idOf(this.entered()));
  protected readonly severity = toSignal(this.form.controls.severity.valueChanges, {
    initialValue: '' as const,
  });
  protected readonly stores = toSignal(
    toObservable(this.typed).pipe(
      debounceTime(200),
      switchMap((typed) =>
        this.api.stores(typed).pipe(
          map(({ rows }) => rows),
          // The list is an aid; a store that cannot be chosen is told when the form is sent.
          catchError(() => of<readonly StoreChoice[]>([])),
        ),
      ),
    ),
    { initialValue: [] as readonly StoreChoice[] },
  );
  private readonly given = this.api.store(() => this.store());
  private readonly unitList = this.api.units(() => this.storeId());
  protected readonly units = computed(() =>
    this.unitList.hasValue() ? this.unitList.value().rows : [],
  );
  protected readonly busy = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);
  private sent = false;

  readonly hasUnsavedWork = (): boolean => this.form.dirty && !this.sent;

  constructor() {
    effect(() => {
      if (this.given.hasValue()) this.form.controls.storeId.setValue(this.given.value());
    });
    effect(() => {
      const [only, another] = this.stores();
      // Who answers for one store is not asked which.
      if (only && !another && this.typed() === '' && !this.store()) {
        this.form.controls.storeId.setValue(only);
      }
    });
    // A unit belongs to the store it was chosen in.
    this.form.controls.storeId.valueChanges
      .pipe(map(idOf), distinctUntilChanged(), takeUntilDestroyed())
      .subscribe(() => this.form.controls.unitId.setValue(''));
    effect(() => {
      if (this.units().some(({ id }) => id === this.unit())) {
        this.form.controls.unitId.setValue(this.unit());
      }
    });
  }

  protected save(): void {
    this.general.set([]);
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    const { storeId, unitId, componentKind, cause, severity, note } = this.form.getRawValue();
    this.busy.set(true);
    this.api
      .report({
        id: this.id,
        storeId: idOf(storeId),
        unitId: unitId || null,
        componentKind: unitId ? componentKind || null : null,
        cause: cause as Cause,
        severity: severity as Severity,
        note: note.trim(),
        photoIds: [],
      })
      .subscribe({
        next: ({ id }) => {
          this.sent = true;
          void this.router.navigate(['/findings', id], { replaceUrl: true });
        },
        error: (failure: unknown) => {
          this.busy.set(false);
          this.general.set(showInForm(this.form, failure));
          this.tries.update((count) => count + 1);
        },
      });
  }
}
