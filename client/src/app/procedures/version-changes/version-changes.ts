import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { causeWords, severityWords } from '@shared/findings/cause';
import type { VersionChange } from '@shared/procedures/compare-versions';
import { compareVersions } from '@shared/procedures/compare-versions';
import type { ProcedureContent } from '@shared/procedures/procedure-content';
import type { Language } from '../../session/language-choice';
import { changeWord, fieldWord, valueWords } from './change-words';

/** What differs between two versions, one line each, old beside new. */
@Component({
  selector: 'vw-version-changes',
  template: `
    @if (lines().length === 0) {
      <p class="vw-secondary" i18n="@@procedures.no-changes">Nothing differs.</p>
    } @else {
      <ul>
        @for (line of lines(); track $index) {
          <li [class]="line.kind">
            <p class="what">
              <strong>{{ line.where }}</strong> {{ line.word }}
            </p>
            @if (line.before !== '') {
              <p class="before">
                <del>{{ line.before }}</del>
              </p>
            }
            @if (line.after !== '') {
              <p class="after">
                <ins>{{ line.after }}</ins>
              </p>
            }
          </li>
        }
      </ul>
    }
  `,
  styles: `
    ul {
      display: grid;
      gap: var(--vw-space-3);
      margin: 0;
      padding: 0;
      list-style: none;
    }
    li {
      padding-left: var(--vw-space-3);
      border-left: 3px solid var(--vw-steel);
    }
    li.added {
      border-color: var(--vw-kelp);
    }
    li.removed {
      border-color: var(--vw-vermilion);
    }
    .what {
      font-size: var(--vw-text-small);
    }
    .before,
    .after {
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
export class VersionChanges {
  readonly from = input.required<ProcedureContent>();
  readonly to = input.required<ProcedureContent>();
  readonly language = input.required<Language>();

  protected readonly lines = computed(() =>
    compareVersions(this.from(), this.to()).map((change) => ({
      kind: change.kind,
      where: this.where(change),
      word: changeWord(change.kind),
      before: this.show(change, change.before),
      after: this.show(change, change.after),
    })),
  );

  private where(change: VersionChange): string {
    if (change.step === null) return fieldWord(change.part);
    const inNew = this.to().steps.findIndex(({ key }) => key === change.step);
    const inOld = this.from().steps.findIndex(({ key }) => key === change.step);
    const number = (inNew >= 0 ? inNew : inOld) + 1;
    const step = $localize`:@@procedures.step-number:Step ${number}:number:`;
    return change.field ? `${step}, ${fieldWord(change.field)}` : step;
  }

  private show(change: VersionChange, value: unknown): string {
    if (change.field === 'cause' && typeof value === 'string') {
      return causeWords[value as keyof typeof causeWords][this.language()];
    }
    if (change.field === 'severity' && typeof value === 'string') {
      return severityWords[value as keyof typeof severityWords][this.language()];
    }
    return valueWords(value, this.language());
  }
}
