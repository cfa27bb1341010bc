import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
  linkedSignal,
  output,
} from '@angular/core';
import { NgTemplateOutlet } from '@angular/common';
import { MatButton } from '@angular/material/button';
import type { ProcedureStep } from '@shared/procedures/procedure-content';
import type { Reading } from '@shared/procedures/within-limit';
import { FindingWords } from '../../findings/finding-words';
import { Caution } from '../../ui/caution/caution';
import { Icon } from '../../ui/icon/icon';
import type { Limits } from '../answers';
import { findingAhead, judged, readNumber } from '../answers';
import { limitText, missingLimit } from '../sheet-words';
import { PhotoField } from '../../uploads/photo-field';

/**
 * One step to be answered: its caution first, the limit beside the value, and at once what a
 * reading out of limit will be written down as.
 */
@Component({
  selector: 'vw-step-field',
  imports: [Caution, Icon, MatButton, NgTemplateOutlet, PhotoField],
  templateUrl: './step-field.html',
  styleUrl: './step-field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepField {
  private readonly words = inject(FindingWords);
  private readonly format = new Intl.NumberFormat(inject(LOCALE_ID), { maximumFractionDigits: 3 });

  readonly step = input.required<ProcedureStep>();
  /** Place in the procedure, from 1. */
  readonly place = input.required<number>();
  readonly reading = input.required<Reading | undefined>();
  readonly limits = input.required<Limits>();
  readonly taskId = input.required<string>();
  readonly storeId = input.required<string>();
  /** Why it cannot be taken as it is; shown after a try to close. */
  readonly fault = input('');

  readonly answered = output<Reading | null>();

  protected readonly id = computed(() => `step-${this.taskId()}-${this.step().key}`);
  protected readonly text = computed(() => this.words.text(this.step().text));
  protected readonly help = computed(() => this.written('help'));
  protected readonly caution = computed(() => this.written('caution'));
  protected readonly choices = computed(() => {
    const step = this.step();
    return step.kind === 'choice'
      ? step.choices.map(({ key, text }) => ({ key, text: this.words.text(text) }))
      : [];
  });
  protected readonly limit = computed(() => {
    const step = this.step();
    if (step.kind !== 'number') return null;
    const limit = this.limits()[step.key];
    return {
      text: limitText(limit, step.number.unit, this.format),
      missing: missingLimit(step.number, limit),
      basis: step.number.basis ? this.words.text(step.number.basis) : '',
      unit: step.number.unit,
    };
  });
  protected readonly within = computed(() => judged(this.step(), this.reading(), this.limits()));
  protected readonly ahead = computed(() => {
    const finding = findingAhead(this.step(), this.reading(), this.limits());
    return (
      finding && {
        stop: finding.severity === 'stop',
        words: `${this.words.severity(finding.severity)}: ${this.words.cause(finding.cause)}`,
      }
    );
  });

  protected readonly ok = computed(() => {
    const reading = this.reading();
    return reading?.kind === 'check' ? reading.ok : null;
  });
  protected readonly choice = computed(() => {
    const reading = this.reading();
    return reading?.kind === 'choice' ? reading.choice : null;
  });
  protected readonly writing = computed(() => {
    const reading = this.reading();
    return reading?.kind === 'text' ? reading.text : '';
  });
  protected readonly photoIds = computed(() => {
    const reading = this.reading();
    return reading?.kind === 'photo' ? reading.photoIds : [];
  });
  /** What was typed, even where it is no number yet. */
  protected readonly typed = linkedSignal<number | null, string>({
    source: () => {
      const reading = this.reading();
      return reading?.kind === 'number' ? reading.value : null;
    },
    computation: (value, before) => {
      if (before && readNumber(before.value) === value) return before.value;
      return value === null ? (before?.value ?? '') : this.format.format(value);
    },
  });
  protected readonly noNumber = computed(
    () => this.typed().trim() !== '' && readNumber(this.typed()) === null,
  );

  protected type(text: string): void {
    this.typed.set(text);
    const value = readNumber(text);
    this.answered.emit(value === null ? null : { kind: 'number', value });
  }

  protected write(text: string): void {
    this.answered.emit(text.trim() === '' ? null : { kind: 'text', text });
  }

  protected takePhotos(photoIds: readonly string[]): void {
    this.answered.emit(photoIds.length === 0 ? null : { kind: 'photo', photoIds });
  }

  private written(part: 'help' | 'caution'): string {
    const text = this.step()[part];
    return text ? this.words.text(text) : '';
  }
}
