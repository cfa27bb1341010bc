import { DatePipe, NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { monthsIn } from '@shared/compliance/month';
import type { WindowCounts } from '@shared/compliance/on-time-rate';
import { ProblemView } from '../../problems/problem-view';
import { kept } from '../../tasks/kept';
import { Cell } from '../../ui/data-table/cell';
import { DataTable } from '../../ui/data-table/data-table';
import { ExportMenu } from '../../ui/data-table/export-menu';
import type { TableColumn } from '../../ui/data-table/table-column';
import { Figure } from '../../ui/figure/figure';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { heatStep } from '../../ui/heat-table/heat-step';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { ComplianceAddress } from '../compliance-address';
import type { ComplianceQuery, ComplianceRow, Grouping } from '../compliance-api';
import { ComplianceApi } from '../compliance-api';
import { ComplianceBar } from '../compliance-bar/compliance-bar';
import { ComplianceWords } from '../compliance-words';
import { countedEnds, tasksBehind, type WindowEnd } from '../tasks-behind';
import { complianceColumns, endWord } from './compliance-columns';

const groupings: readonly Grouping[] = ['store', 'region', 'chain', 'rule'];

/** On-time rates by store, region, chain or rule, each with the numbers it is made of. */
@Component({
  selector: 'vw-compliance-table',
  imports: [
    Cell,
    ComplianceBar,
    DataTable,
    DatePipe,
    ExportMenu,
    Figure,
    FilterSelect,
    MatButton,
    NgTemplateOutlet,
    PageEmpty,
    PageHeader,
    PageLoading,
    ProblemView,
    RouterLink,
  ],
  providers: [ComplianceAddress],
  templateUrl: './compliance-table.html',
  styleUrl: './compliance-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComplianceTable {
  private readonly api = inject(ComplianceApi);
  protected readonly address = inject(ComplianceAddress);
  protected readonly words = inject(ComplianceWords);

  protected readonly by = computed(
    () => groupings.find((grouping) => grouping === this.address.get('by')) ?? 'store',
  );
  protected readonly sort = computed(() => this.address.get('sort') || 'rate');
  private readonly query = computed((): ComplianceQuery => ({
    ...this.address.asked(),
    by: this.by(),
    sort: this.sort() as ComplianceQuery['sort'],
  }));
  protected readonly table = this.api.table(() => this.query());
  protected readonly shown = kept(this.table);
  protected readonly csv = computed(() => this.api.file('csv', this.query()));
  protected readonly xlsx = computed(() => this.api.file('xlsx', this.query()));
  protected readonly filtered = computed(() =>
    Object.values(this.address.filters()).some((value) => value !== ''),
  );

  protected readonly groupings = groupings
    .slice(1)
    .map((value) => ({ value, label: this.words.grouping(value) }));
  protected readonly columns = computed<readonly TableColumn<ComplianceRow>[]>(() =>
    complianceColumns(this.by(), this.words),
  );
  protected readonly ends: readonly WindowEnd[] = ['late', 'notDone', 'excused', 'covered'];
  protected readonly counted = countedEnds;
  protected readonly step = heatStep;
  protected readonly id = (row: ComplianceRow): string => row.id;

  protected readonly againstWords = computed(() => {
    const { from, to } = this.address.months();
    const months = monthsIn(from, to);
    return months === 1
      ? $localize`:@@compliance.against.one:points against the month before`
      : $localize`:@@compliance.against.many:points against the ${months}:months: months before`;
  });

  protected meaning(counts: WindowCounts): string {
    return $localize`:@@compliance.figure.rate:on time, ${this.words.of(counts)}:counts:`;
  }

  /** The tasks behind a figure of a row. */
  protected behind(row: ComplianceRow, ends: readonly WindowEnd[]) {
    const filters = { ...this.address.filters(), [this.by()]: row.id };
    return tasksBehind(ends, this.address.months(), filters);
  }

  /** A row leads into itself: a store to its rules, anything else to its stores. */
  protected narrowed(row: ComplianceRow): Readonly<Record<string, string>> {
    const next: Grouping = this.by() === 'store' ? 'rule' : 'store';
    const set = Object.entries(this.address.filters()).filter(([, value]) => value !== '');
    return {
      ...(Object.fromEntries(set) as Record<string, string>),
      ...this.address.months(),
      by: next,
      [this.by()]: row.id,
    };
  }

  protected rateLabel(row: ComplianceRow): string {
    const [rate, counts] = [this.words.rate(row.rate), this.words.of(row.counts)];
    return $localize`:@@compliance.rate-label:${rate}:rate: on time, ${counts}:counts:: the tasks of ${row.name}:name:`;
  }

  protected endLabel(row: ComplianceRow, end: WindowEnd): string {
    const count = this.words.count(row.counts[end]);
    return $localize`:@@compliance.end-label:${endWord(end)}:end:, ${count}:count:: the tasks of ${row.name}:name:`;
  }
}
