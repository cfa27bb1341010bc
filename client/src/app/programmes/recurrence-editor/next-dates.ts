import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
  signal,
} from '@angular/core';
import { MatOption } from '@angular/material/core';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatSelect } from '@angular/material/select';
import { localAt } from '@shared/calendar/instant-of';
import { recurrenceProblems } from '@shared/programmes/recurrence-problems';
import type { Recurrence } from '@shared/programmes/recurrence-set';
import { asRecurrenceSet } from '@shared/programmes/recurrence-set';
import { recurrenceWords } from '@shared/programmes/recurrence-words';
import { nextZonedOccurrences } from '@shared/recurrence/zoned-occurrences';
import { LanguageChoice } from '../../session/language-choice';
import { Session } from '../../session/session';
import { zoneName } from '../../ui/text/zoned-text';
import { wallText } from '../programme-words';
import { previewZones } from './preview-zones';
import { recurrenceProblemWords } from './problem-words';

/** How many dates are shown. */
const SHOWN = 12;

/**
 * A recurrence in words with its next dates on the clock of a store, or what is wrong with which of
 * its parts.
 */
@Component({
  selector: 'vw-next-dates',
  imports: [MatFormField, MatLabel, MatOption, MatSelect],
  template: `
    @if (problems().length > 0) {
      <h3 i18n="@@programmes.problems">This cannot be used yet</h3>
      <ul class="faults">
        @for (problem of problems(); track $index) {
          <li>{{ problem }}</li>
        }
      </ul>
    } @else {
      <p class="sentence">{{ sentence() }}</p>
      <h3 i18n="@@programmes.next-dates">Next dates</h3>
      <mat-form-field appearance="outline" subscriptSizing="dynamic">
        <mat-label i18n="@@programmes.store-in">At a store in</mat-label>
        <mat-select [value]="zone()" (valueChange)="zone.set($event)">
          @for (item of zones; track item.id) {
            <mat-option [value]="item.id">{{ item.name }}</mat-option>
          }
        </mat-select>
      </mat-form-field>
      @if (next().length === 0) {
        <p class="vw-secondary" i18n="@@programmes.no-dates">It has none from now on.</p>
      } @else {
        <ol>
          @for (item of next(); track item.local) {
            <li>{{ item.words }}</li>
          }
        </ol>
      }
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: var(--vw-space-2);
      padding: var(--vw-space-4);
      overflow-wrap: anywhere;
    }
    .sentence {
      color: var(--vw-kelp-deep);
      font-size: 1.0625rem;
      font-weight: 600;
    }
    h3 {
      margin-top: var(--vw-space-2);
      font-size: var(--vw-text-small);
    }
    ol,
    ul {
      margin: 0;
      padding: 0;
      list-style: none;
    }
    .faults {
      display: grid;
      gap: var(--vw-space-2);
      color: var(--vw-vermilion);
    }
  `,
  host: { class: 'vw-sheet' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NextDates {
  private readonly locale = inject(LOCALE_ID);
  private readonly language = inject(LanguageChoice).current;

  readonly recurrence = input.required<Recurrence>();

  private readonly found = computed(() => recurrenceProblems(this.recurrence()));
  protected readonly problems = computed(() =>
    this.found().map((problem) => recurrenceProblemWords(problem)),
  );
  protected readonly sentence = computed(() =>
    this.found().length > 0 ? '' : recurrenceWords(this.recurrence())[this.language],
  );
  protected readonly zones = previewZones(inject(Session).timeZone(), this.locale);
  protected readonly zone = signal(this.zones[0]?.id ?? 'UTC');
  protected readonly next = computed(() => {
    if (this.found().length > 0) return [];
    const zone = this.zone();
    const set = asRecurrenceSet(this.recurrence());
    return nextZonedOccurrences(set, zone, Date.now(), SHOWN).map(({ local, instant }) => ({
      local,
      words: `${wallText(localAt(instant, zone), this.locale)} ${zoneName(new Date(instant), zone, this.locale)}`,
    }));
  });
}
