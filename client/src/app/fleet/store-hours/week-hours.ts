import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
} from '@angular/core';
import type { StoreHours, WeekdayCode } from '@shared/fleet/store-hours';
import { daySpans } from './day-spans';
import { openWords, runsOfDays, rushWords, weekdayName } from './hours-words';

/** A store's week: a bar per day, open hours in steel, rush windows across them in amber. */
@Component({
  selector: 'vw-week-hours',
  template: `
    <dl>
      @for (day of days(); track day.code) {
        <div class="day">
          <dt>{{ day.name }}</dt>
          <dd>
            <span class="bar" aria-hidden="true">
              @if (day.spans.open; as open) {
                <span class="open" [style.left.%]="open.start" [style.width.%]="open.width"></span>
              }
              @for (rush of day.spans.rush; track rush.start) {
                <span class="rush" [style.left.%]="rush.start" [style.width.%]="rush.width"></span>
              }
            </span>
            <span class="words">{{ day.open }}</span>
            @if (day.rush) {
              <span class="words"
                ><ng-container i18n="@@fleet.hours.no-work">no work on the line</ng-container>
                {{ day.rush }}</span
              >
            }
          </dd>
        </div>
      }
    </dl>
  `,
  styles: `
    dl {
      display: grid;
      gap: var(--vw-space-2);
    }
    .day {
      display: grid;
      grid-template-columns: 5.5rem 1fr;
      gap: var(--vw-space-2);
      align-items: start;
    }
    dt {
      font-weight: 600;
      text-transform: capitalize;
    }
    .bar {
      position: relative;
      display: block;
      height: 10px;
      margin: 6px 0 2px;
      overflow: hidden;
      border-radius: 5px;
      background: var(--vw-rest);
      box-shadow: inset 0 0 0 1px var(--vw-line);
    }
    .open,
    .rush {
      position: absolute;
      inset-block: 0;
    }
    .open {
      background: var(--vw-steel-tint);
    }
    .rush {
      background: var(--vw-amber);
    }
    .words {
      display: block;
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WeekHours {
  private readonly locale = inject(LOCALE_ID);

  readonly hours = input.required<StoreHours>();

  /** Days that follow one another with the same hours stand as one. */
  protected readonly days = computed(() =>
    runsOfDays(this.hours()).map(({ first, last, day }) => ({
      code: first,
      name: this.nameOf(first, last),
      spans: daySpans(day),
      open: openWords(day, this.locale),
      rush: rushWords(day, this.locale),
    })),
  );

  private nameOf(first: WeekdayCode, last: WeekdayCode): string {
    const from = weekdayName(first, this.locale, 'short');
    return first === last ? from : `${from} – ${weekdayName(last, this.locale, 'short')}`;
  }
}
