import { ChangeDetectionStrategy, Component, effect, inject, input } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import type { MatAutocompleteSelectedEvent } from '@angular/material/autocomplete';
import { MatAutocomplete, MatAutocompleteTrigger } from '@angular/material/autocomplete';
import { MatOption } from '@angular/material/core';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { catchError, debounceTime, map, of, startWith, switchMap, tap } from 'rxjs';
import { FieldError } from '../../ui/form/field-error';
import type { StoreRow } from '../fleet-api';
import { FleetApi } from '../fleet-api';
import { storeTitle } from '../fleet-words';

/** Chooses one store in use by number, name or city; the control given holds its id, or nothing. */
@Component({
  selector: 'vw-store-picker',
  imports: [
    FieldError,
    MatAutocomplete,
    MatAutocompleteTrigger,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    MatOption,
    ReactiveFormsModule,
  ],
  template: `
    <mat-form-field appearance="outline" subscriptSizing="dynamic">
      <mat-label>{{ label() }}</mat-label>
      <input
        matInput
        autocomplete="off"
        [id]="inputId()"
        [formControl]="text"
        [matAutocomplete]="found"
        (blur)="left()"
      />
      <mat-autocomplete
        #found="matAutocomplete"
        [displayWith]="titleOf"
        (optionSelected)="choose($event)"
      >
        @for (store of stores(); track store.id) {
          <mat-option [value]="store">
            {{ titleOf(store) }}
            <span class="note">{{ store.chainName }} · {{ store.city }}</span>
          </mat-option>
        }
      </mat-autocomplete>
      <mat-error><vw-field-error [control]="control()" /></mat-error>
    </mat-form-field>
  `,
  styles: `
    :host {
      display: block;
    }
    mat-form-field {
      width: 100%;
    }
    .note {
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StorePicker {
  private readonly api = inject(FleetApi);

  readonly control = input.required<FormControl<string>>();
  readonly label = input.required<string>();
  readonly inputId = input.required<string>();
  /** Title of the store that the control holds at the beginning. */
  readonly initial = input('');

  protected readonly text = new FormControl<StoreRow | string>('', { nonNullable: true });
  protected readonly stores = toSignal(
    this.text.valueChanges.pipe(
      tap((typed) => {
        // What is typed over a choice is no choice any more.
        if (typeof typed === 'string' && this.control().value !== '') this.control().setValue('');
      }),
      startWith(''),
      debounceTime(200),
      switchMap((typed) => {
        if (typeof typed !== 'string') return of([typed]);
        return this.api.findStores({ q: typed.trim(), pageSize: 20 }).pipe(
          map(({ rows }) => rows),
          catchError(() => of([])),
        );
      }),
    ),
    { initialValue: [] as StoreRow[] },
  );

  constructor() {
    effect((onCleanup) => {
      const control = this.control();
      // The fault belongs to the control given; the field has to know of it to show it.
      this.text.setValidators(() => control.errors);
      this.text.setValue(this.initial(), { emitEvent: false });
      const watching = control.events.subscribe(() => {
        this.text.updateValueAndValidity({ emitEvent: false });
        if (control.touched) this.text.markAsTouched();
      });
      onCleanup(() => watching.unsubscribe());
    });
  }

  protected readonly titleOf = (store: StoreRow | string): string =>
    typeof store === 'string' ? store : storeTitle(store);

  protected choose({ option }: MatAutocompleteSelectedEvent): void {
    this.control().setValue((option.value as StoreRow).id);
    this.control().markAsDirty();
  }

  protected left(): void {
    this.control().markAsTouched();
  }
}
