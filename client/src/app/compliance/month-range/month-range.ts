import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import type { Month } from '@shared/compliance/month';
import { ComplianceWords } from '../compliance-words';
import { type Months, monthsToPick, type Preset, presetMonths } from '../month-choice';

/** Chooses a range of months: four by one press, any other by its two ends. */
@Component({
  selector: 'vw-month-range',
  template: `
    <div class="presets" role="group" i18n-aria-label="@@compliance.range" aria-label="Months">
      @for (preset of presets; track preset.key) {
        <button
          type="button"
          [attr.aria-pressed]="preset.key === chosenPreset()"
          (click)="choose(preset.key)"
        >
          {{ preset.label }}
        </button>
      }
    </div>
    <label>
      <span i18n="@@compliance.from">From</span>
      <select [value]="months().from" (change)="setFrom($event)">
        @for (month of options(); track month) {
          <option [value]="month" [selected]="month === months().from">
            {{ words.month(month) }}
          </option>
        }
      </select>
    </label>
    <label>
      <span i18n="@@compliance.to">to</span>
      <select [value]="months().to" (change)="setTo($event)">
        @for (month of options(); track month) {
          <option [value]="month" [selected]="month === months().to">
            {{ words.month(month) }}
          </option>
        }
      </select>
    </label>
  `,
  styleUrl: './month-range.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MonthRange {
  protected readonly words = inject(ComplianceWords);

  readonly months = input.required<Months>();
  readonly present = input.required<Month>();

  readonly chosen = output<Months>();

  protected readonly presets: readonly { readonly key: Preset; readonly label: string }[] = [
    { key: 'this', label: $localize`:@@compliance.preset.this:This month` },
    { key: 'last', label: $localize`:@@compliance.preset.last:Last month` },
    { key: 'three', label: $localize`:@@compliance.preset.three:3 months` },
    { key: 'year', label: $localize`:@@compliance.preset.year:12 months` },
  ];
  /** What the address asks for is offered too, however long ago it is. */
  protected readonly options = computed(() => {
    const { from, to } = this.months();
    return [...new Set([...monthsToPick(this.present()), from, to])].sort().reverse();
  });
  protected readonly chosenPreset = computed(
    () =>
      this.presets.find(({ key }) => {
        const { from, to } = presetMonths(key, this.present());
        return from === this.months().from && to === this.months().to;
      })?.key,
  );

  protected choose(preset: Preset): void {
    this.chosen.emit(presetMonths(preset, this.present()));
  }

  /** An end that passes the other takes it along. */
  protected setFrom(event: Event): void {
    const from = (event.target as HTMLSelectElement).value as Month;
    const { to } = this.months();
    this.chosen.emit({ from, to: from > to ? from : to });
  }

  protected setTo(event: Event): void {
    const to = (event.target as HTMLSelectElement).value as Month;
    const { from } = this.months();
    this.chosen.emit({ from: to < from ? to : from, to });
  }
}
