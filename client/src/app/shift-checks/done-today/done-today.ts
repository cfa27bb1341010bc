import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Icon } from '../../ui/icon/icon';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { VatGlyph } from '../../ui/vat-glyph/vat-glyph';
import type { Shift } from '../shift-api';

/** What was acknowledged since the store's midnight, by whom and when. */
@Component({
  selector: 'vw-done-today',
  imports: [Icon, RouterLink, TimeInZonePipe, VatGlyph],
  template: `
    @if (done().length > 0) {
      <section>
        <h2><vw-icon name="history" /><span i18n="@@shift-checks.done">Done today</span></h2>
        <ul>
          @for (check of done(); track check.taskId) {
            <li>
              <a [routerLink]="['/tasks', check.taskId, 'sheet']">
                <vw-vat-glyph [state]="check.onTime ? 'done' : 'done-late'" />
                <span class="what">{{ check.ruleName }}</span>
                <span class="vw-secondary vw-small"
                  >{{ check.by }} · {{ check.at | timeInZone: timeZone() : 'time' }}</span
                >
              </a>
            </li>
          }
        </ul>
      </section>
    }
  `,
  styles: `
    :host {
      display: block;
      margin-top: var(--vw-space-6);
    }
    h2 {
      display: flex;
      gap: var(--vw-space-2);
      align-items: center;
      margin-bottom: var(--vw-space-2);
    }
    ul {
      margin: 0;
      padding: 0;
      list-style: none;
    }
    li {
      border-top: 1px solid var(--vw-line);
    }
    a {
      display: flex;
      flex-wrap: wrap;
      gap: 0 var(--vw-space-3);
      align-items: center;
      min-height: 48px;
      color: inherit;
      text-decoration: none;
    }
    .what {
      flex: 1;
    }
    a:hover .what {
      text-decoration: underline;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DoneToday {
  readonly done = input.required<Shift['done']>();
  /** Zone of the store. */
  readonly timeZone = input.required<string>();
}
