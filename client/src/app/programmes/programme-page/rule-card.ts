import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { localAt } from '@shared/calendar/instant-of';
import { recurrencePreview } from '@shared/programmes/recurrence-preview';
import { LanguageChoice } from '../../session/language-choice';
import { Session } from '../../session/session';
import { audienceWord, placesWords, reachWords, wallText } from '../programme-words';
import type { Rule } from '../programmes-api';
import { WindowPicture } from '../window-picture/window-picture';

/** A rule on its programme's page: how often in words, what, whose hands, where, next dates, window. */
@Component({
  selector: 'vw-rule-card',
  imports: [RouterLink, WindowPicture],
  template: `
    <div class="words">
      <h3>
        <a [routerLink]="['/programmes', rule().programmeId, 'rules', rule().id]">{{
          rule().name
        }}</a>
        @if (rule().retiredAt) {
          &ngsp;<span class="mark" i18n="@@programmes.mark.retired">retired</span>
        }
      </h3>
      <p class="often">{{ rule().words[language] }}</p>
      <p>
        <a [routerLink]="['/procedures', rule().procedureId]">{{
          rule().procedureTitle[language]
        }}</a>
      </p>
      <p class="vw-small vw-secondary">{{ who() }} · {{ where() }} · {{ reach() }}</p>
    </div>
    @if (next().length > 0) {
      <div>
        <p class="vw-small vw-secondary" i18n="@@programmes.next">Next</p>
        <ul>
          @for (date of next(); track date) {
            <li>{{ date }}</li>
          }
        </ul>
      </div>
    }
    <vw-window-picture [plan]="rule().window" [dueTime]="dueTime()" [words]="false" />
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr) 13rem 15rem;
      align-items: start;
      gap: var(--vw-space-3) var(--vw-space-5);
      padding: var(--vw-space-4);
    }
    vw-window-picture {
      grid-column: 3;
      padding-top: var(--vw-space-3);
    }
    @media (width < 900px) {
      :host {
        grid-template-columns: minmax(0, 1fr);
      }
      vw-window-picture {
        grid-column: 1;
        padding-top: 0;
      }
    }
    .words {
      display: grid;
      gap: var(--vw-space-1);
      align-content: start;
    }
    .often {
      font-size: 1.0625rem;
    }
    .mark {
      margin-left: var(--vw-space-2);
      color: var(--vw-ink-2);
      font-size: var(--vw-text-tiny);
      font-weight: 400;
    }
    ul {
      margin: 0;
      padding: 0;
      list-style: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RuleCard {
  private readonly locale = inject(LOCALE_ID);
  private readonly session = inject(Session);
  protected readonly language = inject(LanguageChoice).current;

  readonly rule = input.required<Rule>();

  protected readonly who = computed(() => audienceWord(this.rule().audience));
  protected readonly where = computed(() => placesWords(this.rule()));
  protected readonly reach = computed(() => reachWords(this.rule().reach, this.rule().appliesTo));
  protected readonly dueTime = computed(() => this.rule().recurrence.startsLocal.slice(11, 16));
  protected readonly next = computed(() => {
    if (this.rule().retiredAt) return [];
    const now = localAt(Date.now(), this.session.timeZone());
    const { next } = recurrencePreview(this.rule().recurrence, now, 3, this.session.timeZone());
    return next.map((local) => wallText(local, this.locale));
  });
}
