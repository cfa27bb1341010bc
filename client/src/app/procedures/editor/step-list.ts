import type { CdkDragDrop } from '@angular/cdk/drag-drop';
import { CdkDrag, CdkDragHandle, CdkDropList } from '@angular/cdk/drag-drop';
import { LiveAnnouncer } from '@angular/cdk/a11y';
import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import type { FormArray } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import type { StepKind } from '@shared/procedures/step-kind';
import { stepKinds } from '@shared/procedures/step-kind';
import { LanguageChoice } from '../../session/language-choice';
import { Icon } from '../../ui/icon/icon';
import { Notices } from '../../ui/notice/notices';
import { kindWord } from '../procedure-words';
import type { StepForm } from './draft-form';
import { stepForm } from './draft-form';
import { StepEditor } from './step-editor';

/** The steps in their order: add, open, move by hand or by key, remove. */
@Component({
  selector: 'vw-step-list',
  imports: [
    CdkDrag,
    CdkDragHandle,
    CdkDropList,
    Icon,
    MatButton,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    StepEditor,
  ],
  templateUrl: './step-list.html',
  styleUrl: './step-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepList {
  private readonly announcer = inject(LiveAnnouncer);
  private readonly notices = inject(Notices);
  private readonly language = inject(LanguageChoice).current;

  readonly steps = input.required<FormArray<StepForm>>();

  private readonly opened = signal<ReadonlySet<StepForm>>(new Set());
  protected readonly kinds = stepKinds.map((kind) => ({ kind, word: kindWord(kind) }));
  protected readonly kindWord = kindWord;

  /** Opens the steps in which something is wrong, so that their fields can be reached. */
  openFaulty(): void {
    this.opened.set(new Set(this.steps().controls.filter((step) => step.invalid)));
  }

  protected isOpen(step: StepForm): boolean {
    return this.opened().has(step);
  }

  protected toggle(step: StepForm): void {
    const next = new Set(this.opened());
    if (!next.delete(step)) next.add(step);
    this.opened.set(next);
  }

  protected nameOf(step: StepForm): string {
    const { en, es } = step.controls.text.getRawValue();
    return (
      (this.language === 'es' ? es || en : en || es) ||
      $localize`:@@procedures.unwritten:not written yet`
    );
  }

  protected add(kind: StepKind): void {
    const step = stepForm({ kind });
    this.steps().push(step);
    this.steps().markAsDirty();
    this.opened.set(new Set([...this.opened(), step]));
  }

  protected drop(event: CdkDragDrop<unknown>): void {
    this.move(event.previousIndex, event.currentIndex);
  }

  protected move(from: number, to: number): void {
    const step = this.steps().at(from);
    if (from === to || to < 0 || to >= this.steps().length) return;
    this.steps().removeAt(from);
    this.steps().insert(to, step);
    this.steps().markAsDirty();
    void this.announcer.announce(
      $localize`:@@procedures.moved-to:Step moved to place ${to + 1}:number: of ${this.steps().length}:count:.`,
    );
  }

  protected remove(index: number): void {
    const step = this.steps().at(index);
    this.steps().removeAt(index);
    this.steps().markAsDirty();
    this.notices.offerUndo($localize`:@@procedures.step-removed:Step removed.`, () => {
      this.steps().insert(Math.min(index, this.steps().length), step);
      this.opened.set(new Set(this.opened()));
    });
  }
}
