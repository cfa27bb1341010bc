import {
  ChangeDetectionStrategy,
  Component,
  inject,
  input,
  LOCALE_ID,
  output,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { dateAt } from '@shared/calendar/instant-of';
import { stateWord } from '../../ui/text/state-word';
import { VatGlyph } from '../../ui/vat-glyph/vat-glyph';
import { urgencyText, windowLeft } from '../due-text/due-text';
import type { Task } from '../tasks-api';

/** A few tasks as a list: sign, unit and rule, store, who, and until when. */
@Component({
  selector: 'vw-task-lines',
  imports: [RouterLink, VatGlyph],
  template: `
    <ul>
      @for (task of tasks(); track task.id) {
        <li>
          <vw-vat-glyph [state]="task.state" [level]="level(task)" [decorative]="true" />
          <div class="what">
            <a [routerLink]="['/tasks', task.id]" (click)="followed.emit()">
              @if (task.unitTag) {
                <b>{{ task.unitTag }}</b>
              }
              {{ task.ruleName }}</a
            >
            <p class="vw-small vw-secondary">
              @if (showStore()) {
                {{ task.storeNumber }} {{ task.storeName }} ·
              }
              @if (task.assignee) {
                {{ task.assignee.name }}
              } @else if (task.audience === 'store') {
                <ng-container i18n="@@tasks.store-staff">store staff</ng-container>
              } @else {
                <ng-container i18n="@@tasks.nobody-yet">nobody yet</ng-container>
              }
            </p>
          </div>
          <p class="when vw-small">
            {{ word(task) }}<span class="vw-secondary">{{ until(task) }}</span>
          </p>
        </li>
      }
    </ul>
  `,
  styles: `
    ul {
      margin: 0;
      padding: 0;
      list-style: none;
    }
    li {
      display: flex;
      gap: var(--vw-space-3);
      padding: var(--vw-space-2) 0;
      border-top: 1px solid var(--vw-line);
    }
    li:first-child {
      border-top: 0;
    }
    .what {
      flex: 1;
      min-width: 0;
    }
    a {
      display: inline-block;
      min-height: 24px;
      color: var(--vw-ink);
      text-decoration: none;
    }
    a:hover {
      text-decoration: underline;
    }
    .when {
      display: grid;
      align-content: start;
      text-align: end;
      white-space: nowrap;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TaskLines {
  private readonly locale = inject(LOCALE_ID);

  readonly tasks = input.required<readonly Task[]>();
  readonly showStore = input(true);

  /** A task was opened: time to close what holds the list. */
  readonly followed = output();

  protected level(task: Task): number {
    return windowLeft(task, Date.now());
  }

  protected word(task: Task): string {
    return stateWord(task.state);
  }

  protected until(task: Task): string {
    const pending = ['planned', 'open', 'due-soon', 'overdue'].includes(task.state);
    return pending ? urgencyText(task, dateAt(Date.now(), task.timeZone), this.locale) : '';
  }
}
