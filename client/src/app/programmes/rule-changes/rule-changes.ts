import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
} from '@angular/core';
import type { RuleDefinition } from '@shared/programmes/rule-definition';
import { LanguageChoice } from '../../session/language-choice';
import { definitionChanges } from './definition-lines';

/** What differs between two definitions of a rule, old beside new. */
@Component({
  selector: 'vw-rule-changes',
  template: `
    @if (changes().length === 0) {
      <p class="vw-secondary" i18n="@@programmes.no-changes">Nothing differs.</p>
    } @else {
      <dl>
        @for (change of changes(); track change.key) {
          <dt>{{ change.label }}</dt>
          <dd>
            @if (change.before) {
              <del>{{ change.before }}</del>
            }
            @if (change.value) {
              <ins>{{ change.value }}</ins>
            }
          </dd>
        }
      </dl>
    }
  `,
  styles: `
    dl {
      display: grid;
      grid-template-columns: minmax(7rem, max-content) minmax(0, 1fr);
      gap: var(--vw-space-2) var(--vw-space-4);
    }
    dt {
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
      line-height: 1.6;
    }
    del,
    ins {
      display: block;
      white-space: pre-line;
      overflow-wrap: anywhere;
    }
    del {
      color: var(--vw-ink-2);
    }
    ins {
      text-decoration-color: var(--vw-kelp);
      text-underline-offset: 0.2em;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RuleChanges {
  private readonly locale = inject(LOCALE_ID);
  private readonly language = inject(LanguageChoice).current;

  readonly from = input.required<RuleDefinition>();
  readonly to = input.required<RuleDefinition>();
  /** Titles of procedures by id. */
  readonly procedures = input.required<ReadonlyMap<string, string>>();

  protected readonly changes = computed(() =>
    definitionChanges(this.from(), this.to(), {
      language: this.language,
      locale: this.locale,
      procedure: (id) => this.procedures().get(id) ?? id,
    }),
  );
}
