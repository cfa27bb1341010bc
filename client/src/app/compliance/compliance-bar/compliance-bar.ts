import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { FilterOption } from '../../ui/filter-bar/filter-select';
import { FilterBar, type SetFilter } from '../../ui/filter-bar/filter-bar';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { Icon } from '../../ui/icon/icon';
import type { IconName } from '../../ui/icon/icon-paths';
import { ComplianceAddress } from '../compliance-address';
import { ComplianceApi } from '../compliance-api';
import { MonthRange } from '../month-range/month-range';

type View = 'table' | 'picture';

/** Months, view and filters of the compliance pages. The groupings of the table are projected. */
@Component({
  selector: 'vw-compliance-bar',
  imports: [FilterBar, FilterSelect, Icon, MonthRange, RouterLink],
  templateUrl: './compliance-bar.html',
  styleUrl: './compliance-bar.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComplianceBar {
  protected readonly address = inject(ComplianceAddress);
  private readonly named = inject(ComplianceApi).filters(() => this.address.get('store'));

  readonly current = input.required<View>();

  protected readonly searchLabel = $localize`:@@compliance.search:Store number or name`;
  protected readonly views: readonly {
    readonly key: View;
    readonly path: string;
    readonly icon: IconName;
    readonly label: string;
  }[] = [
    {
      key: 'table',
      path: '/compliance',
      icon: 'table',
      label: $localize`:@@compliance.view.table:Table`,
    },
    {
      key: 'picture',
      path: '/compliance/picture',
      icon: 'board',
      label: $localize`:@@compliance.view.picture:Stores by month`,
    },
  ];
  protected readonly audiences: readonly FilterOption[] = [
    { value: 'technician', label: $localize`:@@compliance.audience.technician:technicians` },
    { value: 'store', label: $localize`:@@compliance.audience.store:store staff` },
  ];

  private readonly words = computed(() => (this.named.hasValue() ? this.named.value() : undefined));
  protected readonly chains = computed(() => optionsOf(this.words()?.chains));
  protected readonly regions = computed(() => optionsOf(this.words()?.regions));
  protected readonly rules = computed(() => optionsOf(this.words()?.rules));

  /** What goes along to the other view. */
  protected readonly carried = computed(() => ({ ...this.address.months(), ...this.places() }));
  private readonly places = computed(() =>
    Object.fromEntries(Object.entries(this.address.filters()).filter(([, value]) => value !== '')),
  );

  protected readonly set = computed<readonly SetFilter[]>(() => {
    const { store, chain, region, rule, audience } = this.address.filters();
    const labelled = (key: string, value: string | undefined, options: readonly FilterOption[]) => {
      const label = options.find((option) => option.value === value)?.label;
      return value && label ? [{ key, label }] : [];
    };
    const of = this.words()?.store;
    const named = of ? `${of.number} ${of.name}` : $localize`:@@compliance.one-store:one store`;
    return [
      ...(store ? [{ key: 'store', label: named }] : []),
      ...labelled('chain', chain, this.chains()),
      ...labelled('region', region, this.regions()),
      ...labelled('rule', rule, this.rules()),
      ...labelled('audience', audience, this.audiences),
    ];
  });

  protected remove(key: string): void {
    this.address.ask({ [key]: null });
  }
}

function optionsOf(all: readonly { id: string; name: string }[] | undefined): FilterOption[] {
  return (all ?? []).map(({ id, name }) => ({ value: id, label: name }));
}
