import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { ProblemView } from '../../problems/problem-view';
import { Session } from '../../session/session';
import { Cell } from '../../ui/data-table/cell';
import type { PageChange } from '../../ui/data-table/data-table';
import { DataTable } from '../../ui/data-table/data-table';
import { ExportMenu } from '../../ui/data-table/export-menu';
import type { TableColumn } from '../../ui/data-table/table-column';
import { Figure } from '../../ui/figure/figure';
import { FilterBar } from '../../ui/filter-bar/filter-bar';
import { FilterDates } from '../filter-dates/filter-dates';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { kept } from '../../tasks/kept';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { FindingWords } from '../finding-words';
import type { Finding, FindingQuery } from '../findings-api';
import { FindingsApi } from '../findings-api';
import { SeverityMark } from '../severity-mark/severity-mark';

const text = (value: string | undefined): string => value ?? '';

/** What inspections and stores found: open ones first, by filters that live in the address. */
@Component({
  selector: 'vw-finding-list',
  imports: [
    Cell,
    DataTable,
    ExportMenu,
    Figure,
    FilterBar,
    FilterDates,
    FilterSelect,
    MatButton,
    PageEmpty,
    PageHeader,
    PageLoading,
    ProblemView,
    RouterLink,
    SeverityMark,
    TimeInZonePipe,
  ],
  templateUrl: './finding-list.html',
  styles: `
    vw-data-table {
      margin-top: var(--vw-space-4);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FindingList {
  private readonly api = inject(FindingsApi);
  private readonly router = inject(Router);
  protected readonly words = inject(FindingWords);
  protected readonly mayReport = inject(Session).can('findings.report');

  readonly q = input('', { transform: text });
  readonly region = input('', { transform: text });
  readonly store = input('', { transform: text });
  readonly unit = input('', { transform: text });
  readonly cause = input('', { transform: text });
  readonly severity = input('', { transform: text });
  /** Without it the open ones are shown. */
  readonly settled = input('', { transform: text });
  readonly from = input('', { transform: text });
  readonly to = input('', { transform: text });
  readonly sort = input('-foundAt', { transform: (value?: string) => value || '-foundAt' });
  readonly page = input(1, { transform: (value?: string) => Number(value) || 1 });
  readonly pageSize = input(50, { transform: (value?: string) => Number(value) || 50 });

  private readonly place = computed((): FindingQuery => ({
    region: this.region() || undefined,
    store: this.store() || undefined,
    unit: this.unit() || undefined,
  }));
  private readonly query = computed((): FindingQuery => ({
    ...this.place(),
    q: this.q() || undefined,
    cause: (this.cause() || undefined) as FindingQuery['cause'],
    severity: (this.severity() || undefined) as FindingQuery['severity'],
    settled: (this.settled() === 'all' ? undefined : this.settled() || 'no') as 'yes' | 'no',
    from: this.from() || undefined,
    to: this.to() || undefined,
    sort: this.sort() as FindingQuery['sort'],
    page: this.page(),
    pageSize: this.pageSize(),
  }));
  protected readonly list = this.api.list(this.query);
  protected readonly csv = computed(() => this.api.file(this.query(), 'csv'));
  protected readonly xlsx = computed(() => this.api.file(this.query(), 'xlsx'));
  private readonly open = this.api.list(() => ({
    ...this.place(),
    settled: 'no',
    pageSize: 1,
  }));
  private readonly stopped = this.api.list(() => ({
    ...this.place(),
    settled: 'no',
    severity: 'stop',
    pageSize: 1,
  }));
  private readonly allRegions = this.api.regions();
  private readonly namedStore = this.api.store(() => this.store());

  protected readonly shown = kept(this.list);
  protected readonly openCount = computed(() => this.open.hasValue() && this.open.value().total);
  protected readonly stopCount = computed(
    () => this.stopped.hasValue() && this.stopped.value().total,
  );
  protected readonly regions = computed(() =>
    (this.allRegions.hasValue() ? this.allRegions.value().rows : []).map((region) => ({
      value: region.id,
      label: region.name,
    })),
  );
  protected readonly states = [
    { value: 'yes', label: $localize`:@@findings.state.settled:settled` },
    { value: 'all', label: $localize`:@@findings.state.all:open and settled` },
  ];
  protected readonly openState = $localize`:@@findings.state.open:open`;

  protected readonly set = computed(() =>
    [
      { key: 'region', label: labelIn(this.regions(), this.region()) },
      { key: 'store', label: this.store() && this.storeName() },
      { key: 'unit', label: this.unit() && this.unitName() },
      { key: 'cause', label: labelIn(this.words.causes, this.cause()) },
      { key: 'severity', label: labelIn(this.words.severities, this.severity()) },
      { key: 'settled', label: labelIn(this.states, this.settled()) },
      {
        key: 'from',
        label: this.from() && $localize`:@@findings.set.from:from ${this.from()}:date:`,
      },
      { key: 'to', label: this.to() && $localize`:@@findings.set.to:to ${this.to()}:date:` },
    ].filter(({ label }) => label !== ''),
  );
  protected readonly filtered = computed(() => this.q() !== '' || this.set().length > 0);

  protected readonly columns: readonly TableColumn<Finding>[] = [
    { key: 'cause', label: $localize`:@@findings.col.cause:What was found` },
    {
      key: 'severity',
      label: $localize`:@@findings.col.severity:How urgent`,
      sort: 'severity',
      phone: 'aside',
    },
    { key: 'store', label: $localize`:@@findings.col.store:Store`, sort: 'store' },
    {
      key: 'unit',
      label: $localize`:@@findings.col.unit:Unit`,
      text: (row) =>
        [row.unitTag, row.componentKind && this.words.component(row.componentKind).toLowerCase()]
          .filter(Boolean)
          .join(' · ') || null,
    },
    { key: 'foundAt', label: $localize`:@@findings.col.found:Found`, sort: 'foundAt' },
    {
      key: 'by',
      label: $localize`:@@findings.col.by:By`,
      choice: 'on',
      phone: 'none',
      text: (row) => row.foundBy,
    },
    {
      key: 'note',
      label: $localize`:@@findings.col.note:Note`,
      choice: 'off',
      phone: 'none',
      text: (row) => row.note || null,
    },
    { key: 'settled', label: $localize`:@@findings.col.settled:Settled`, choice: 'on' },
  ];
  protected readonly id = (row: Finding): string => row.id;
  protected readonly link = (row: Finding): readonly unknown[] => ['/findings', row.id];

  protected ask(change: Readonly<Record<string, string | number | null>>): void {
    void this.router.navigate([], {
      queryParams: { page: null, ...change },
      queryParamsHandling: 'merge',
    });
  }

  protected turn({ page, pageSize }: PageChange): void {
    this.ask({ page, pageSize });
  }

  protected remove(key: string): void {
    this.ask({ [key]: null });
  }

  protected clear(): void {
    this.ask(Object.fromEntries(this.set().map(({ key }) => [key, null])));
  }

  private storeName(): string {
    if (!this.namedStore.hasValue()) return $localize`:@@findings.set.store:one store`;
    const { number, name } = this.namedStore.value();
    return `${number} ${name}`;
  }

  private unitName(): string {
    const tag = this.shown()?.rows.find(({ unitId }) => unitId === this.unit())?.unitTag;
    return tag
      ? $localize`:@@findings.set.unit-tag:unit ${tag}:tag:`
      : $localize`:@@findings.set.unit:one unit`;
  }
}

function labelIn(
  options: readonly { readonly value: string; readonly label: string }[],
  value: string,
): string {
  return value === '' ? '' : (options.find((option) => option.value === value)?.label ?? value);
}
