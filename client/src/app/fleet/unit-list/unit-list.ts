import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { PumpFace, UnitKind } from '@shared/fleet/fleet-words';
import { pumpFaces, pumpFaceWords, unitKinds, unitKindWords } from '@shared/fleet/fleet-words';
import { ProblemView } from '../../problems/problem-view';
import { LanguageChoice } from '../../session/language-choice';
import { Session } from '../../session/session';
import { Cell } from '../../ui/data-table/cell';
import { DataTable } from '../../ui/data-table/data-table';
import { ExportMenu } from '../../ui/data-table/export-menu';
import { FilterBar } from '../../ui/filter-bar/filter-bar';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { DayPipe } from '../day-pipe';
import { FleetTabs } from '../fleet-tabs/fleet-tabs';
import { inUseWord, standingOptions } from '../fleet-words';
import { groupOptions } from '../group-options';
import { asPage, asPageSize, asStanding, asText, listAddress } from '../list-address';
import { setFilters } from '../set-filters';
import type { UnitQuery, UnitRow } from '../unit-api';
import { UnitApi } from '../unit-api';
import { unitColumns } from './unit-columns';

/** All units in sight. */
@Component({
  selector: 'vw-unit-list',
  imports: [
    Cell,
    DataTable,
    DayPipe,
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
    TimeInZonePipe,
  ],
  templateUrl: './unit-list.html',
  styleUrl: '../fleet-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnitList {
  private readonly api = inject(UnitApi);
  private readonly session = inject(Session);
  private readonly language = inject(LanguageChoice).current;
  protected readonly address = listAddress();
  protected readonly mayEdit = this.session.can('fleet.edit');
  protected readonly mayImport = this.session.can('fleet.import');

  readonly q = input('', { transform: asText });
  readonly state = input('', { transform: asText });
  readonly chain = input('', { transform: asText });
  readonly region = input('', { transform: asText });
  readonly kind = input('', { transform: asText });
  readonly face = input('', { transform: asText });
  readonly service = input('', { transform: asText });
  readonly sort = input('store', { transform: (value: string | undefined) => value || 'store' });
  readonly page = input(1, { transform: asPage });
  readonly pageSize = input(50, { transform: asPageSize });

  private readonly query = computed<UnitQuery>(() => ({
    q: this.q(),
    state: asStanding(this.state()),
    chain: this.chain() || undefined,
    region: this.region() || undefined,
    kind: (this.kind() as UnitKind) || undefined,
    face: (this.face() as PumpFace) || undefined,
    service: (this.service() as 'in' | 'out') || undefined,
    sort: this.sort() as UnitQuery['sort'],
    page: this.page(),
    pageSize: this.pageSize(),
  }));
  protected readonly list = this.api.units(this.query);
  protected readonly shown = computed(() => (this.list.hasValue() ? this.list.value() : null));
  protected readonly csv = computed(() => this.api.unitsFile(this.query(), 'csv'));
  protected readonly xlsx = computed(() => this.api.unitsFile(this.query(), 'xlsx'));
  protected readonly chains = groupOptions('chains', 'all');
  protected readonly regions = groupOptions('regions', 'all');
  protected readonly kinds = unitKinds.map((value) => ({
    value,
    label: unitKindWords[value][this.language],
  }));
  protected readonly faces = pumpFaces.map((value) => ({
    value,
    label: pumpFaceWords[value][this.language],
  }));
  protected readonly services = [
    { value: 'in', label: $localize`:@@fleet.service.in:In service` },
    { value: 'out', label: $localize`:@@fleet.service.out:Out of service` },
  ];
  protected readonly states = standingOptions();
  protected readonly inUse = inUseWord();
  protected readonly set = computed(() =>
    setFilters([
      { key: 'chain', value: this.chain(), options: this.chains() },
      { key: 'region', value: this.region(), options: this.regions() },
      { key: 'kind', value: this.kind(), options: this.kinds },
      { key: 'face', value: this.face(), options: this.faces },
      { key: 'service', value: this.service(), options: this.services },
      { key: 'state', value: this.state(), options: this.states },
    ]),
  );
  protected readonly filtered = computed(() => this.q() !== '' || this.set().length > 0);
  protected readonly columns = unitColumns(this.language);
  protected readonly id = (row: UnitRow): string => row.id;
  protected readonly link = (row: UnitRow): readonly unknown[] => ['/fleet/units', row.id];

  protected clear(): void {
    this.address.drop(this.set().map(({ key }) => key));
  }
}
