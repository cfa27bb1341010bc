import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
  output,
} from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { dayInWindow } from '@shared/visits/day-in-window';
import { calendarDay } from '../../ui/text/calendar-day';
import { Icon } from '../../ui/icon/icon';
import { VatGlyph } from '../../ui/vat-glyph/vat-glyph';
import type { PlannedTask, Visit } from '../visits-api';
import { hoursText, minutesText, taskText } from '../visit-words';

/** One stop of a route being planned: where, when the line is busy, and what is to be done. */
@Component({
  selector: 'vw-visit-card',
  imports: [Icon, MatIconButton, MatMenu, MatMenuItem, MatMenuTrigger, VatGlyph],
  templateUrl: './visit-card.html',
  styleUrl: './visit-card.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VisitCard {
  private readonly locale = inject(LOCALE_ID);

  readonly visit = input.required<Visit>();
  readonly day = input.required<string>();
  readonly first = input(false);
  readonly last = input(false);
  /** Past days are shown and not changed. */
  readonly fixed = input(false);

  readonly up = output();
  readonly down = output();
  readonly edited = output();
  readonly removed = output();

  protected readonly name = computed(
    () => `${this.visit().store.number} ${this.visit().store.name}`,
  );
  protected readonly hours = computed(() => hoursText(this.visit().hours, this.locale));
  protected readonly minutes = computed(() => minutesText(this.visit().minutes));
  protected readonly tasks = computed(() =>
    this.visit().tasks.map((task) => ({ task, text: taskText(task), ...this.whenOf(task) })),
  );

  private whenOf(task: PlannedTask): { readonly when: string; readonly wrong: boolean } {
    if (task.state === 'done' || task.state === 'done-late') {
      return { when: $localize`:@@visits.done:done`, wrong: false };
    }
    const day = (date: string) =>
      calendarDay(date, this.locale, { month: 'short', day: 'numeric' });
    switch (dayInWindow(this.day(), task)) {
      case 'early':
        return { when: $localize`:@@visits.opens:opens ${day(task.opensOn)}:day:`, wrong: true };
      case 'late':
        return {
          when: $localize`:@@visits.closed-on:closed ${day(task.closesOn)}:day:`,
          wrong: true,
        };
      case 'in-window':
        return { when: $localize`:@@visits.until:to ${day(task.closesOn)}:day:`, wrong: false };
    }
  }
}
