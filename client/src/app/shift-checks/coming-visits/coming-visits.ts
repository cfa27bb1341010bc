import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
} from '@angular/core';
import { minutesText } from '../../today/today-words';
import { Icon } from '../../ui/icon/icon';
import { calendarDay } from '../../ui/text/calendar-day';
import type { Shift } from '../shift-api';

/** Who comes to the store, when, and for how long. */
@Component({
  selector: 'vw-coming-visits',
  imports: [Icon],
  template: `
    <section>
      <h2><vw-icon name="calendar" /><span i18n="@@shift-checks.visits">Who comes when</span></h2>
      @if (lines().length > 0) {
        <ul>
          @for (visit of lines(); track visit.id) {
            <li>
              <strong>{{ visit.day }}</strong>
              <span>{{ visit.technician }}</span>
              <span class="vw-secondary">{{ visit.work }}</span>
              @if (visit.note) {
                <span class="note">{{ visit.note }}</span>
              }
            </li>
          }
        </ul>
      } @else {
        <p class="vw-secondary" i18n="@@shift-checks.no-visits">
          Nobody is announced for the next two weeks.
        </p>
      }
    </section>
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
      display: grid;
      grid-template-columns: 8rem 1fr auto;
      gap: 0 var(--vw-space-3);
      align-items: center;
      min-height: 44px;
      border-top: 1px solid var(--vw-line);
    }
    .note {
      grid-column: 2 / -1;
      padding-bottom: var(--vw-space-2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComingVisits {
  private readonly locale = inject(LOCALE_ID);

  readonly visits = input.required<Shift['visits']>();

  protected readonly lines = computed(() =>
    this.visits().map(({ id, onDate, technician, note, minutes }) => ({
      id,
      technician,
      note,
      day: calendarDay(onDate, this.locale),
      work: minutes > 0 ? minutesText(minutes) : '',
    })),
  );
}
