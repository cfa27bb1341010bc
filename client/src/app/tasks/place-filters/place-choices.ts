import { computed, inject, Injectable } from '@angular/core';
import { dateAt } from '@shared/calendar/instant-of';
import { Session } from '../../session/session';
import type { FilterOption } from '../../ui/filter-bar/filter-select';
import { Address, EVERYBODY } from '../address';
import { TasksApi } from '../tasks-api';

/** What the filters by place and hand can be set to, and the names of what is set. */
@Injectable()
export class PlaceChoices {
  private readonly api = inject(TasksApi);
  private readonly address = inject(Address);
  private readonly session = inject(Session);

  private readonly allRegions = this.api.regions();
  private readonly allChains = this.api.chains();
  private readonly allRules = this.api.rules();
  private readonly plan = this.api.technicians(
    () => this.session.can('visits.plan'),
    dateAt(Date.now(), this.session.timeZone()),
  );
  private readonly chosenStore = this.api.store(() => this.address.get('store'));

  readonly regions = computed(() =>
    named(this.allRegions.hasValue() && this.allRegions.value().rows),
  );
  readonly chains = computed(() => named(this.allChains.hasValue() && this.allChains.value().rows));
  readonly rules = computed(() => named(this.allRules.hasValue() && this.allRules.value().rows));
  readonly technicians = computed(() =>
    named(this.plan.hasValue() && this.plan.value().technicians),
  );
  readonly audiences: readonly FilterOption[] = [
    { value: 'technician', label: $localize`:@@tasks.audience.technician:technicians` },
    { value: 'store', label: $localize`:@@tasks.audience.store:store staff` },
    { value: EVERYBODY, label: $localize`:@@tasks.audience.everybody:everybody` },
  ];
  /** Number and name of the store that is filtered by; empty without one. */
  readonly storeName = computed(() => {
    if (!this.address.get('store')) return '';
    if (!this.chosenStore.hasValue()) return $localize`:@@tasks.one-store:one store`;
    const { number, name } = this.chosenStore.value();
    return `${number} ${name}`;
  });

  /** The filters now set, in words. */
  readonly set = computed(() =>
    [
      { key: 'region', label: this.label(this.regions(), 'region') },
      { key: 'chain', label: this.label(this.chains(), 'chain') },
      { key: 'store', label: this.storeName() },
      { key: 'rule', label: this.label(this.rules(), 'rule') },
      { key: 'technician', label: this.label(this.technicians(), 'technician') },
      { key: 'audience', label: this.label(this.audiences, 'audience') },
    ].filter(({ label }) => label !== ''),
  );

  private label(options: readonly FilterOption[], key: string): string {
    const value = this.address.get(key);
    if (!value) return '';
    return options.find((option) => option.value === value)?.label ?? '…';
  }
}

function named(
  rows: false | readonly { readonly id: string; readonly name: string }[],
): readonly FilterOption[] {
  return rows ? rows.map(({ id, name }) => ({ value: id, label: name })) : [];
}
