import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { problemWords } from '../../problems/problem-words';
import { LanguageChoice } from '../../session/language-choice';
import { PageError } from '../../ui/page-states/page-error';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { Session } from '../../session/session';
import { ProgrammesApi } from '../programmes-api';
import { RuleChanges } from '../rule-changes/rule-changes';

/** What a rule said before: each revision with who made it when, and what it changed. */
@Component({
  selector: 'vw-rule-history',
  imports: [PageError, PageLoading, RuleChanges, TimeInZonePipe],
  template: `
    @if (fault(); as words) {
      <vw-page-error
        [heading]="words.title"
        [advice]="words.advice"
        [requestId]="words.requestId"
        (again)="revisions.reload()"
      />
    } @else if (revisions.hasValue()) {
      <ol reversed>
        @for (item of rows(); track item.revision) {
          <li>
            <h3>
              <ng-container i18n="@@programmes.revision">Revision {{ item.revision }}</ng-container>
              @if ($first) {
                &ngsp;<span class="mark" i18n="@@programmes.in-force">in force</span>
              }
            </h3>
            <p class="vw-small vw-secondary">
              {{ item.madeAt | timeInZone: zone() }}
              @if (item.madeBy) {
                · {{ item.madeBy }}
              }
            </p>
            <p>{{ item.words[language] }}</p>
            @if (item.before; as before) {
              <vw-rule-changes [from]="before" [to]="item.definition" [procedures]="procedures()" />
            }
          </li>
        }
      </ol>
    } @else {
      <vw-page-loading [lines]="3" />
    }
  `,
  styles: `
    ol {
      display: grid;
      gap: var(--vw-space-4);
      margin: 0;
      padding: 0;
      list-style: none;
    }
    li {
      display: grid;
      gap: var(--vw-space-1);
      padding-left: var(--vw-space-4);
      border-left: 3px solid var(--vw-line);
    }
    li:first-child {
      border-color: var(--vw-kelp);
    }
    .mark {
      margin-left: var(--vw-space-2);
      color: var(--vw-kelp-deep);
      font-size: var(--vw-text-tiny);
    }
    vw-rule-changes {
      margin-top: var(--vw-space-2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RuleHistory {
  private readonly api = inject(ProgrammesApi);
  protected readonly language = inject(LanguageChoice).current;
  protected readonly zone = inject(Session).timeZone;

  readonly ruleId = input.required<string>();
  /** The revision in force; a new one is read when it grows. */
  readonly revision = input.required<number>();
  /** Titles of procedures by id. */
  readonly procedures = input.required<ReadonlyMap<string, string>>();

  protected readonly revisions = this.api.revisions(() =>
    this.revision() > 0 ? this.ruleId() : '',
  );
  protected readonly fault = computed(() => {
    const error = this.revisions.error();
    return error ? problemWords(error) : null;
  });
  protected readonly rows = computed(() => {
    const { rows } = this.revisions.hasValue() ? this.revisions.value() : { rows: [] };
    return rows.map((row, index) => ({ ...row, before: rows[index + 1]?.definition ?? null }));
  });
}
