import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

export interface FilterOption {
  readonly value: string;
  readonly label: string;
}

/** One filter with its choices; the browser's own list, which every phone handles well. */
@Component({
  selector: 'vw-filter-select',
  template: `
    <label class="frame" [class.set]="value() !== ''">
      <span class="label">{{ label() }}</span>
      <select [value]="value()" (change)="choose($event)">
        <option value="" [selected]="value() === ''">{{ all() }}</option>
        @for (option of options(); track option.value) {
          <option [value]="option.value" [selected]="option.value === value()">
            {{ option.label }}
          </option>
        }
      </select>
    </label>
  `,
  styles: `
    .frame {
      display: flex;
      align-items: center;
      gap: 6px;
      height: 40px;
      padding-left: 12px;
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
      white-space: nowrap;
    }
    select {
      flex: 1;
      min-width: 0;
      max-width: 14rem;
      height: 100%;
      padding-right: 6px;
      border: 0;
      border-radius: var(--vw-radius);
      background: var(--vw-card);
      color: var(--vw-ink);
      font: inherit;
      cursor: pointer;
    }
    select:focus-visible {
      outline: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FilterSelect {
  readonly label = input.required<string>();
  readonly options = input.required<readonly FilterOption[]>();
  readonly value = input('');
  /** The word for no filter. */
  readonly all = input($localize`:@@ui.filter.all:all`);

  readonly chosen = output<string>();

  protected choose(event: Event): void {
    this.chosen.emit((event.target as HTMLSelectElement).value);
  }
}
