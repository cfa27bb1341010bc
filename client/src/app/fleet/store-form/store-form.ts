import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  LOCALE_ID,
  signal,
} from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { CdkTextareaAutosize } from '@angular/cdk/text-field';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatOption } from '@angular/material/core';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelect } from '@angular/material/select';
import { Router, RouterLink } from '@angular/router';
import { startWith, switchMap } from 'rxjs';
import { newId } from '../../api/new-id';
import { ProblemView } from '../../problems/problem-view';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageLoading } from '../../ui/page-states/page-loading';
import type { FieldDifference } from '../edit-conflict/edit-conflict';
import { EditConflict } from '../edit-conflict/edit-conflict';
import type { Store } from '../fleet-api';
import { FleetApi } from '../fleet-api';
import { isConflict, showFleetFaults } from '../fleet-problem';
import { storeTitle } from '../fleet-words';
import { groupOptions } from '../group-options';
import { HoursEditor } from './hours-editor';
import { placeOf } from './place-of';
import { storeDifferences, storeLabels } from './store-differences';
import { storeBody, storeForm } from './store-form-model';
import { timeZones } from './time-zones';

/** Adds a store or changes one. */
@Component({
  selector: 'vw-store-form',
  imports: [
    CdkTextareaAutosize,
    EditConflict,
    FieldError,
    HoursEditor,
    MatButton,
    MatCheckbox,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    PageHeader,
    PageLoading,
    ProblemSummary,
    ProblemView,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './store-form.html',
  styleUrl: '../fleet-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StoreFormPage {
  private readonly api = inject(FleetApi);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  private readonly locale = inject(LOCALE_ID);

  /** Absent for a new store. */
  readonly id = input<string>();

  protected readonly resource = this.api.store(() => this.id());
  protected readonly base = signal<Store | null>(null);
  protected readonly form = signal(storeForm());
  protected readonly ready = computed(() => this.id() === undefined || this.base() !== null);
  protected readonly title = computed(() => {
    const base = this.base();
    return base ? storeTitle(base) : $localize`:@@fleet.new-store:New store`;
  });
  protected readonly chains = groupOptions('chains');
  protected readonly regions = groupOptions('regions');
  protected readonly zones = timeZones();
  protected readonly labels = storeLabels();
  protected readonly busy = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);
  protected readonly conflict = signal<{
    readonly theirs: Store;
    readonly differences: readonly FieldDifference[];
  } | null>(null);
  /** Where what was entered so far lies; null while that cannot be said. */
  protected readonly place = toSignal(
    toObservable(this.form).pipe(
      switchMap((form) => form.valueChanges.pipe(startWith(null), placeOf(form, this.api))),
    ),
    { initialValue: undefined },
  );
  /** Made once, so that sending twice creates once. */
  private readonly newId = newId();

  constructor() {
    effect(() => {
      const store = this.resource.hasValue() ? this.resource.value() : null;
      // The form is filled once; later answers of the server must not undo what is being written.
      if (store && this.base() === null) this.fill(store);
    });
  }

  readonly hasUnsavedWork = (): boolean => this.form().dirty;

  protected takeTheirs(theirs: Store): void {
    this.conflict.set(null);
    this.general.set([]);
    this.fill(theirs);
  }

  protected keepMine(theirs: Store): void {
    this.conflict.set(null);
    this.base.set(theirs);
    this.save();
  }

  protected save(): void {
    const form = this.form();
    this.general.set([]);
    // Whether degrees are needed hangs on the box beside them.
    const { latitude, longitude } = form.controls.position.controls;
    latitude.updateValueAndValidity();
    longitude.updateValueAndValidity();
    if (form.invalid) {
      form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    const base = this.base();
    const body = storeBody(form);
    const saving = base
      ? this.api.editStore(base.id, base.version, body)
      : this.api.createStore(this.newId, body);
    this.busy.set(true);
    saving.subscribe({
      next: (saved) => {
        form.markAsPristine();
        this.notices.tell({ text: $localize`:@@fleet.store-saved:Store saved.` });
        void this.router.navigate(['/fleet/stores', saved.id], { replaceUrl: base === null });
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        if (base && isConflict(failure)) this.showConflict(base.id);
        else {
          this.general.set(showFleetFaults(form, failure));
          this.tries.update((count) => count + 1);
        }
      },
    });
  }

  private fill(store: Store): void {
    this.base.set(store);
    this.form.set(storeForm(store));
  }

  private showConflict(id: string): void {
    this.api.readStore(id).subscribe({
      next: (theirs) => {
        const groups = [...this.chains(), ...this.regions()];
        const differences = storeDifferences(theirs, storeBody(this.form()), groups, this.locale);
        this.conflict.set({ theirs, differences });
      },
      error: (failure: unknown) => {
        this.general.set(showFleetFaults(this.form(), failure));
        this.tries.update((count) => count + 1);
      },
    });
  }
}
