import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router } from '@angular/router';
import { letterKinds, letterStates } from '@shared/mail/letter-kind';
import { ProblemView } from '../../problems/problem-view';
import { problemWords } from '../../problems/problem-words';
import { LanguageChoice } from '../../session/language-choice';
import { Session } from '../../session/session';
import { kept } from '../../tasks/kept';
import { Cell } from '../../ui/data-table/cell';
import { DataTable } from '../../ui/data-table/data-table';
import type { TableColumn } from '../../ui/data-table/table-column';
import { Figure } from '../../ui/figure/figure';
import { FilterBar } from '../../ui/filter-bar/filter-bar';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { zonedText } from '../../ui/text/zoned-text';
import { LetterState } from '../letter-state';
import { kindWord, letterStateWord } from '../letter-words';
import type { LetterQuery, LetterRow } from '../letters-api';
import { LettersApi } from '../letters-api';

const text = (value: string | undefined): string => value ?? '';

/** A letter that waits longer than this means that sending is in trouble. */
const STUCK_AFTER_MS = 30 * 60_000;

/** The outbox: letters waiting, sent and refused; refused ones can be tried again. */
@Component({
  selector: 'vw-letter-list',
  imports: [
    Cell,
    DataTable,
    Figure,
    FilterBar,
    FilterSelect,
    LetterState,
    MatButton,
    PageEmpty,
    PageHeader,
    PageLoading,
    ProblemView,
    TimeInZonePipe,
  ],
  templateUrl: './letter-list.html',
  styleUrl: './letter-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LetterList {
  private readonly api = inject(LettersApi);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  private readonly session = inject(Session);
  private readonly language = inject(LanguageChoice).current;
  protected readonly zone = this.session.timeZone;
  protected readonly mayRetry = this.session.can('mail.retry');

  readonly q = input('', { transform: text });
  readonly state = input('', { transform: text });
  readonly kind = input('', { transform: text });
  readonly sort = input('-createdAt', { transform: (value?: string) => value || '-createdAt' });
  readonly page = input(1, { transform: (value?: string) => Number(value) || 1 });
  readonly pageSize = input(50, { transform: (value?: string) => Number(value) || 50 });

  protected readonly list = this.api.list(() => ({
    q: this.q() || undefined,
    state: (this.state() || undefined) as LetterQuery['state'],
    kind: (this.kind() || undefined) as LetterQuery['kind'],
    sort: this.sort() as LetterQuery['sort'],
    page: this.page(),
    pageSize: this.pageSize(),
  }));
  protected readonly shown = kept(this.list);
  protected readonly busy = signal(false);
  /** What is chosen is forgotten with the list it was chosen from. */
  protected readonly selected = linkedSignal<unknown, ReadonlySet<string>>({
    source: () => [this.state(), this.page(), this.q(), this.kind()],
    computation: () => new Set<string>(),
  });
  protected readonly filtered = computed(
    () => this.q() !== '' || this.state() !== '' || this.kind() !== '',
  );
  protected readonly stuck = computed(() => {
    const oldest = this.shown()?.oldestQueuedAt;
    return oldest ? Date.now() - Date.parse(oldest) > STUCK_AFTER_MS : false;
  });
  protected readonly waiting = computed(() => {
    const oldest = this.shown()?.oldestQueuedAt;
    if (!oldest) return $localize`:@@letters.figure.waiting:waiting`;
    const since = zonedText(oldest, this.zone(), this.zone(), this.language, 'date-time');
    return $localize`:@@letters.figure.waiting-since:waiting, the oldest since ${since}:since:`;
  });

  protected readonly states = letterStates.map((value) => ({
    value,
    label: letterStateWord(value),
  }));
  protected readonly kinds = letterKinds.map((value) => ({ value, label: kindWord(value) }));
  protected readonly set = computed(() => [
    ...this.states
      .filter(({ value }) => value === this.state())
      .map(({ label }) => ({ key: 'state', label })),
    ...this.kinds
      .filter(({ value }) => value === this.kind())
      .map(({ label }) => ({ key: 'kind', label })),
  ]);
  protected readonly columns: readonly TableColumn<LetterRow>[] = [
    {
      key: 'subject',
      label: $localize`:@@letters.col.subject:Subject`,
      text: (row) => row.subject,
    },
    { key: 'to', label: $localize`:@@letters.col.to:To` },
    { key: 'state', label: $localize`:@@letters.col.state:State`, phone: 'aside' },
    { key: 'next', label: $localize`:@@letters.col.when:Sent, next try or reason`, sort: 'sentAt' },
    {
      key: 'attempts',
      label: $localize`:@@letters.col.attempts:Tries`,
      align: 'end',
      choice: 'on',
      text: (row) => row.attempts,
    },
    {
      key: 'kind',
      label: $localize`:@@letters.col.kind:About`,
      choice: 'on',
      text: (row) => kindWord(row.kind),
    },
    {
      key: 'created',
      label: $localize`:@@letters.col.created:Written`,
      sort: 'createdAt',
      choice: 'on',
      text: (row) => zonedText(row.createdAt, this.zone(), this.zone(), this.language, 'date-time'),
    },
  ];
  protected readonly id = (row: LetterRow): string => row.id;
  protected readonly name = (row: LetterRow): string => `${row.subject}, ${row.toAddress}`;
  protected readonly link = (row: LetterRow): readonly unknown[] => ['/letters', row.id];
  protected readonly selectedWords = computed(
    () => $localize`:@@letters.selected:${this.selected().size}:count: chosen`,
  );

  protected ask(change: Readonly<Record<string, string | number | null>>): void {
    void this.router.navigate([], {
      queryParams: { page: null, ...change },
      queryParamsHandling: 'merge',
    });
  }

  protected remove(key: string): void {
    this.ask({ [key]: null });
  }

  protected clear(): void {
    this.ask({ q: null, state: null, kind: null });
  }

  protected retry(): void {
    this.busy.set(true);
    this.api.retry([...this.selected()]).subscribe({
      next: ({ queued }) => {
        this.busy.set(false);
        this.selected.set(new Set());
        this.list.reload();
        this.notices.tell({
          text: $localize`:@@letters.retried:${queued}:count: will be tried again.`,
        });
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        const { title, advice } = problemWords(failure);
        this.notices.tell({ text: `${title}. ${advice}`, urgent: true });
      },
    });
  }
}
