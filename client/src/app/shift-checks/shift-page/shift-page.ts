import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  LOCALE_ID,
  signal,
  untracked,
  viewChildren,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatOption } from '@angular/material/core';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatSelect } from '@angular/material/select';
import { Router, RouterLink } from '@angular/router';
import { forkJoin } from 'rxjs';
import { FindingWords } from '../../findings/finding-words';
import { toProblem } from '../../problems/problem';
import { ProblemView } from '../../problems/problem-view';
import { problemWords } from '../../problems/problem-words';
import { Session } from '../../session/session';
import { CouldNotDialog } from '../../task-sheet/could-not/could-not-dialog';
import type { TaskSheet } from '../../task-sheet/task-sheet-api';
import { TaskSheetApi } from '../../task-sheet/task-sheet-api';
import { Caution } from '../../ui/caution/caution';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { PhotoOutbox } from '../../uploads/photo-outbox';
import { CheckCard } from '../check-card/check-card';
import { ComingVisits } from '../coming-visits/coming-visits';
import { DoneToday } from '../done-today/done-today';
import type { Shift } from '../shift-api';
import { ShiftApi } from '../shift-api';

/** The shift desk of a store: cautions, a few large checks, one act; then who comes when. */
@Component({
  selector: 'vw-shift-page',
  imports: [
    Caution,
    CheckCard,
    ComingVisits,
    DoneToday,
    MatButton,
    MatFormField,
    MatLabel,
    MatOption,
    MatSelect,
    PageEmpty,
    PageHeader,
    PageLoading,
    ProblemView,
    RouterLink,
  ],
  templateUrl: './shift-page.html',
  styleUrl: './shift-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShiftPage {
  private readonly api = inject(ShiftApi);
  private readonly sheetApi = inject(TaskSheetApi);
  private readonly dialog = inject(MatDialog);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  private readonly outbox = inject(PhotoOutbox);
  private readonly words = inject(FindingWords);
  protected readonly session = inject(Session);
  protected readonly locale = inject(LOCALE_ID);
  private readonly cards = viewChildren(CheckCard);

  /** From the address: which store, where a person has several. */
  readonly store = input<string>();

  protected readonly resource = this.api.shift(() => this.store());
  /** Kept while it is read anew, so that nothing jumps under a finger. */
  protected readonly shift = linkedSignal<Shift | null, Shift | null>({
    source: () => (this.resource.hasValue() ? this.resource.value() : null),
    computation: (read, before) => {
      const kept = before?.value ?? null;
      const same = untracked(this.store) === undefined || kept?.storeId === untracked(this.store);
      return read ?? (same ? kept : null);
    },
  });
  protected readonly name = computed(() => {
    const shift = this.shift();
    const store = shift?.stores.find(({ id }) => id === shift.storeId);
    return store ? `${store.number} ${store.name}` : '';
  });
  protected readonly subtitle = computed(() => {
    const count = this.shift()?.waiting.length ?? 0;
    if (count === 0) return $localize`:@@shift-checks.none-wait:Nothing waits`;
    return count === 1
      ? $localize`:@@shift-checks.one-waits:1 check waits`
      : $localize`:@@shift-checks.many-wait:${count}:count: checks wait`;
  });
  /** Each caution once, however many checks carry it. */
  protected readonly cautions = computed(() => {
    const texts = this.shift()?.waiting.flatMap(({ procedure }) => procedure.cautions) ?? [];
    return [...new Set(texts.map((text) => this.words.text(text)))];
  });
  private readonly read = signal<readonly string[]>([]);
  /** Asked anew when another caution comes up. */
  protected readonly cautionsSeen = computed(() =>
    this.cautions().every((caution) => this.read().includes(caution)),
  );
  protected readonly busy = signal(false);
  protected readonly complete = computed(() => this.cards().filter((card) => card.complete()));

  protected seeCautions(): void {
    this.read.update((read) => [...read, ...this.cautions()]);
  }

  protected choose(store: string): void {
    void this.router.navigate([], { queryParams: { store } });
  }

  /** Sends what is complete; where nothing is, shows what is missing. */
  protected async acknowledge(): Promise<void> {
    const cards = this.complete();
    if (cards.length === 0) {
      this.cards()[0]?.point();
      return;
    }
    this.busy.set(true);
    await this.outbox.sendAll();
    const checks = cards.flatMap((card) => card.acknowledgement() ?? []);
    this.api.acknowledge({ checks }).subscribe({
      next: ({ acknowledged, findings }) => {
        this.busy.set(false);
        for (const card of cards) card.acknowledged();
        this.notices.offerUndo(acknowledgedText(acknowledged, findings), () =>
          this.undo(checks.map(({ taskId }) => taskId)),
        );
        this.resource.reload();
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        this.tell(failure);
      },
    });
  }

  protected undo(taskIds: readonly string[]): void {
    forkJoin(taskIds.map((id) => this.sheetApi.undo(id))).subscribe({
      next: () => {
        this.notices.tell({ text: $localize`:@@shift-checks.undone:Taken back.` });
        this.resource.reload();
      },
      error: (failure: unknown) => this.tell(failure),
    });
  }

  protected couldNot(sheet: TaskSheet): void {
    this.dialog
      .open<CouldNotDialog, TaskSheet, boolean>(CouldNotDialog, {
        data: sheet,
        width: '30rem',
        maxWidth: 'calc(100vw - 32px)',
      })
      .afterClosed()
      .subscribe((reported) => {
        if (!reported) return;
        this.notices.tell({
          text: $localize`:@@shift-checks.reported:Noted. Whoever plans your store sees it.`,
        });
        this.resource.reload();
      });
  }

  private tell(failure: unknown): void {
    const problem = toProblem(failure);
    const { title, advice } = problemWords(problem);
    this.notices.tell({
      text:
        problem.code === 'offline'
          ? $localize`:@@shift-checks.offline:No network. Your answers are kept on this device.`
          : `${title}. ${advice}`,
      urgent: true,
    });
    if (problem.status === 409) this.resource.reload();
  }
}

function acknowledgedText(count: number, findings: number): string {
  const done =
    count === 1
      ? $localize`:@@shift-checks.acknowledged-one:1 check acknowledged.`
      : $localize`:@@shift-checks.acknowledged-many:${count}:count: checks acknowledged.`;
  if (findings === 0) return done;
  return findings === 1
    ? `${done} ${$localize`:@@shift-checks.finding:A finding was noted.`}`
    : `${done} ${$localize`:@@shift-checks.findings:${findings}:count: findings were noted.`}`;
}
