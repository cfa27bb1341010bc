import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** A large number and what it means, with the count behind it. */
@Component({
  selector: 'vw-figure',
  template: `
    <span class="value" [class.alarm]="tone() === 'alarm'" [class.due]="tone() === 'due'">{{
      value()
    }}</span>
    <span class="meaning">{{ meaning() }}</span>
  `,
  styles: `
    :host {
      display: grid;
      line-height: 1.25;
    }
    .value {
      font-size: 1.6875rem;
      font-variant-numeric: tabular-nums;
    }
    .alarm {
      color: var(--vw-vermilion);
    }
    .due {
      color: var(--vw-amber-ink);
    }
    .meaning {
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Figure {
  /** Written out already, with its unit. */
  readonly value = input.required<string | number>();
  readonly meaning = input.required<string>();
  readonly tone = input<'plain' | 'due' | 'alarm'>('plain');
}
