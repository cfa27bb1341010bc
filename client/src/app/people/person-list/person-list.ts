import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { roles } from '@shared/access/role';
import { groupOptions } from '../../fleet/group-options';
import { asPage, asPageSize, asText, listAddress } from '../../fleet/list-address';
import { setFilters } from '../../fleet/set-filters';
import { ProblemView } from '../../problems/problem-view';
import { roleWord } from '../../session/role-word';
import { Session } from '../../session/session';
import { kept } from '../../tasks/kept';
import { Cell } from '../../ui/data-table/cell';
import { DataTable } from '../../ui/data-table/data-table';
import { ExportMenu } from '../../ui/data-table/export-menu';
import type { TableColumn } from '../../ui/data-table/table-column';
import { FilterBar } from '../../ui/filter-bar/filter-bar';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import type { PeopleQuery, PersonRow } from '../people-api';
import { PeopleApi } from '../people-api';
import { grantWords, standingOptions, standingWord } from '../people-words';

/** Roles named in the table; the rest is counted and stands on the person's page. */
const NAMED = 2;

/** The people in sight, with their roles. */
@Component({
  selector: 'vw-person-list',
  imports: [
    Cell,
    DataTable,
    ExportMenu,
    FilterBar,
    FilterSelect,
    MatButton,
    PageEmpty,
    PageHeader,
    PageLoading,
    ProblemView,
    RouterLink,
    TimeInZonePipe,
  ],
  templateUrl: './person-list.html',
  styleUrl: './person-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonList {
  private readonly api = inject(PeopleApi);
  private readonly session = inject(Session);
  protected readonly address = listAddress();
  protected readonly mayInvite = this.session.can('people.edit');
  protected readonly timeZone = this.session.timeZone;

  readonly q = input('', { transform: asText });
  readonly role = input('', { transform: asText });
  readonly region = input('', { transform: asText });
  readonly chain = input('', { transform: asText });
  /** Without it those who can or will be able to sign in are shown. */
  readonly standing = input('', { transform: asText });
  readonly sort = input('name', { transform: (value: string | undefined) => value || 'name' });
  readonly page = input(1, { transform: asPage });
  readonly pageSize = input(50, { transform: asPageSize });

  private readonly query = computed<PeopleQuery>(() => ({
    q: this.q(),
    role: (this.role() || undefined) as PeopleQuery['role'],
    region: this.region() || undefined,
    chain: this.chain() || undefined,
    standing: (this.standing() || undefined) as PeopleQuery['standing'],
    sort: this.sort() as PeopleQuery['sort'],
    page: this.page(),
    pageSize: this.pageSize(),
  }));
  protected readonly list = this.api.list(this.query);
  protected readonly shown = kept(this.list);
  protected readonly csv = computed(() => this.api.file(this.query(), 'csv'));
  protected readonly xlsx = computed(() => this.api.file(this.query(), 'xlsx'));

  protected readonly roles = roles.map((value) => ({ value, label: roleWord(value) }));
  protected readonly regions = groupOptions('regions');
  protected readonly chains = groupOptions('chains');
  protected readonly standings = standingOptions();
  protected readonly present = $localize`:@@people.standing.present:active and invited`;
  protected readonly set = computed(() =>
    setFilters([
      { key: 'role', value: this.role(), options: this.roles },
      { key: 'region', value: this.region(), options: this.regions() },
      { key: 'chain', value: this.chain(), options: this.chains() },
      { key: 'standing', value: this.standing(), options: this.standings },
    ]),
  );
  protected readonly filtered = computed(() => this.q() !== '' || this.set().length > 0);

  protected readonly columns: readonly TableColumn<PersonRow>[] = [
    { key: 'name', label: $localize`:@@people.name:Name`, sort: 'name' },
    { key: 'roles', label: $localize`:@@people.roles:Roles` },
    {
      key: 'email',
      label: $localize`:@@people.email:E-mail`,
      sort: 'email',
      choice: 'on',
      text: (row) => row.email,
    },
    { key: 'standing', label: $localize`:@@people.standing:Sign-in`, phone: 'aside' },
    {
      key: 'lastSeenAt',
      label: $localize`:@@people.last-seen:Last seen`,
      sort: 'lastSeenAt',
      choice: 'on',
    },
    {
      key: 'home',
      label: $localize`:@@people.home:Home ZIP code`,
      choice: 'off',
      phone: 'none',
      text: (row) => row.homePostalCode,
    },
    {
      key: 'locale',
      label: $localize`:@@people.language:Language of letters`,
      choice: 'off',
      phone: 'none',
      text: (row) => (row.locale === 'es' ? 'Español' : 'English'),
    },
  ];
  protected readonly id = (row: PersonRow): string => row.id;
  protected readonly link = (row: PersonRow): readonly unknown[] => ['/people', row.id];
  protected readonly standingWord = standingWord;

  protected named(row: PersonRow): readonly string[] {
    return row.roles.slice(0, NAMED).map(grantWords);
  }

  protected unnamed(row: PersonRow): number {
    return Math.max(0, row.roles.length - NAMED);
  }

  protected clear(): void {
    this.address.drop(['q', ...this.set().map(({ key }) => key)]);
  }
}
