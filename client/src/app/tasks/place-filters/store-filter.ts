import { ChangeDetectionStrategy, Component, inject, input, output, signal } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { MatAutocomplete, MatAutocompleteTrigger } from '@angular/material/autocomplete';
import { MatOption } from '@angular/material/core';
import { catchError, debounceTime, map, of, switchMap } from 'rxjs';
import { TasksApi } from '../tasks-api';

interface StoreChoice {
  readonly id: string;
  readonly number: string;
  readonly name: string;
}

/** Filters by one store, found by its number or name: a chain has too many for a list. */
@Component({
  selector: 'vw-store-filter',
  imports: [MatAutocomplete, MatAutocompleteTrigger, MatOption],
  template: `
    <label class="frame" [class.set]="name() !== ''">
      <span class="label" i18n="@@tasks.filter.store">Store</span>
      <input
        #search
        autocomplete="off"
        spellcheck="false"
        i18n-placeholder="@@tasks.filter.store-any"
        placeholder="all"
        [value]="name()"
        [matAutocomplete]="found"
        (focus)="typed.set(''); search.select()"
        (input)="typed.set(search.value)"
        (blur)="search.value = name()"
      />
    </label>
    <mat-autocomplete
      #found
      autoActiveFirstOption
      [displayWith]="nameOf"
      (optionSelected)="chosen.emit($event.option.value.id)"
    >
      @for (store of stores(); track store.id) {
        <mat-option [value]="store">{{ nameOf(store) }}</mat-option>
      }
    </mat-autocomplete>
  `,
  styles: `
    .frame {
      display: flex;
      align-items: center;
      gap: 6px;
      height: 40px;
      padding-left: 12px;
      background: var(--vw-card);
      border: 1px solid var(--vw-edge);
      border-radius: var(--vw-radius);
    }
    .frame:focus-within {
      outline: 2px solid var(--vw-kelp);
      outline-offset: -1px;
    }
    .set {
      border-color: var(--vw-kelp);
    }
    .label {
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
    }
    input {
      flex: 1;
      width: 9rem;
      min-width: 0;
      height: 100%;
      padding: 0 8px 0 0;
      border: 0;
      background: none;
      color: var(--vw-ink);
      font: inherit;
    }
    input::placeholder {
      color: var(--vw-ink);
      opacity: 1;
    }
    input:focus-visible {
      outline: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StoreFilter {
  private readonly api = inject(TasksApi);

  /** Number and name of the store now set. */
  readonly name = input('');

  readonly chosen = output<string>();

  protected readonly typed = signal<string | null>(null);
  protected readonly stores = toSignal(
    toObservable(this.typed).pipe(
      debounceTime(150),
      switchMap((typed) =>
        typed === null
          ? of([])
          : this.api.stores(typed).pipe(
              map(({ rows }): readonly StoreChoice[] => rows),
              // Without suggestions the search box beside it still finds the store.
              catchError(() => of([])),
            ),
      ),
    ),
    { initialValue: [] as readonly StoreChoice[] },
  );
  protected readonly nameOf = (store: StoreChoice | string | null): string =>
    typeof store === 'object' && store ? `${store.number} ${store.name}` : (store ?? '');
}
