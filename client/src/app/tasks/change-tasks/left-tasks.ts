import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { Icon } from '../../ui/icon/icon';
import { ChangeTasks } from './change-tasks';
import { changedWords, leftWords } from './change-words';

/** What the last change left as it was, task by task, with its reason. */
@Component({
  selector: 'vw-left-tasks',
  imports: [Icon, MatButton, RouterLink],
  template: `
    @if (changing.incomplete(); as change) {
      <section class="box" role="status">
        <vw-icon name="info" />
        <div class="words">
          <p class="head">
            @if (change.changed > 0) {
              {{ changed() }}
            }
            @if (left().length === 1) {
              <ng-container i18n="@@tasks.left-one">1 was left as it was:</ng-container>
            } @else {
              <ng-container i18n="@@tasks.left-many"
                >{{ left().length }} were left as they were:</ng-container
              >
            }
          </p>
          <ul>
            @for (line of left(); track line.id) {
              <li>
                <a [routerLink]="['/tasks', line.id]">{{ line.name }}</a>: {{ line.why }}
              </li>
            }
          </ul>
        </div>
        <div class="acts">
          @if (change.changed > 0) {
            <button matButton type="button" (click)="changing.undo(change)" i18n="@@tasks.undo">
              Undo
            </button>
          }
          <button
            matButton
            type="button"
            (click)="changing.incomplete.set(null)"
            i18n="@@tasks.close"
          >
            Close
          </button>
        </div>
      </section>
    }
  `,
  styles: `
    .box {
      display: flex;
      flex-wrap: wrap;
      gap: var(--vw-space-3);
      padding: var(--vw-space-3) var(--vw-space-4);
      border-radius: var(--vw-radius);
      background: var(--vw-amber-tint);
    }
    .words {
      flex: 1 1 16rem;
    }
    .head {
      font-weight: 600;
    }
    ul {
      max-height: 12rem;
      margin: 2px 0 0;
      padding-left: 1.1em;
      overflow: auto;
    }
    a {
      color: inherit;
    }
    .acts {
      display: flex;
      align-items: start;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeftTasks {
  protected readonly changing = inject(ChangeTasks);

  protected readonly changed = computed(() => {
    const change = this.changing.incomplete();
    return change ? changedWords(change.kind, change.changed) : '';
  });
  protected readonly left = computed(() =>
    (this.changing.incomplete()?.results ?? []).flatMap(
      ({ taskId, storeNumber, unitTag, ruleName, left }) =>
        left
          ? [
              {
                id: taskId,
                name: [storeNumber, unitTag, ruleName].filter(Boolean).join(' · ') || '–',
                why: leftWords(left),
              },
            ]
          : [],
    ),
  );
}
