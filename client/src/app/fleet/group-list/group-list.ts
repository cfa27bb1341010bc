import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { Session } from '../../session/session';
import { ProblemView } from '../../problems/problem-view';
import { Cell } from '../../ui/data-table/cell';
import { DataTable } from '../../ui/data-table/data-table';
import type { TableColumn } from '../../ui/data-table/table-column';
import { FilterBar } from '../../ui/filter-bar/filter-bar';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import type { Group, GroupKind, GroupQuery } from '../fleet-api';
import { FleetApi } from '../fleet-api';
import { fleetFaultLine, isConflict } from '../fleet-problem';
import { FleetTabs } from '../fleet-tabs/fleet-tabs';
import { groupsWord, inUseWord, standingOptions } from '../fleet-words';
import { asPage, asPageSize, asStanding, asText, listAddress } from '../list-address';
import type { GroupQuestion } from './group-dialog';
import { GroupDialog } from './group-dialog';

/** The chains, or the regions, by the route's data; each leads to its stores. */
@Component({
  selector: 'vw-group-list',
  imports: [
    Cell,
    DataTable,
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
  templateUrl: './group-list.html',
  styleUrl: '../fleet-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GroupList {
  private readonly api = inject(FleetApi);
  private readonly dialog = inject(MatDialog);
  private readonly notices = inject(Notices);
  protected readonly address = listAddress();
  protected readonly kind = inject(ActivatedRoute).snapshot.data['kind'] as GroupKind;
  private readonly filter = this.kind === 'chains' ? 'chain' : 'region';
  private readonly session = inject(Session);

  readonly q = input('', { transform: asText });
  readonly state = input('', { transform: asText });
  readonly sort = input('name', { transform: (value: string | undefined) => value || 'name' });
  readonly page = input(1, { transform: asPage });
  readonly pageSize = input(50, { transform: asPageSize });

  protected readonly list = this.api.groups(this.kind, () => ({
    q: this.q(),
    state: asStanding(this.state()),
    sort: this.sort() as GroupQuery['sort'],
    page: this.page(),
    pageSize: this.pageSize(),
  }));
  protected readonly busy = signal(false);
  protected readonly shown = computed(() => (this.list.hasValue() ? this.list.value() : null));
  /** The server says with each row; before there is one, the role has to do. */
  protected readonly mayAdd = computed(
    () => this.shown()?.rows[0]?.mayEdit ?? this.session.can('fleet.edit'),
  );
  protected readonly filtered = computed(() => this.q() !== '' || this.state() !== '');
  protected readonly states = standingOptions();
  protected readonly inUse = inUseWord();
  protected readonly set = computed(() =>
    this.states
      .filter(({ value }) => value === this.state())
      .map(({ label }) => ({ key: 'state', label })),
  );
  protected readonly words = wordsOf(this.kind);
  protected readonly columns = computed<readonly TableColumn<Group>[]>(() => [
    { key: 'name', label: $localize`:@@fleet.name:Name`, sort: 'name' },
    {
      key: 'stores',
      label: $localize`:@@fleet.stores:Stores`,
      sort: 'stores',
      align: 'end',
      text: (row) => row.stores,
    },
    {
      key: 'units',
      label: $localize`:@@fleet.units:Units`,
      sort: 'units',
      align: 'end',
      text: (row) => row.units,
    },
    ...(this.mayAdd()
      ? [
          {
            key: 'acts',
            label: $localize`:@@fleet.acts:Change`,
            align: 'end' as const,
            phone: 'aside' as const,
          },
        ]
      : []),
  ]);
  protected readonly id = (row: Group): string => row.id;

  protected storesOf(row: Group): Record<string, string> {
    return { [this.filter]: row.id };
  }

  protected begin(): void {
    this.open({ kind: this.kind });
  }

  protected rename(group: Group): void {
    this.open({ kind: this.kind, group });
  }

  protected setRetired(group: Group, retired: boolean): void {
    this.busy.set(true);
    this.api.setGroupRetired(this.kind, group, retired).subscribe({
      next: (saved) => {
        this.busy.set(false);
        this.list.reload();
        if (retired) {
          const text = $localize`:@@fleet.retired-named:${group.name}:name: is retired.`;
          this.notices.offerUndo(text, () => this.setRetired(saved, false));
        }
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        this.notices.tell({ text: fleetFaultLine(failure), urgent: true });
        if (isConflict(failure)) this.list.reload();
      },
    });
  }

  private open(question: GroupQuestion): void {
    this.dialog
      .open<GroupDialog, GroupQuestion, Group>(GroupDialog, { data: question, width: '28rem' })
      .afterClosed()
      .subscribe((saved) => {
        if (saved) this.list.reload();
      });
  }
}

function wordsOf(kind: GroupKind) {
  return kind === 'chains'
    ? {
        title: groupsWord(kind),
        subtitle: $localize`:@@fleet.chains-subtitle:Whose stores they are. An account owner answers for a chain.`,
        add: $localize`:@@fleet.new-chain:New chain`,
        none: $localize`:@@fleet.no-chains:No chains yet`,
        advice: $localize`:@@fleet.no-chains-advice:A chain holds stores. Add one, or import a list of units with its chains and stores.`,
      }
    : {
        title: groupsWord(kind),
        subtitle: $localize`:@@fleet.regions-subtitle:Where technicians drive, across chains.`,
        add: $localize`:@@fleet.new-region:New region`,
        none: $localize`:@@fleet.no-regions:No regions yet`,
        advice: $localize`:@@fleet.no-regions-advice:A region holds stores that the same people look after. Add one, or import a list.`,
      };
}
