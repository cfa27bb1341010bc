import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
} from '@angular/core';
import { Icon } from '../../ui/icon/icon';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { FindingWords } from '../finding-words';
import type { TaskSheet } from '../findings-api';
import { readingLines } from './reading-line';

/** What was entered at each step of an inspection, beside its limit; those out of limit stand out. */
@Component({
  selector: 'vw-inspection-readings',
  imports: [Icon, TimeInZonePipe],
  template: `
    <p class="vw-small vw-secondary">{{ title() }}</p>
    @if (sheet().inspection; as inspection) {
      <p class="vw-small vw-secondary">
        <ng-container i18n="@@findings.inspected-by"
          >{{ inspection.by }},
          {{ inspection.finishedAt | timeInZone: sheet().task.timeZone }}</ng-container
        >
      </p>
      <ol>
        @for (line of lines(); track line.key) {
          <li [class.out]="line.withinLimits === false">
            <span class="step">{{ line.step }}</span>
            <span class="entered">
              @if (line.withinLimits === false) {
                <vw-icon name="warning" />
                <span class="vw-hidden" i18n="@@findings.reading.out">Out of limit:</span>
              } @else if (line.withinLimits) {
                <vw-icon name="check" class="within" />
              }
              {{ line.entered }}
            </span>
            @if (line.limit) {
              <span class="limit">{{ line.limit }}</span>
            }
          </li>
        }
      </ol>
      @if (inspection.note) {
        <p class="note">{{ inspection.note }}</p>
      }
    } @else {
      <p i18n="@@findings.inspection-undone">The inspection was taken back since.</p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: var(--vw-space-1);
    }
    ol {
      margin: var(--vw-space-2) 0 0;
      padding: 0;
      list-style: none;
    }
    li {
      display: grid;
      grid-template-columns: minmax(0, 1fr) minmax(8rem, auto);
      gap: 0 var(--vw-space-4);
      padding: var(--vw-space-2) 0;
      border-top: 1px solid var(--vw-line);
    }
    .entered {
      display: flex;
      gap: 6px;
      justify-content: flex-end;
      text-align: end;
    }
    .entered vw-icon {
      margin-top: 1px;
    }
    .within {
      color: var(--vw-kelp);
    }
    .limit {
      grid-column: 2;
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
      text-align: end;
    }
    .out {
      margin-inline: calc(-1 * var(--vw-space-2));
      padding-inline: var(--vw-space-2);
      border-radius: var(--vw-radius);
      background: var(--vw-vermilion-tint);
    }
    .out .entered {
      color: var(--vw-vermilion);
      font-weight: 600;
    }
    .out .limit {
      color: var(--vw-ink);
    }
    .note {
      padding-top: var(--vw-space-2);
      border-top: 1px solid var(--vw-line);
      white-space: pre-line;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InspectionReadings {
  readonly sheet = input.required<TaskSheet>();

  private readonly words = inject(FindingWords);
  private readonly format = new Intl.NumberFormat(inject(LOCALE_ID), { maximumFractionDigits: 3 });

  protected readonly title = computed(() => this.words.text(this.sheet().procedure.title));
  protected readonly lines = computed(() =>
    readingLines(
      this.sheet(),
      (both) => this.words.text(both),
      (value) => this.format.format(value),
    ),
  );
}
