import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
} from '@angular/core';
import type { ComponentKind, PumpFace } from '@shared/fleet/fleet-words';
import {
  componentKinds,
  componentKindWords,
  pumpFaces,
  pumpFaceWords,
} from '@shared/fleet/fleet-words';
import { ProblemView } from '../../problems/problem-view';
import { LanguageChoice } from '../../session/language-choice';
import { Cell } from '../../ui/data-table/cell';
import { DataTable } from '../../ui/data-table/data-table';
import { ExportMenu } from '../../ui/data-table/export-menu';
import type { TableColumn } from '../../ui/data-table/table-column';
import { FilterBar } from '../../ui/filter-bar/filter-bar';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { dayWords } from '../day-pipe';
import { FleetTabs } from '../fleet-tabs/fleet-tabs';
import { causeWord, nameplateWords } from '../fleet-words';
import { groupOptions } from '../group-options';
import { asPage, asPageSize, asStanding, asText, listAddress } from '../list-address';
import { setFilters } from '../set-filters';
import type { PartQuery, PartRow } from '../unit-api';
import { UnitApi } from '../unit-api';

/** All pumps, motors, pans and hoses in sight; each leads to its unit. */
@Component({
  selector: 'vw-part-list',
  imports: [
    Cell,
    DataTable,
    ExportMenu,
    FilterBar,
    FilterSelect,
    FleetTabs,
    PageEmpty,
    PageHeader,
    PageLoading,
    ProblemView,
  ],
  templateUrl: './part-list.html',
  styleUrl: '../fleet-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PartList {
  private readonly api = inject(UnitApi);
  private readonly locale = inject(LOCALE_ID);
  private readonly language = inject(LanguageChoice).current;
  protected readonly address = listAddress();

  readonly q = input('', { transform: asText });
  readonly state = input('', { transform: asText });
  readonly chain = input('', { transform: asText });
  readonly region = input('', { transform: asText });
  readonly kind = input('', { transform: asText });
  readonly face = input('', { transform: asText });
  readonly sort = input('store', { transform: (value: string | undefined) => value || 'store' });
  readonly page = input(1, { transform: asPage });
  readonly pageSize = input(50, { transform: asPageSize });

  private readonly query = computed<PartQuery>(() => ({
    q: this.q(),
    state: asStanding(this.state()),
    chain: this.chain() || undefined,
    region: this.region() || undefined,
    kind: (this.kind() as ComponentKind) || undefined,
    face: (this.face() as PumpFace) || undefined,
    sort: this.sort() as PartQuery['sort'],
    page: this.page(),
    pageSize: this.pageSize(),
  }));
  protected readonly list = this.api.parts(this.query);
  protected readonly shown = computed(() => (this.list.hasValue() ? this.list.value() : null));
  protected readonly csv = computed(() => this.api.partsFile(this.query(), 'csv'));
  protected readonly xlsx = computed(() => this.api.partsFile(this.query(), 'xlsx'));
  protected readonly chains = groupOptions('chains', 'all');
  protected readonly regions = groupOptions('regions', 'all');
  protected readonly kinds = componentKinds.map((value) => ({
    value,
    label: componentKindWords[value][this.language],
  }));
  protected readonly faces = pumpFaces.map((value) => ({
    value,
    label: pumpFaceWords[value][this.language],
  }));
  protected readonly states = [
    { value: 'retired', label: $localize`:@@fleet.part-state.gone:Came off` },
    { value: 'all', label: $localize`:@@fleet.part-state.all:Fitted and come off` },
  ];
  protected readonly fittedNow = $localize`:@@fleet.part-state.fitted:Fitted now`;
  protected readonly set = computed(() =>
    setFilters([
      { key: 'chain', value: this.chain(), options: this.chains() },
      { key: 'region', value: this.region(), options: this.regions() },
      { key: 'kind', value: this.kind(), options: this.kinds },
      { key: 'face', value: this.face(), options: this.faces },
      { key: 'state', value: this.state(), options: this.states },
    ]),
  );
  protected readonly filtered = computed(() => this.q() !== '' || this.set().length > 0);
  protected readonly columns: readonly TableColumn<PartRow>[] = [
    {
      key: 'kind',
      label: $localize`:@@fleet.part:Part`,
      sort: 'kind',
      text: (row) => componentKindWords[row.kind][this.language],
    },
    {
      key: 'serial',
      label: $localize`:@@fleet.serial:Serial number`,
      sort: 'serial',
      text: (row) => row.serialNumber || null,
    },
    {
      key: 'model',
      label: $localize`:@@fleet.model:Model`,
      sort: 'model',
      choice: 'on',
      text: (row) => row.model || null,
    },
    { key: 'store', label: $localize`:@@fleet.store:Store`, sort: 'store' },
    {
      key: 'unit',
      label: $localize`:@@fleet.unit:Unit`,
      choice: 'on',
      text: (row) => row.unitTag,
    },
    {
      key: 'face',
      label: $localize`:@@fleet.pump-face:Face of the pump`,
      choice: 'off',
      text: (row) => (row.pumpFace ? pumpFaceWords[row.pumpFace][this.language] : null),
    },
    {
      key: 'nameplate',
      label: $localize`:@@fleet.nameplate:Nameplate`,
      choice: 'off',
      text: (row) => nameplateWords(row.nameplate, this.locale) || null,
    },
    {
      key: 'installed',
      label: $localize`:@@fleet.fitted-on:Fitted on`,
      sort: 'installed',
      text: (row) => dayWords(row.installedOn, this.locale),
    },
    {
      key: 'removed',
      label: $localize`:@@fleet.removed-on:Came off on`,
      sort: 'removed',
      choice: 'on',
      text: (row) => dayWords(row.removedOn, this.locale),
    },
    {
      key: 'cause',
      label: $localize`:@@fleet.cause:Cause`,
      choice: 'on',
      text: (row) => causeWord(row.removalCause, this.language) || null,
    },
  ];
  protected readonly id = (row: PartRow): string => row.id;
  protected readonly link = (row: PartRow): readonly unknown[] => ['/fleet/units', row.unitId];

  protected clear(): void {
    this.address.drop(this.set().map(({ key }) => key));
  }
}
