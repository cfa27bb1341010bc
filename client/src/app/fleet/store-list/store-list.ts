import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { ProblemView } from '../../problems/problem-view';
import { Session } from '../../session/session';
import { Cell } from '../../ui/data-table/cell';
import { DataTable } from '../../ui/data-table/data-table';
import { ExportMenu } from '../../ui/data-table/export-menu';
import type { TableColumn } from '../../ui/data-table/table-column';
import { FilterBar } from '../../ui/filter-bar/filter-bar';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import type { StoreQuery, StoreRow } from '../fleet-api';
import { FleetApi } from '../fleet-api';
import { FleetTabs } from '../fleet-tabs/fleet-tabs';
import { inUseWord, standingOptions } from '../fleet-words';
import { groupOptions } from '../group-options';
import { asPage, asPageSize, asStanding, asText, listAddress } from '../list-address';
import { setFilters } from '../set-filters';

/** All stores in sight. */
@Component({
  selector: 'vw-store-list',
  imports: [
    Cell,
    DataTable,
    ExportMenu,
    FilterBar,
    FilterSelect,
    FleetTabs,
    MatButton,
    PageEmpty,
    PageHeader,
    PageLoading,
    ProblemView,
    RouterLink,
  ],
  templateUrl: './store-list.html',
  styleUrl: '../fleet-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StoreList {
  private readonly api = inject(FleetApi);
  private readonly session = inject(Session);
  protected readonly address = listAddress();
  protected readonly mayEdit = this.session.can('fleet.edit');
  protected readonly mayImport = this.session.can('fleet.import');

  readonly q = input('', { transform: asText });
  readonly state = input('', { transform: asText });
  readonly chain = input('', { transform: asText });
  readonly region = input('', { transform: asText });
  readonly sort = input('number', { transform: (value: string | undefined) => value || 'number' });
  readonly page = input(1, { transform: asPage });
  readonly pageSize = input(50, { transform: asPageSize });

  private readonly query = computed<StoreQuery>(() => ({
    q: this.q(),
    state: asStanding(this.state()),
    chain: this.chain() || undefined,
    region: this.region() || undefined,
    sort: this.sort() as StoreQuery['sort'],
    page: this.page(),
    pageSize: this.pageSize(),
  }));
  protected readonly list = this.api.stores(this.query);
  protected readonly shown = computed(() => (this.list.hasValue() ? this.list.value() : null));
  protected readonly csv = computed(() => this.api.storesFile(this.query(), 'csv'));
  protected readonly xlsx = computed(() => this.api.storesFile(this.query(), 'xlsx'));
  protected readonly chains = groupOptions('chains', 'all');
  protected readonly regions = groupOptions('regions', 'all');
  protected readonly states = standingOptions();
  protected readonly inUse = inUseWord();
  protected readonly set = computed(() =>
    setFilters([
      { key: 'chain', value: this.chain(), options: this.chains() },
      { key: 'region', value: this.region(), options: this.regions() },
      { key: 'state', value: this.state(), options: this.states },
    ]),
  );
  protected readonly filtered = computed(() => this.q() !== '' || this.set().length > 0);

  protected readonly columns: readonly TableColumn<StoreRow>[] = [
    { key: 'store', label: $localize`:@@fleet.store:Store`, sort: 'number' },
    {
      key: 'chain',
      label: $localize`:@@fleet.chain:Chain`,
      sort: 'chain',
      choice: 'on',
      text: (row) => row.chainName,
    },
    {
      key: 'region',
      label: $localize`:@@fleet.region:Region`,
      sort: 'region',
      choice: 'on',
      text: (row) => row.regionName,
    },
    {
      key: 'city',
      label: $localize`:@@fleet.city:City`,
      sort: 'city',
      choice: 'on',
      text: (row) => [row.city, row.usState].filter(Boolean).join(', ') || null,
    },
    {
      key: 'postalCode',
      label: $localize`:@@fleet.zip:ZIP code`,
      choice: 'off',
      text: (row) => row.postalCode || null,
    },
    {
      key: 'timeZone',
      label: $localize`:@@fleet.time-zone:Time zone`,
      choice: 'off',
      text: (row) => row.timeZone,
    },
    {
      key: 'units',
      label: $localize`:@@fleet.units:Units`,
      sort: 'units',
      align: 'end',
      text: (row) => row.units,
    },
    {
      key: 'findings',
      label: $localize`:@@fleet.open-findings:Open findings`,
      sort: 'openFindings',
      align: 'end',
      choice: 'on',
    },
  ];
  protected readonly id = (row: StoreRow): string => row.id;
  protected readonly link = (row: StoreRow): readonly unknown[] => ['/fleet/stores', row.id];

  protected clear(): void {
    this.address.drop(this.set().map(({ key }) => key));
  }
}
