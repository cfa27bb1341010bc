import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { ProblemView } from '../../problems/problem-view';
import { LanguageChoice } from '../../session/language-choice';
import { Session } from '../../session/session';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { TasksApi } from '../tasks-api';
import { eventWords } from './event-words';

/** Why a task is here: the rule and revision that made it occur, and what people did since. */
@Component({
  selector: 'vw-why-task',
  imports: [PageLoading, ProblemView, RouterLink, TimeInZonePipe],
  template: `
    @if (resource.error(); as failure) {
      <vw-problem-view [failure]="failure" (again)="resource.reload()" />
    } @else if (why(); as why) {
      @for (sentence of why.sentences[language]; track $index) {
        <p>{{ sentence }}</p>
      }
      @if (mayReadRules) {
        <p>
          <a [routerLink]="['/programmes', why.rule.programmeId, 'rules', why.rule.id]">
            <ng-container i18n="@@tasks.why.rule">The rule “{{ why.rule.name }}”</ng-container>
          </a>
        </p>
      }
      @if (why.events.length > 0) {
        <h3 i18n="@@tasks.why.events">What people did with it</h3>
        <ul>
          @for (event of why.events; track $index) {
            <li>
              <span class="at">{{ event.at | timeInZone: why.timeZone }}</span>
              {{ words(event.action) }}
              @if (event.by) {
                <span class="vw-secondary">· {{ event.by }}</span>
              }
            </li>
          }
        </ul>
      }
    } @else {
      <vw-page-loading [lines]="3" />
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: var(--vw-space-2);
      max-width: 65ch;
    }
    h3 {
      margin-top: var(--vw-space-2);
    }
    ul {
      display: grid;
      gap: 6px;
      margin: 0;
      padding: 0;
      list-style: none;
    }
    .at {
      display: inline-block;
      min-width: 11rem;
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WhyTask {
  readonly taskId = input.required<string>();
  /** Changes when the task was changed, so that this is read again. */
  readonly version = input(0);

  protected readonly language = inject(LanguageChoice).current;
  protected readonly mayReadRules = inject(Session).can('programmes.read');
  protected readonly words = eventWords;
  protected readonly resource = inject(TasksApi).why(() => {
    this.version();
    return this.taskId();
  });
  protected readonly why = computed(() =>
    this.resource.hasValue() ? this.resource.value() : null,
  );
}
