import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Severity } from '@shared/findings/cause';
import { causeWords, severityWords } from '@shared/findings/cause';
import type {
  LocalizedText,
  ProcedureContent,
  ProcedureStep,
} from '@shared/procedures/procedure-content';
import type { Language } from '../../session/language-choice';
import { Caution } from '../../ui/caution/caution';
import { componentWord, kindWord, limitWords } from '../procedure-words';

/** A procedure as whoever does it reads it: cautions first, then what to bring, then the steps. */
@Component({
  selector: 'vw-procedure-view',
  imports: [Caution],
  templateUrl: './procedure-view.html',
  styleUrl: './procedure-view.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProcedureView {
  readonly content = input.required<ProcedureContent>();
  readonly language = input.required<Language>();

  protected readonly steps = computed(() =>
    this.content().steps.map((step) => ({
      step,
      kind: kindWord(step.kind),
      component: step.component ? componentWord(step.component) : '',
      limit: step.kind === 'number' ? limitWords(step.number) : '',
      basis: step.kind === 'number' ? step.number.basis : undefined,
      finding: this.findingWords(step),
    })),
  );

  protected written(text: LocalizedText | undefined): string {
    return text?.[this.language()] ?? '';
  }

  protected severityWord(severity: Severity): string {
    return severityWords[severity][this.language()];
  }

  /** What a reading out of its limits turns into. */
  private findingWords(step: ProcedureStep): string {
    if (!step.severity || step.kind === 'choice') return '';
    const cause = causeWords[step.cause ?? 'other'][this.language()];
    return `${this.severityWord(step.severity)}: ${cause}`;
  }
}
