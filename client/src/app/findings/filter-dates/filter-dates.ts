import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

/** The change of one end of the span; null takes it away. */
export type DatesChange = Readonly<Record<'from' | 'to', string | null>>;

/** A span of days by the browser's own date fields; either end may be open. */
@Component({
  selector: 'vw-filter-dates',
  template: `
    <label class="frame" [class.set]="from() !== ''">
      <span class="label" i18n="@@findings.filter.from">From</span>
      <input
        type="date"
        [value]="from()"
        [max]="to()"
        (change)="chosen.emit({ from: valueOf($event), to: to() || null })"
      />
    </label>
    <label class="frame" [class.set]="to() !== ''">
      <span class="label" i18n="@@findings.filter.to">To</span>
      <input
        type="date"
        [value]="to()"
        [min]="from()"
        (change)="chosen.emit({ from: from() || null, to: valueOf($event) })"
      />
    </label>
  `,
  styles: `
    :host {
      display: contents;
    }
    .frame {
      display: flex;
      align-items: center;
      gap: 6px;
      height: 40px;
      padding: 0 8px 0 12px;
      background: var(--vw-card);
      border: 1px solid var(--vw-edge);
      border-radius: var(--vw-radius);
    }
    .frame:focus-within {
      outline: 2px solid var(--vw-kelp);
      outline-offset: -1px;
    }
    .set {
      border-color: var(--vw-kelp);
    }
    .label {
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
    }
    input {
      flex: 1;
      min-width: 0;
      height: 100%;
      padding: 0;
      border: 0;
      background: none;
      color: var(--vw-ink);
      font: inherit;
    }
    input:focus-visible {
      outline: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FilterDates {
  readonly from = input('');
  readonly to = input('');

  readonly chosen = output<DatesChange>();

  protected valueOf(event: Event): string | null {
    return (event.target as HTMLInputElement).value || null;
  }
}
