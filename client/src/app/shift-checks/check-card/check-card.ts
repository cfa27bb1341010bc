import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { FindingWords } from '../../findings/finding-words';
import { SheetDraft } from '../../task-sheet/sheet-draft';
import { StepField } from '../../task-sheet/step-field/step-field';
import { keptReason } from '../../task-sheet/sheet-words';
import type { TaskSheet } from '../../task-sheet/task-sheet-api';
import { Icon } from '../../ui/icon/icon';
import { StateWord } from '../../ui/state-word/state-word';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';

/** One check of the shift, with everything at the size of a thumb. */
@Component({
  selector: 'vw-check-card',
  imports: [Icon, MatButton, StateWord, StepField, TimeInZonePipe],
  providers: [SheetDraft],
  templateUrl: './check-card.html',
  styleUrl: './check-card.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CheckCard {
  private readonly document = inject(DOCUMENT);
  protected readonly words = inject(FindingWords);
  protected readonly draft = inject(SheetDraft);

  readonly sheet = input.required<TaskSheet>();

  readonly couldNot = output();

  private readonly tried = signal(false);
  private readonly refused = signal<Readonly<Record<string, string>>>({});

  protected readonly title = computed(() => this.words.text(this.sheet().procedure.title));
  protected readonly tries = computed(() => keptReason(this.sheet().task.couldNot ?? ''));
  /** Ticks that are still open: one touch answers them all. */
  protected readonly openTicks = computed(() =>
    this.sheet().procedure.steps.filter(
      ({ kind, key }) => kind === 'check' && !this.draft.answers()[key],
    ),
  );
  /** True when every step that needs an answer has one. */
  readonly complete = computed(() => this.draft.ready() && this.draft.missing().length === 0);
  protected readonly faults = computed(() => {
    const needed = $localize`:@@shift-checks.needed:This needs an answer.`;
    const missing = this.tried() ? this.draft.missing().map(({ key }) => [key, needed]) : [];
    return { ...this.refused(), ...Object.fromEntries(missing) } as Record<string, string>;
  });

  constructor() {
    effect(() => {
      const sheet = this.sheet();
      untracked(() => void this.draft.takeUp(sheet));
    });
  }

  /** What is sent to acknowledge this check. */
  acknowledgement() {
    const inspection = this.draft.inspection();
    return inspection && { taskId: this.sheet().task.id, inspection };
  }

  acknowledged(): void {
    void this.draft.closed();
  }

  /** Shows what is missing and goes there. */
  point(): void {
    this.tried.set(true);
    const [first] = this.draft.missing();
    if (!first) return;
    const section = this.document.getElementById(`step-${this.sheet().task.id}-${first.key}`);
    section?.scrollIntoView({ block: 'center' });
    section?.focus({ preventScroll: true });
  }

  protected allRight(): void {
    for (const { key } of this.openTicks()) this.draft.answer(key, { kind: 'check', ok: true });
  }
}
