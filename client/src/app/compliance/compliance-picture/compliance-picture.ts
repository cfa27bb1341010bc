import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatPaginator, MatPaginatorIntl } from '@angular/material/paginator';
import type { Month } from '@shared/compliance/month';
import { ProblemView } from '../../problems/problem-view';
import { kept } from '../../tasks/kept';
import { TablePages } from '../../ui/data-table/table-pages';
import type { HeatRow } from '../../ui/heat-table/heat-table';
import { HeatTable } from '../../ui/heat-table/heat-table';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { ComplianceAddress } from '../compliance-address';
import { ComplianceApi } from '../compliance-api';
import { ComplianceBar } from '../compliance-bar/compliance-bar';
import { ComplianceWords } from '../compliance-words';
import { countedEnds, tasksBehind } from '../tasks-behind';

/** Stores by months: where compliance slips and where it holds, in one look. */
@Component({
  selector: 'vw-compliance-picture',
  imports: [
    ComplianceBar,
    HeatTable,
    MatPaginator,
    PageEmpty,
    PageHeader,
    PageLoading,
    ProblemView,
  ],
  providers: [ComplianceAddress, { provide: MatPaginatorIntl, useClass: TablePages }],
  templateUrl: './compliance-picture.html',
  styles: `
    vw-compliance-bar,
    vw-heat-table,
    vw-page-loading {
      display: block;
      margin-top: var(--vw-space-4);
    }
    mat-paginator {
      background: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CompliancePicture {
  protected readonly address = inject(ComplianceAddress);
  protected readonly words = inject(ComplianceWords);
  protected readonly picture = inject(ComplianceApi).picture(() => this.address.asked());
  protected readonly shown = kept(this.picture);

  protected readonly columns = computed(() =>
    (this.shown()?.months ?? []).map((month) => this.words.month(month)),
  );
  protected readonly rows = computed<readonly HeatRow[]>(() => {
    const shown = this.shown();
    if (!shown) return [];
    const { store: _store, q: _q, ...filters } = this.address.filters();
    return shown.rows.map((row) => ({
      id: row.storeId,
      label: `${row.number} ${row.name}`,
      link: ['/stores', row.storeId],
      cells: row.cells.map((cell, index) => {
        const month = shown.months[index] as Month;
        const behind = { ...filters, store: row.storeId };
        return {
          rate: cell.rate,
          counts: this.words.of(cell.counts),
          ...(cell.rate === null
            ? {}
            : {
                link: ['/tasks'],
                query: tasksBehind(countedEnds, { from: month, to: month }, behind),
              }),
        };
      }),
    }));
  });
}
