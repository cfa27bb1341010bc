import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { SetFilter } from '../../ui/filter-bar/filter-bar';
import { FilterBar } from '../../ui/filter-bar/filter-bar';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { Address, EVERYBODY } from '../address';
import { PlaceChoices } from './place-choices';
import { StoreFilter } from './store-filter';

/** Search and the filters by place and hand; a page projects filters of its own after them. */
@Component({
  selector: 'vw-place-filters',
  imports: [FilterBar, FilterSelect, StoreFilter],
  providers: [PlaceChoices],
  template: `
    <vw-filter-bar
      i18n-searchLabel="@@tasks.search"
      searchLabel="Store, unit or rule"
      [search]="address.get('q')"
      [set]="set()"
      (searchChange)="address.ask({ q: $event || null })"
      (removed)="remove($event)"
      (cleared)="clear()"
    >
      @if (choices.regions().length > 1) {
        <vw-filter-select
          i18n-label="@@tasks.filter.region"
          label="Region"
          [options]="choices.regions()"
          [value]="address.get('region')"
          (chosen)="address.ask({ region: $event || null })"
        />
      }
      @if (choices.chains().length > 1) {
        <vw-filter-select
          i18n-label="@@tasks.filter.chain"
          label="Chain"
          [options]="choices.chains()"
          [value]="address.get('chain')"
          (chosen)="address.ask({ chain: $event || null })"
        />
      }
      <vw-store-filter [name]="choices.storeName()" (chosen)="address.ask({ store: $event })" />
      <vw-filter-select
        i18n-label="@@tasks.filter.rule"
        label="Rule"
        [options]="choices.rules()"
        [value]="address.get('rule')"
        (chosen)="address.ask({ rule: $event || null })"
      />
      @if (choices.technicians().length > 0) {
        <vw-filter-select
          i18n-label="@@tasks.filter.technician"
          label="Technician"
          [options]="choices.technicians()"
          [value]="address.get('technician')"
          (chosen)="address.ask({ technician: $event || null })"
        />
      }
      <vw-filter-select
        i18n-label="@@tasks.filter.audience"
        label="Whose hands"
        [options]="audiences()"
        [all]="usualAudience().label"
        [value]="audience()"
        (chosen)="address.ask({ audience: $event || null })"
      />
      <ng-content />
      <ng-content select="[end]" ngProjectAs="[end]" />
    </vw-filter-bar>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlaceFilters {
  protected readonly address = inject(Address);
  protected readonly choices = inject(PlaceChoices);

  /** Whose tasks the page shows when nothing is said: the value of a choice. */
  readonly usual = input(EVERYBODY);
  /** Filters of the page itself that are set. */
  readonly more = input<readonly SetFilter[]>([]);

  protected readonly audiences = computed(() =>
    this.choices.audiences.filter(({ value }) => value !== this.usual()),
  );
  protected readonly usualAudience = computed(
    () =>
      this.choices.audiences.find(({ value }) => value === this.usual()) ?? {
        value: '',
        label: '',
      },
  );
  protected readonly audience = computed(() => {
    const asked = this.address.get('audience');
    return asked === this.usual() ? '' : asked;
  });
  protected readonly set = computed(() => [...this.choices.set(), ...this.more()]);

  protected remove(key: string): void {
    this.address.ask({ [key]: null });
  }

  protected clear(): void {
    this.address.ask(Object.fromEntries(this.set().map(({ key }) => [key, null])));
  }
}
