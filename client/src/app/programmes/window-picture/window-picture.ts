import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { WindowPlan } from '@shared/recurrence/window';
import { VAT } from '../../ui/vat-glyph/vat-shape';
import { windowLines, windowWords } from './window-lines';
import { windowMarks } from './window-marks';

/** A task's window on a small line: when it opens, is due soon, is due, closes, lapses. */
@Component({
  selector: 'vw-window-picture',
  template: `
    <svg viewBox="0 0 100 15" preserveAspectRatio="none" aria-hidden="true" focusable="false">
      <path class="axis" d="M0 10H100" />
      <path class="open" [attr.d]="span(marks().opens, marks().dueSoon)" />
      <path class="soon" [attr.d]="span(marks().dueSoon, marks().closes)" />
      <path
        class="late"
        [class.without-end]="marks().lapses === null"
        [attr.d]="span(marks().closes, marks().lapses ?? 100)"
      />
    </svg>
    <svg class="vat" viewBox="0 0 20 20" aria-hidden="true" [style.left.%]="marks().due">
      <path [attr.d]="vat.walls" />
      <path [attr.d]="vat.rims" />
    </svg>
    @if (words()) {
      <ul>
        @for (line of lines(); track line.moment) {
          <li>
            @if (line.moment === 'due') {
              <svg class="key glyph" viewBox="0 0 20 20" aria-hidden="true">
                <path [attr.d]="vat.walls" />
                <path [attr.d]="vat.rims" />
              </svg>
            } @else if (line.moment !== 'closes') {
              <span class="key" [class]="line.moment"></span>
            }
            {{ line.words }}
          </li>
        }
      </ul>
    } @else {
      <span class="vw-hidden">{{ told() }}</span>
    }
  `,
  styles: `
    :host {
      position: relative;
      display: block;
    }
    svg {
      display: block;
      width: 100%;
      height: 30px;
      fill: none;
    }
    path {
      vector-effect: non-scaling-stroke;
    }
    .axis {
      stroke: var(--vw-line);
      stroke-width: 1.5;
    }
    path.open,
    path.soon,
    path.late {
      stroke-width: 7;
    }
    path.open {
      stroke: var(--vw-steel);
    }
    path.soon {
      stroke: var(--vw-amber);
    }
    path.late {
      stroke: var(--vw-vermilion);
      stroke-width: 2.5;
    }
    .without-end {
      stroke-dasharray: 4 4;
    }
    .vat {
      position: absolute;
      top: -3px;
      width: 18px;
      height: 18px;
      margin-left: -9px;
      stroke: var(--vw-ink);
      stroke-width: 1.6;
    }
    li {
      display: inline-flex;
      gap: var(--vw-space-2);
      align-items: center;
    }
    .key {
      flex: none;
      width: 16px;
      height: 6px;
      border-radius: 1px;
      background: var(--vw-steel);
    }
    .key.soon {
      background: var(--vw-amber);
    }
    .key.late {
      height: 3px;
      background: var(--vw-vermilion);
    }
    .glyph {
      height: 16px;
      background: none;
      stroke: var(--vw-ink);
      stroke-width: 1.6;
    }
    ul {
      display: flex;
      flex-wrap: wrap;
      gap: var(--vw-space-1) var(--vw-space-4);
      margin: 0;
      padding: 0;
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
      list-style: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WindowPicture {
  readonly plan = input.required<WindowPlan>();
  /** Time of day at which it is due, HH:MM. */
  readonly dueTime = input('12:00');
  /** Whether the words stand under the picture, or only for those who do not see it. */
  readonly words = input(true);

  protected readonly vat = VAT;
  protected readonly marks = computed(() => {
    const [hours = 0, minutes = 0] = this.dueTime().split(':').map(Number);
    return windowMarks(this.plan(), (hours * 60 + minutes) / 1440);
  });
  protected readonly lines = computed(() => windowLines(this.plan(), this.dueTime()));

  protected readonly told = computed(() => windowWords(this.plan(), this.dueTime()));

  protected span(from: number, to: number): string {
    return `M${from} 10H${Math.max(from, to)}`;
  }
}
