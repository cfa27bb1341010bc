import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
} from '@angular/core';
import { LanguageChoice } from '../../session/language-choice';
import type { Rule } from '../programmes-api';
import { NextDates } from '../recurrence-editor/next-dates';
import { definitionLines } from '../rule-changes/definition-lines';
import { WindowPicture } from '../window-picture/window-picture';

/** A rule for those who may read but not change it. */
@Component({
  selector: 'vw-rule-view',
  imports: [NextDates, WindowPicture],
  template: `
    <div class="vw-sheet says">
      <h2 class="vw-hidden" i18n="@@programmes.says">What it says</h2>
      <dl>
        @for (line of lines(); track line.key) {
          <dt>{{ line.label }}</dt>
          <dd>{{ line.value }}</dd>
        }
      </dl>
      <vw-window-picture [plan]="rule().window" [dueTime]="dueTime()" />
    </div>
    <vw-next-dates [recurrence]="rule().recurrence" />
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr) minmax(16rem, 22rem);
      gap: var(--vw-space-4);
      align-items: start;
    }
    .says {
      display: grid;
      gap: var(--vw-space-4);
      padding: var(--vw-space-4);
    }
    dl {
      display: grid;
      grid-template-columns: minmax(7rem, max-content) minmax(0, 1fr);
      gap: var(--vw-space-2) var(--vw-space-5);
    }
    dt {
      color: var(--vw-ink-2);
    }
    dd {
      white-space: pre-line;
      overflow-wrap: anywhere;
    }
    @media (width < 900px) {
      :host {
        grid-template-columns: minmax(0, 1fr);
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RuleView {
  private readonly locale = inject(LOCALE_ID);
  private readonly language = inject(LanguageChoice).current;

  readonly rule = input.required<Rule>();
  /** Titles of procedures by id. */
  readonly procedures = input.required<ReadonlyMap<string, string>>();

  protected readonly dueTime = computed(() => this.rule().recurrence.startsLocal.slice(11, 16));
  protected readonly lines = computed(() =>
    definitionLines(this.rule(), {
      language: this.language,
      locale: this.locale,
      procedure: (id) => this.procedures().get(id) ?? id,
    }),
  );
}
