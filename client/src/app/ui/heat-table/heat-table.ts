import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { RatePipe } from '../text/rate-pipe';
import { HEAT_BOUNDS, heatStep } from './heat-step';

export interface HeatCell {
  /** 0 to 1; null where nothing closed. */
  readonly rate: number | null;
  /** The numbers behind it: "31 of 34". */
  readonly counts: string;
  /** Router commands and query to the tasks behind it. */
  readonly link?: readonly unknown[];
  readonly query?: Readonly<Record<string, string>>;
}

export interface HeatRow {
  readonly id: string;
  readonly label: string;
  readonly link?: readonly unknown[];
  /** One per column. */
  readonly cells: readonly HeatCell[];
}

/** Rates by row and month: a picture that is a table, each cell with its figure. */
@Component({
  selector: 'vw-heat-table',
  imports: [RatePipe, RouterLink],
  templateUrl: './heat-table.html',
  styleUrl: './heat-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HeatTable {
  private readonly locale = inject(LOCALE_ID);

  readonly caption = input.required<string>();
  /** Head of the first column: "Store". */
  readonly rowHead = input.required<string>();
  readonly columns = input.required<readonly string[]>();
  readonly rows = input.required<readonly HeatRow[]>();

  protected readonly step = heatStep;
  protected readonly scale = computed(() => {
    const percent = new Intl.NumberFormat(this.locale, { style: 'percent' });
    return [...HEAT_BOUNDS].reverse().map(([bound, step], index, all) => {
      const next = all[index + 1]?.[0];
      const to = percent.format(next ?? 1);
      const from = percent.format(bound);
      return {
        step,
        label:
          index === 0
            ? $localize`:@@ui.heat.under:under ${to}:bound:`
            : next === undefined
              ? $localize`:@@ui.heat.from:from ${from}:bound:`
              : $localize`:@@ui.heat.between:${from}:from: to ${to}:to:`,
      };
    });
  });
}
