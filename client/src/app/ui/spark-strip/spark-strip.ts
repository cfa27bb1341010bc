import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

const HEIGHT = 20;

/** Thirteen weeks of a rate as bars; the height is the rate, a week without tasks a dot. */
@Component({
  selector: 'vw-spark-strip',
  template: `
    <svg [attr.viewBox]="box()" [style.width.px]="width()" role="img" [attr.aria-label]="label()">
      @for (bar of bars(); track $index) {
        <rect
          width="3"
          rx="1"
          [attr.x]="bar.x"
          [attr.y]="bar.y"
          [attr.height]="bar.height"
          [class.none]="bar.none"
        />
      }
    </svg>
  `,
  styles: `
    :host {
      display: inline-flex;
    }
    svg {
      display: block;
      height: 20px;
    }
    rect {
      fill: color-mix(in srgb, var(--vw-kelp) 60%, var(--vw-card));
    }
    .none {
      fill: var(--vw-edge);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SparkStrip {
  /** Rates from 0 to 1, oldest first; null for a week in which nothing closed. */
  readonly values = input.required<readonly (number | null)[]>();
  /** The same in words: "13 weeks on time: lowest 71%, last 96%". */
  readonly label = input.required<string>();

  protected readonly width = computed(() => this.values().length * 5 - 2);
  protected readonly box = computed(() => `0 0 ${this.width()} ${HEIGHT}`);
  protected readonly bars = computed(() =>
    this.values().map((value, index) => {
      const height = value === null ? 2 : Math.max(2, Math.min(1, value) * HEIGHT);
      return { x: index * 5, y: HEIGHT - height, height, none: value === null };
    }),
  );
}
