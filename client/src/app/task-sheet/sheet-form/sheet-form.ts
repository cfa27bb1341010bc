import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { FindingWords } from '../../findings/finding-words';
import { toProblem } from '../../problems/problem';
import { fieldWords, problemWords } from '../../problems/problem-words';
import { Caution } from '../../ui/caution/caution';
import { Icon } from '../../ui/icon/icon';
import { Notices } from '../../ui/notice/notices';
import { PhotoOutbox } from '../../uploads/photo-outbox';
import { isAnswered } from '../answers';
import { CouldNotDialog } from '../could-not/could-not-dialog';
import { SheetDraft } from '../sheet-draft';
import { StepField } from '../step-field/step-field';
import type { TaskSheet } from '../task-sheet-api';
import { TaskSheetApi } from '../task-sheet-api';

/** A task that is being done: its cautions, its steps, its closing. */
@Component({
  selector: 'vw-sheet-form',
  imports: [Caution, Icon, MatButton, StepField],
  templateUrl: './sheet-form.html',
  styleUrl: './sheet-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SheetForm {
  private readonly api = inject(TaskSheetApi);
  private readonly dialog = inject(MatDialog);
  private readonly document = inject(DOCUMENT);
  private readonly notices = inject(Notices);
  private readonly outbox = inject(PhotoOutbox);
  protected readonly draft = inject(SheetDraft);
  protected readonly words = inject(FindingWords);

  readonly sheet = input.required<TaskSheet>();

  /** Closed, with so many findings. */
  readonly closed = output<number>();
  /** A reason was given why it could not be done. */
  readonly reported = output();

  protected readonly busy = signal(false);
  protected readonly tried = signal(false);
  private readonly refused = signal<Readonly<Record<string, string>>>({});

  protected readonly steps = computed(() => this.sheet().procedure.steps);
  protected readonly bring = computed(() => {
    const { tools, parts } = this.sheet().procedure;
    return [...tools, ...parts].map((it) => this.words.text(it)).join(' · ');
  });
  protected readonly answered = computed(
    () => this.steps().filter(({ key }) => isAnswered(this.draft.answers()[key])).length,
  );
  protected readonly faults = computed(() => {
    const needed = $localize`:@@task-sheet.needed:This step needs an answer.`;
    const missing = this.tried() ? this.draft.missing().map(({ key }) => [key, needed]) : [];
    return { ...this.refused(), ...Object.fromEntries(missing) } as Record<string, string>;
  });

  protected seen(): void {
    this.draft.seeCautions();
    this.goTo(this.steps()[0]?.key);
  }

  protected async close(): Promise<void> {
    this.tried.set(true);
    this.refused.set({});
    const missing = this.draft.missing()[0];
    const inspection = this.draft.inspection();
    if (missing || !inspection) {
      this.goTo(missing?.key);
      return;
    }
    this.busy.set(true);
    await this.outbox.sendAll();
    this.api.close(this.sheet().task.id, inspection).subscribe({
      next: ({ findings }) => {
        this.busy.set(false);
        void this.draft.closed();
        this.closed.emit(findings);
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        this.tell(failure);
      },
    });
  }

  protected couldNot(): void {
    this.dialog
      .open<CouldNotDialog, TaskSheet, boolean>(CouldNotDialog, {
        data: this.sheet(),
        width: '30rem',
        maxWidth: 'calc(100vw - 32px)',
      })
      .afterClosed()
      .subscribe((reported) => {
        if (!reported) return;
        this.notices.tell({
          text: $localize`:@@task-sheet.reported:Noted. The task stays open until someone plans it anew.`,
        });
        this.reported.emit();
      });
  }

  /** Faults of single steps stand at the steps; the rest is said at the foot. Nothing is lost. */
  private tell(failure: unknown): void {
    const problem = toProblem(failure);
    const ofSteps = problem.errors.filter(({ field }) => field.startsWith('readings.'));
    this.refused.set(
      Object.fromEntries(ofSteps.map((it) => [it.field.slice('readings.'.length), fieldWords(it)])),
    );
    const { title, advice } = problemWords(problem);
    const text =
      problem.code === 'offline'
        ? $localize`:@@task-sheet.offline:No network. Your answers are kept on this device: close the task when it is back.`
        : `${title}. ${advice}`;
    this.notices.tell({ text, urgent: true });
    this.goTo(ofSteps[0]?.field.slice('readings.'.length));
  }

  private goTo(key: string | undefined): void {
    if (key === undefined) return;
    const id = `step-${this.sheet().task.id}-${key}`;
    // The steps may only now be drawn.
    setTimeout(() => {
      const section = this.document.getElementById(id);
      section?.scrollIntoView({ block: 'start' });
      section?.focus({ preventScroll: true });
    });
  }
}
