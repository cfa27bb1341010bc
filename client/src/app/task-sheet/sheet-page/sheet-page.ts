import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  LOCALE_ID,
  untracked,
} from '@angular/core';
import { toProblem } from '../../problems/problem';
import { ProblemView } from '../../problems/problem-view';
import { problemWords } from '../../problems/problem-words';
import { FindingWords } from '../../findings/finding-words';
import { ProcedureView } from '../../procedures/procedure-view/procedure-view';
import { LanguageChoice } from '../../session/language-choice';
import { Session } from '../../session/session';
import { PageTitle } from '../../shell/page-title';
import { calendarDay } from '../../ui/text/calendar-day';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageLoading } from '../../ui/page-states/page-loading';
import { StateWord } from '../../ui/state-word/state-word';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { ClosedSheet } from '../closed-sheet/closed-sheet';
import { TaskHistory } from '../history/task-history';
import { SheetDraft } from '../sheet-draft';
import { SheetForm } from '../sheet-form/sheet-form';
import { keptReason } from '../sheet-words';
import type { TaskSheet } from '../task-sheet-api';
import { TaskSheetApi } from '../task-sheet-api';

/** One task from its cautions to its closing, and what became of it. */
@Component({
  selector: 'vw-sheet-page',
  imports: [
    ClosedSheet,
    PageHeader,
    PageLoading,
    ProblemView,
    ProcedureView,
    SheetForm,
    StateWord,
    TaskHistory,
    TimeInZonePipe,
  ],
  providers: [SheetDraft],
  templateUrl: './sheet-page.html',
  styleUrl: './sheet-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SheetPage {
  private readonly api = inject(TaskSheetApi);
  private readonly words = inject(FindingWords);
  private readonly notices = inject(Notices);
  private readonly session = inject(Session);
  private readonly locale = inject(LOCALE_ID);
  protected readonly draft = inject(SheetDraft);
  protected readonly language = inject(LanguageChoice).current;

  readonly id = input.required<string>();

  protected readonly resource = this.api.sheet(() => this.id());
  protected readonly history = this.api.history(() => this.id());
  /** Kept while it is read anew, so that nothing jumps under a finger. */
  protected readonly sheet = linkedSignal<TaskSheet | null, TaskSheet | null>({
    source: () => (this.resource.hasValue() ? this.resource.value() : null),
    computation: (read, before) => {
      const kept = before?.value ?? null;
      return read ?? (kept?.task.id === untracked(this.id) ? kept : null);
    },
  });
  protected readonly title = computed(() => {
    const sheet = this.sheet();
    return sheet ? this.words.text(sheet.procedure.title) : '';
  });
  protected readonly place = computed(() => {
    const sheet = this.sheet();
    if (!sheet) return '';
    const store = `${sheet.store.number} ${sheet.store.name}`;
    return sheet.unit ? `${store} · ${sheet.unit.tag}` : store;
  });
  protected readonly due = computed(() => calendarDay(this.sheet()?.task.dueOn, this.locale));
  protected readonly couldNot = computed(() => keptReason(this.sheet()?.task.couldNot ?? ''));
  protected readonly back = computed(() => {
    if (this.session.can('today.read')) {
      return { link: '/today', label: $localize`:@@task-sheet.back-today:Today` };
    }
    if (this.session.can('shift.read')) {
      return { link: '/shift', label: $localize`:@@task-sheet.back-shift:Shift` };
    }
    return { link: `/tasks/${this.id()}`, label: $localize`:@@task-sheet.back-task:Task` };
  });

  constructor() {
    const pageTitle = inject(PageTitle);
    effect(() => {
      const sheet = this.sheet();
      if (!sheet) return;
      pageTitle.set(this.title());
      untracked(() => void this.draft.takeUp(sheet));
    });
  }

  protected closed(findings: number): void {
    const text =
      findings === 0
        ? $localize`:@@task-sheet.closed:Task closed.`
        : findings === 1
          ? $localize`:@@task-sheet.closed-one:Task closed with a finding.`
          : $localize`:@@task-sheet.closed-many:Task closed with ${findings}:count: findings.`;
    this.notices.offerUndo(text, () => this.undo());
    this.refresh();
  }

  protected undo(): void {
    const inspection = this.sheet()?.inspection;
    this.api.undo(this.id()).subscribe({
      next: () => {
        if (inspection) this.draft.restore(inspection);
        this.notices.tell({
          text: $localize`:@@task-sheet.undone:Taken back. Your answers are still here.`,
        });
        this.refresh();
      },
      error: (failure: unknown) => {
        const { title, advice } = problemWords(toProblem(failure));
        this.notices.tell({ text: `${title}. ${advice}`, urgent: true });
        this.refresh();
      },
    });
  }

  protected refresh(): void {
    this.resource.reload();
    this.history.reload();
  }
}
