import {
  ChangeDetectionStrategy,
  Component,
  inject,
  input,
  LOCALE_ID,
  output,
  signal,
} from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { readLocalDateTime } from '@shared/calendar/local-date-time';
import { Icon } from '../../ui/icon/icon';
import { wallText } from '../programme-words';

/** A list of single days and times, on the store's own clock, that are added or taken out. */
@Component({
  selector: 'vw-date-list',
  imports: [Icon, MatButton, MatFormField, MatIconButton, MatInput, MatLabel],
  template: `
    <fieldset>
      <legend>{{ legend() }}</legend>
      @if (dates().length > 0) {
        <ul>
          @for (date of dates(); track date) {
            <li>
              {{ text(date) }}
              <button matIconButton type="button" (click)="remove(date)">
                <vw-icon name="close" />
                <span class="vw-hidden" i18n="@@programmes.remove-date"
                  >Remove {{ text(date) }}</span
                >
              </button>
            </li>
          }
        </ul>
      }
      <div class="vw-row">
        <mat-form-field appearance="outline" subscriptSizing="dynamic">
          <mat-label i18n="@@programmes.date-time">Day and time</mat-label>
          <input
            matInput
            type="datetime-local"
            [value]="typed()"
            (input)="typed.set($any($event.target).value)"
            (keydown.enter)="$event.preventDefault(); add()"
          />
        </mat-form-field>
        <button matButton type="button" [disabled]="!typed()" (click)="add()">
          <ng-container i18n="@@programmes.add-date">Add</ng-container>
        </button>
      </div>
    </fieldset>
  `,
  styles: `
    fieldset {
      display: grid;
      gap: var(--vw-space-2);
      margin: 0;
      padding: 0;
      border: 0;
    }
    legend {
      padding: 0 0 var(--vw-space-3);
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
    }
    ul {
      display: flex;
      flex-wrap: wrap;
      gap: var(--vw-space-1) var(--vw-space-3);
      margin: 0;
      padding: 0;
      list-style: none;
    }
    li {
      display: inline-flex;
      align-items: center;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DateList {
  private readonly locale = inject(LOCALE_ID);

  readonly legend = input.required<string>();
  readonly dates = input.required<readonly string[]>();

  readonly datesChange = output<string[]>();

  protected readonly typed = signal('');

  protected text(date: string): string {
    return wallText(date, this.locale);
  }

  protected add(): void {
    const date = readLocalDateTime(this.typed());
    if (!date) return;
    this.datesChange.emit([...new Set([...this.dates(), date])].sort());
    this.typed.set('');
  }

  protected remove(date: string): void {
    this.datesChange.emit(this.dates().filter((it) => it !== date));
  }
}
