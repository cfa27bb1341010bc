import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { Icon } from '../../ui/icon/icon';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { eventWord, reasonWord } from '../sheet-words';
import type { TaskEvent } from '../task-sheet-api';

/** Who did what to a task and when, newest first. */
@Component({
  selector: 'vw-task-history',
  imports: [Icon, TimeInZonePipe],
  template: `
    @if (lines().length > 0) {
      <section>
        <h2><vw-icon name="history" /><span i18n="@@task-sheet.history">Who did what</span></h2>
        <ul>
          @for (line of lines(); track $index) {
            <li>
              <span>
                <strong>{{ line.word }}</strong>
                @if (line.more) {
                  <span>: {{ line.more }}</span>
                }
              </span>
              <span class="vw-secondary vw-small">
                {{ line.by }} · {{ line.at | timeInZone: timeZone() }}
              </span>
            </li>
          }
        </ul>
      </section>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    h2 {
      display: flex;
      gap: var(--vw-space-2);
      align-items: center;
    }
    ul {
      margin: var(--vw-space-2) 0 0;
      padding: 0;
      list-style: none;
    }
    li {
      display: grid;
      padding: var(--vw-space-2) 0;
      border-top: 1px solid var(--vw-line);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TaskHistory {
  readonly events = input.required<readonly TaskEvent[]>();
  /** Zone of the store. */
  readonly timeZone = input.required<string>();

  protected readonly lines = computed(() =>
    this.events().map((event) => ({
      at: event.at,
      by: event.by ?? $localize`:@@task-sheet.by-itself:by itself`,
      word: eventWord(event),
      more: [event.reason ? reasonWord(event.reason) : '', event.note, findingsText(event)]
        .filter(Boolean)
        .join(' · '),
    })),
  );
}

function findingsText({ findings }: TaskEvent): string {
  if (!findings) return '';
  return findings === 1
    ? $localize`:@@task-sheet.one-finding:1 finding`
    : $localize`:@@task-sheet.many-findings:${findings}:count: findings`;
}
