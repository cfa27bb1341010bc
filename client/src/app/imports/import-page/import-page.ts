import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { Observable } from 'rxjs';
import { asPage, asPageSize, asText } from '../../fleet/list-address';
import { toProblem } from '../../problems/problem';
import { ProblemView } from '../../problems/problem-view';
import { problemWords } from '../../problems/problem-words';
import { PageTitle } from '../../shell/page-title';
import { Icon } from '../../ui/icon/icon';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageLoading } from '../../ui/page-states/page-loading';
import { ProgressLine } from '../../ui/progress-line/progress-line';
import { importKindWord } from '../import-words';
import type { Import, ImportMode } from '../imports-api';
import { ImportsApi } from '../imports-api';
import type { ChosenColumns } from './column-mapping';
import { ColumnMapping } from './column-mapping';
import { ImportProblems } from './import-problems';
import { ImportReview } from './import-review';
import { ImportSteps } from './import-steps';
import { OutcomeTable } from './outcome-table';

/** Milliseconds between two questions how far the work has come. */
const PAUSE = 1000;

/** One import from its columns to its result. Its id is in the address, so a reload loses nothing. */
@Component({
  selector: 'vw-import-page',
  imports: [
    ColumnMapping,
    Icon,
    ImportProblems,
    ImportReview,
    ImportSteps,
    MatButton,
    OutcomeTable,
    PageHeader,
    PageLoading,
    ProblemView,
    ProgressLine,
    RouterLink,
  ],
  templateUrl: './import-page.html',
  styleUrl: './import-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportPage {
  private readonly api = inject(ImportsApi);
  private readonly notices = inject(Notices);

  readonly id = input.required<string>();
  readonly page = input(1, { transform: asPage });
  readonly pageSize = input(50, { transform: asPageSize });
  readonly field = input('', { transform: asText });

  protected readonly resource = this.api.one(() => this.id());
  /** Stays while it is asked again, so that the page does not blink. */
  protected readonly import = linkedSignal<Import | null, Import | null>({
    source: () => (this.resource.hasValue() ? this.resource.value() : null),
    computation: (now, before) => now ?? before?.value ?? null,
  });
  protected readonly subtitle = computed(() => {
    const kind = this.import()?.kind;
    return kind ? importKindWord(kind) : '';
  });
  protected readonly running = computed(() => {
    const state = this.import()?.state;
    return state === 'checking' || state === 'importing';
  });
  /** Whether the columns are on show again after they were confirmed. */
  protected readonly columnsAgain = signal(false);
  protected readonly mapping = computed(
    () => this.import()?.state === 'mapping' || this.columnsAgain(),
  );
  protected readonly busy = signal(false);

  constructor() {
    const pageTitle = inject(PageTitle);
    effect(() => {
      const name = this.import()?.fileName;
      if (name) pageTitle.set(name);
    });
    effect((onCleanup) => {
      // Read so that each answer, and each failure of the network, leads to the next question.
      const failed = this.resource.error();
      this.resource.isLoading();
      const gone = failed && [403, 404].includes(toProblem(failed).status);
      if (!this.running() || gone) return;
      const timer = setTimeout(() => this.resource.reload(), failed ? 4 * PAUSE : PAUSE);
      onCleanup(() => clearTimeout(timer));
    });
  }

  protected check(given: Import, { fields, dateOrder }: ChosenColumns): void {
    this.run(this.api.check(given, fields, dateOrder));
  }

  protected start(given: Import, mode: ImportMode): void {
    this.run(this.api.start(given, mode));
  }

  protected cancel(): void {
    this.run(this.api.cancel(this.id()));
  }

  private run(call: Observable<Import>): void {
    this.busy.set(true);
    call.subscribe({
      next: (saved) => {
        this.busy.set(false);
        this.columnsAgain.set(false);
        this.resource.set(saved);
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        const problem = toProblem(failure);
        const words = problemWords(problem);
        const text = problem.errors[0]?.message ?? `${words.title}. ${words.advice}`;
        this.notices.tell({ text, urgent: true });
        if (problem.status === 409) this.resource.reload();
      },
    });
  }
}
