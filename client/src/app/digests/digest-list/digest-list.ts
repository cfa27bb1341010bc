import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { formatChange } from '@shared/digests/format-change';
import { formatMonth } from '@shared/mail/format-moment';
import { ProblemView } from '../../problems/problem-view';
import { LanguageChoice } from '../../session/language-choice';
import { kept } from '../../tasks/kept';
import { Cell } from '../../ui/data-table/cell';
import { DataTable } from '../../ui/data-table/data-table';
import type { TableColumn } from '../../ui/data-table/table-column';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { RatePipe } from '../../ui/text/rate-pipe';
import type { DigestRow } from '../digests-api';
import { DigestsApi } from '../digests-api';

/** The digests of the chains that a person answers for, the newest month first. */
@Component({
  selector: 'vw-digest-list',
  imports: [
    Cell,
    DataTable,
    FilterSelect,
    MatButton,
    PageEmpty,
    PageHeader,
    PageLoading,
    ProblemView,
    RouterLink,
  ],
  providers: [RatePipe],
  templateUrl: './digest-list.html',
  styles: `
    vw-data-table {
      display: block;
      margin-top: var(--vw-space-4);
    }
    .falling {
      color: var(--vw-amber-ink);
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DigestList {
  private readonly router = inject(Router);
  private readonly rate = inject(RatePipe);
  private readonly language = inject(LanguageChoice).current;

  readonly chain = input('', { transform: (value?: string) => value ?? '' });
  readonly page = input(1, { transform: (value?: string) => Number(value) || 1 });
  readonly pageSize = input(50, { transform: (value?: string) => Number(value) || 50 });

  protected readonly list = inject(DigestsApi).list(() => ({
    chain: this.chain() || undefined,
    page: this.page(),
    pageSize: this.pageSize(),
  }));
  protected readonly shown = kept(this.list);
  protected readonly chains = computed(() =>
    (this.shown()?.chains ?? []).map(({ id, name }) => ({ value: id, label: name })),
  );

  protected readonly columns: readonly TableColumn<DigestRow>[] = [
    {
      key: 'month',
      label: $localize`:@@digests.col.month:Month`,
      text: (row) => formatMonth(row.month, this.language),
    },
    {
      key: 'chain',
      label: $localize`:@@digests.chain:Chain`,
      text: (row) => row.chainName,
    },
    {
      key: 'rate',
      label: $localize`:@@digests.col.rate:On time`,
      align: 'end',
      phone: 'aside',
      text: (row) => this.rate.transform(row.rate),
    },
    {
      key: 'change',
      label: $localize`:@@digests.col.change:Against the month before`,
      align: 'end',
    },
    {
      key: 'overdue',
      label: $localize`:@@digests.col.overdue:Overdue at its end`,
      align: 'end',
      text: (row) => row.overdue,
    },
    {
      key: 'findings',
      label: $localize`:@@digests.col.findings:Findings`,
      align: 'end',
      text: (row) => row.findings,
    },
  ];
  protected readonly id = (row: DigestRow): string => row.id;
  protected readonly link = (row: DigestRow): readonly unknown[] => ['/digests', row.id];

  protected change(row: DigestRow): string {
    return formatChange(row.change, this.language);
  }

  protected ask(change: Readonly<Record<string, string | number | null>>): void {
    void this.router.navigate([], { queryParams: change, queryParamsHandling: 'merge' });
  }
}
