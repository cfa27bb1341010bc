import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { Router } from '@angular/router';
import { problemWords } from '../../problems/problem-words';
import { Session } from '../../session/session';
import { Cell } from '../../ui/data-table/cell';
import type { PageChange } from '../../ui/data-table/data-table';
import { DataTable } from '../../ui/data-table/data-table';
import type { TableColumn } from '../../ui/data-table/table-column';
import { FilterBar } from '../../ui/filter-bar/filter-bar';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageError } from '../../ui/page-states/page-error';
import { PageLoading } from '../../ui/page-states/page-loading';
import { ProgrammeDialog } from '../programme-dialog/programme-dialog';
import type { Programme, ProgrammeQuery, ProgrammeRow } from '../programmes-api';
import { ProgrammesApi } from '../programmes-api';

const text = (value: string | undefined): string => value ?? '';

/** All programmes with how far each reaches. */
@Component({
  selector: 'vw-programme-list',
  imports: [
    Cell,
    DataTable,
    FilterBar,
    FilterSelect,
    MatButton,
    PageEmpty,
    PageError,
    PageHeader,
    PageLoading,
  ],
  templateUrl: './programme-list.html',
  styles: `
    vw-data-table {
      margin-top: var(--vw-space-3);
    }
    .described {
      display: block;
      font-weight: 400;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProgrammeList {
  private readonly api = inject(ProgrammesApi);
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialog);
  protected readonly mayEdit = inject(Session).can('programmes.edit');

  readonly q = input('', { transform: text });
  readonly state = input('', { transform: text });
  readonly sort = input('name', { transform: (value: string | undefined) => value || 'name' });
  readonly page = input(1, { transform: (value: string | undefined) => Number(value) || 1 });
  readonly pageSize = input(50, { transform: (value: string | undefined) => Number(value) || 50 });

  protected readonly list = this.api.list(() => ({
    q: this.q(),
    state: (this.state() || 'live') as ProgrammeQuery['state'],
    sort: this.sort() as ProgrammeQuery['sort'],
    page: this.page(),
    pageSize: this.pageSize(),
  }));
  protected readonly shown = computed(() => (this.list.hasValue() ? this.list.value() : null));
  protected readonly fault = computed(() => {
    const error = this.list.error();
    return error ? problemWords(error) : null;
  });
  protected readonly filtered = computed(() => this.q() !== '' || this.state() !== '');
  protected readonly set = computed(() =>
    this.states
      .filter(({ value }) => value === this.state())
      .map(({ label }) => ({ key: 'state', label })),
  );

  protected readonly columns: readonly TableColumn<ProgrammeRow>[] = [
    { key: 'name', label: $localize`:@@programmes.col.name:Programme`, sort: 'name' },
    {
      key: 'rules',
      label: $localize`:@@programmes.col.rules:Rules`,
      sort: 'rules',
      align: 'end',
      text: (row) => row.rules,
    },
    {
      key: 'enrolments',
      label: $localize`:@@programmes.col.enrolments:Enrolments`,
      align: 'end',
      choice: 'on',
      text: (row) => row.enrolments,
    },
    {
      key: 'stores',
      label: $localize`:@@programmes.col.stores:Stores`,
      sort: 'stores',
      align: 'end',
      text: (row) => row.reach.stores,
    },
    {
      key: 'units',
      label: $localize`:@@programmes.col.units:Units`,
      sort: 'units',
      align: 'end',
      text: (row) => row.reach.units,
    },
  ];
  protected readonly states = [
    { value: 'retired', label: $localize`:@@programmes.state.retired:Retired` },
    { value: 'all', label: $localize`:@@programmes.state.all:All, retired too` },
  ];
  protected readonly inUse = $localize`:@@programmes.state.live:In use`;
  protected readonly id = (row: ProgrammeRow): string => row.id;
  protected readonly link = (row: ProgrammeRow): readonly unknown[] => ['/programmes', row.id];

  protected ask(change: Readonly<Record<string, string | number | null>>): void {
    void this.router.navigate([], {
      queryParams: { page: null, ...change },
      queryParamsHandling: 'merge',
    });
  }

  protected turn({ page, pageSize }: PageChange): void {
    this.ask({ page, pageSize });
  }

  protected begin(): void {
    this.dialog
      .open<ProgrammeDialog, Programme | null, Programme>(ProgrammeDialog, {
        data: null,
        width: '32rem',
      })
      .afterClosed()
      .subscribe((made) => {
        if (made) void this.router.navigate(['/programmes', made.id]);
      });
  }
}
