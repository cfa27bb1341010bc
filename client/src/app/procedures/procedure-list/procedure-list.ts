import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { problemWords } from '../../problems/problem-words';
import { LanguageChoice } from '../../session/language-choice';
import { Session } from '../../session/session';
import { Cell } from '../../ui/data-table/cell';
import type { PageChange } from '../../ui/data-table/data-table';
import { DataTable } from '../../ui/data-table/data-table';
import type { TableColumn } from '../../ui/data-table/table-column';
import { FilterBar } from '../../ui/filter-bar/filter-bar';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageError } from '../../ui/page-states/page-error';
import { PageLoading } from '../../ui/page-states/page-loading';
import type { ProcedureQuery, ProcedureRow } from '../procedures-api';
import { ProceduresApi } from '../procedures-api';

const text = (value: string | undefined): string => value ?? '';

/** All procedures with the version in force. */
@Component({
  selector: 'vw-procedure-list',
  imports: [
    Cell,
    DataTable,
    DatePipe,
    FilterBar,
    FilterSelect,
    MatButton,
    PageEmpty,
    PageError,
    PageHeader,
    PageLoading,
    RouterLink,
  ],
  templateUrl: './procedure-list.html',
  styles: `
    vw-data-table {
      margin-top: var(--vw-space-3);
    }
    .mark {
      margin-left: var(--vw-space-2);
      padding: 1px 8px;
      border: 1px solid var(--vw-edge);
      border-radius: 999px;
      color: var(--vw-ink-2);
      font-size: var(--vw-text-tiny);
      font-weight: 400;
      white-space: nowrap;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProcedureList {
  private readonly api = inject(ProceduresApi);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  protected readonly language = inject(LanguageChoice).current;
  protected readonly mayEdit = inject(Session).can('procedures.edit');

  readonly q = input('', { transform: text });
  readonly state = input('', { transform: text });
  readonly sort = input('title', { transform: (value: string | undefined) => value || 'title' });
  readonly page = input(1, { transform: (value: string | undefined) => Number(value) || 1 });
  readonly pageSize = input(50, { transform: (value: string | undefined) => Number(value) || 50 });

  protected readonly adding = signal(false);
  protected readonly list = this.api.list(() => ({
    q: this.q(),
    state: (this.state() || 'live') as ProcedureQuery['state'],
    sort: this.sort() as ProcedureQuery['sort'],
    locale: this.language,
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

  protected readonly columns: readonly TableColumn<ProcedureRow>[] = [
    { key: 'title', label: $localize`:@@procedures.col.title:Procedure`, sort: 'title' },
    { key: 'published', label: $localize`:@@procedures.col.version:In force`, sort: 'published' },
    {
      key: 'minutes',
      label: $localize`:@@procedures.col.minutes:Minutes`,
      sort: 'minutes',
      align: 'end',
      text: (row) => row.minutes,
    },
    {
      key: 'steps',
      label: $localize`:@@procedures.col.steps:Steps`,
      align: 'end',
      choice: 'on',
      text: (row) => row.steps,
    },
    {
      key: 'rules',
      label: $localize`:@@procedures.col.rules:Rules`,
      align: 'end',
      choice: 'on',
      text: (row) => row.rules,
    },
    {
      key: 'code',
      label: $localize`:@@procedures.col.code:Code`,
      choice: 'off',
      text: (row) => row.code,
    },
  ];
  protected readonly states = [
    { value: 'retired', label: $localize`:@@procedures.state.retired:Retired` },
    { value: 'all', label: $localize`:@@procedures.state.all:All, retired too` },
  ];
  protected readonly inUse = $localize`:@@procedures.state.live:In use`;
  protected readonly id = (row: ProcedureRow): string => row.id;
  protected readonly link = (row: ProcedureRow): readonly unknown[] => ['/procedures', row.id];

  protected titleOf(row: ProcedureRow): string {
    return row.title[this.language] || row.title.en || row.title.es || row.code;
  }

  protected ask(change: Readonly<Record<string, string | number | null>>): void {
    void this.router.navigate([], {
      queryParams: { page: null, ...change },
      queryParamsHandling: 'merge',
    });
  }

  protected turn({ page, pageSize }: PageChange): void {
    this.ask({ page, pageSize });
  }

  protected addStarters(): void {
    this.adding.set(true);
    this.api.addStarters().subscribe({
      next: ({ added }) => {
        this.adding.set(false);
        this.list.reload();
        this.notices.tell({
          text: $localize`:@@procedures.starters-added:${added}:count: procedures added.`,
        });
      },
      error: (failure: unknown) => {
        this.adding.set(false);
        const words = problemWords(failure);
        this.notices.tell({ text: `${words.title}. ${words.advice}`, urgent: true });
      },
    });
  }
}
