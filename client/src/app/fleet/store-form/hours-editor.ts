import { ChangeDetectionStrategy, Component, inject, input, LOCALE_ID } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { weekdayName, weekdays } from '../store-hours/hours-words';
import { RushList } from './rush-list';
import type { HoursForm } from './store-form-model';

/** The usual day of a store, and the days that differ from it. */
@Component({
  selector: 'vw-hours-editor',
  imports: [MatFormField, MatInput, MatLabel, ReactiveFormsModule, RushList],
  templateUrl: './hours-editor.html',
  styles: `
    .pair {
      display: grid;
      grid-template-columns: repeat(2, minmax(0, 9.5rem));
      gap: var(--vw-space-2);
      margin-bottom: var(--vw-space-3);
    }
    .hint {
      margin-bottom: var(--vw-space-4);
    }
    .days {
      display: grid;
      margin-top: var(--vw-space-3);
      border-top: 1px solid var(--vw-line);
    }
    .day {
      display: grid;
      grid-template-columns: 7rem 11rem minmax(0, 1fr);
      gap: var(--vw-space-2) var(--vw-space-3);
      align-items: start;
      padding: var(--vw-space-2) 0;
      border-bottom: 1px solid var(--vw-line);
    }
    .name {
      min-height: 44px;
      line-height: 44px;
      font-weight: 600;
      text-transform: capitalize;
    }
    select {
      width: 100%;
      min-height: 44px;
      padding: 0 var(--vw-space-2);
      border: 1px solid var(--vw-edge);
      border-radius: 8px;
      background: var(--vw-card);
      color: var(--vw-ink);
      font: inherit;
    }
    .own {
      padding-top: var(--vw-space-1);
    }
    @media (width < 720px) {
      .day {
        grid-template-columns: 6rem minmax(0, 1fr);
      }
      .own {
        grid-column: 1 / -1;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HoursEditor {
  private readonly locale = inject(LOCALE_ID);

  readonly form = input.required<HoursForm>();

  protected readonly days = weekdays.map((code) => ({
    code,
    name: weekdayName(code, this.locale, 'long'),
  }));
}
