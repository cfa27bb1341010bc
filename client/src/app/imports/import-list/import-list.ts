import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { FleetTabs } from '../../fleet/fleet-tabs/fleet-tabs';
import { asPage, asPageSize, listAddress } from '../../fleet/list-address';
import { ProblemView } from '../../problems/problem-view';
import { Cell } from '../../ui/data-table/cell';
import { DataTable } from '../../ui/data-table/data-table';
import type { TableColumn } from '../../ui/data-table/table-column';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { importKindWord, importStateWord } from '../import-words';
import type { ImportRow } from '../imports-api';
import { ImportsApi } from '../imports-api';

/** What was imported and what is under way, newest first. */
@Component({
  selector: 'vw-import-list',
  imports: [
    Cell,
    DataTable,
    DatePipe,
    FleetTabs,
    MatButton,
    PageEmpty,
    PageHeader,
    PageLoading,
    ProblemView,
    RouterLink,
  ],
  templateUrl: './import-list.html',
  styleUrl: '../../fleet/fleet-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportList {
  protected readonly address = listAddress();

  readonly page = input(1, { transform: asPage });
  readonly pageSize = input(50, { transform: asPageSize });

  protected readonly list = inject(ImportsApi).list(() => ({
    page: this.page(),
    pageSize: this.pageSize(),
  }));
  protected readonly shown = computed(() => (this.list.hasValue() ? this.list.value() : null));
  protected readonly columns: readonly TableColumn<ImportRow>[] = [
    {
      key: 'file',
      label: $localize`:@@imports.col.file:File`,
      text: (row) => row.fileName,
    },
    {
      key: 'kind',
      label: $localize`:@@imports.col.kind:What`,
      text: (row) => importKindWord(row.kind),
    },
    {
      key: 'state',
      label: $localize`:@@imports.col.state:State`,
      text: (row) => importStateWord(row.state),
    },
    {
      key: 'rows',
      label: $localize`:@@imports.col.rows:Rows`,
      align: 'end',
      text: (row) => (row.imported ?? row.checked)?.rows,
    },
    {
      key: 'bad',
      label: $localize`:@@imports.col.bad:With problems`,
      align: 'end',
      text: (row) => (row.imported ?? row.checked)?.badRows,
    },
    {
      key: 'by',
      label: $localize`:@@imports.col.by:Sent by`,
      text: (row) => row.createdBy,
    },
    { key: 'at', label: $localize`:@@imports.col.at:Sent` },
  ];
  protected readonly id = (row: ImportRow): string => row.id;
  protected readonly link = (row: ImportRow): readonly unknown[] => ['/fleet/imports', row.id];
}
