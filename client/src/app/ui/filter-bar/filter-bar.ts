import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { outputFromObservable, toObservable } from '@angular/core/rxjs-interop';
import { debounceTime, distinctUntilChanged, filter, map, merge, Subject } from 'rxjs';
import { Icon } from '../icon/icon';

/** A filter now set, as a word that can be taken away. */
export interface SetFilter {
  readonly key: string;
  readonly label: string;
}

/** Milliseconds without a key before the search is asked for. */
const PAUSE = 250;

/**
 * Search, and the filters projected into it (`<vw-filter-select>` and others). On a phone the
 * filters fold away behind a button that says how many are set.
 */
@Component({
  selector: 'vw-filter-bar',
  imports: [Icon],
  templateUrl: './filter-bar.html',
  styleUrl: './filter-bar.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FilterBar {
  /** The search now in the address. */
  readonly search = input('');
  readonly searchLabel = input($localize`:@@ui.filter.search:Search`);
  readonly set = input<readonly SetFilter[]>([]);
  /** Whether anything is projected beside the search. */
  readonly hasFilters = input(true);

  readonly removed = output<string>();
  readonly cleared = output();

  protected readonly open = signal(false);
  private readonly typed = new Subject<string>();
  private readonly entered = new Subject<string>();

  readonly searchChange = outputFromObservable(
    merge(this.typed.pipe(debounceTime(PAUSE)), this.entered, toObservable(this.search)).pipe(
      map((text) => text.trim()),
      distinctUntilChanged(),
      filter((text) => text !== this.search()),
    ),
  );
  protected readonly count = computed(() => this.set().length);

  protected type(event: Event): void {
    this.typed.next((event.target as HTMLInputElement).value);
  }

  protected enter(event: Event): void {
    event.preventDefault();
    this.entered.next((event.target as HTMLInputElement).value);
  }

  protected fold(): void {
    this.open.update((open) => !open);
  }
}
