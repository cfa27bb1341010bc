import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { DigestContent } from '@shared/digests/digest-content';
import { formatMonth, formatRate } from '@shared/mail/format-moment';
import { LanguageChoice } from '../../session/language-choice';

const HEIGHT = 96;
const STEP = 84;
const WIDTH = 46;

/** The months of a digest as bars from 0 to 100 %, each with its figure; the table says the same. */
@Component({
  selector: 'vw-month-bars',
  template: `
    <svg [attr.viewBox]="box()" role="img" [attr.aria-label]="label()">
      <line class="edge" x1="0" [attr.x2]="width()" y1="20" y2="20" />
      <line class="edge" x1="0" [attr.x2]="width()" [attr.y1]="base" [attr.y2]="base" />
      <text class="scale" [attr.x]="width() + 6" y="24">100%</text>
      <text class="scale" [attr.x]="width() + 6" [attr.y]="base + 4">0%</text>
      @for (bar of bars(); track bar.month; let last = $last) {
        <rect
          rx="4"
          [attr.x]="bar.x"
          [attr.y]="bar.y"
          [attr.width]="barWidth"
          [attr.height]="bar.height"
          [class.last]="last"
        />
        <text
          class="figure"
          [class.inside]="bar.inside"
          [class.last]="last"
          [attr.x]="bar.middle"
          [attr.y]="bar.figureY"
        >
          {{ bar.figure }}
        </text>
        <text class="month" [attr.x]="bar.middle" [attr.y]="base + 18">{{ bar.name }}</text>
      }
    </svg>
  `,
  styleUrl: './month-bars.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MonthBars {
  private readonly language = inject(LanguageChoice).current;

  readonly months = input.required<DigestContent['months']>();

  protected readonly base = HEIGHT + 20;
  protected readonly barWidth = WIDTH;
  protected readonly width = computed(() => this.months().length * STEP);
  protected readonly box = computed(() => `0 0 ${this.width() + 46} ${this.base + 26}`);
  protected readonly bars = computed(() => {
    const short = new Intl.DateTimeFormat(this.language, { month: 'short', timeZone: 'UTC' });
    return this.months().map(({ month, rate }, index) => {
      const height = Math.round((rate ?? 0) * HEIGHT);
      const x = index * STEP + (STEP - WIDTH) / 2;
      const inside = height > 30;
      return {
        month,
        x,
        y: this.base - height,
        height,
        middle: x + WIDTH / 2,
        inside,
        figureY: inside ? this.base - height + 18 : this.base - height - 6,
        figure: formatRate(rate, this.language).replace(/[.,]\d(?=\s?%)/, ''),
        name: short.format(Date.parse(`${month}-01T00:00:00Z`)),
      };
    });
  });
  protected readonly label = computed(() =>
    this.months()
      .map(
        ({ month, rate }) =>
          `${formatMonth(month, this.language)}: ${formatRate(rate, this.language)}`,
      )
      .join('; '),
  );
}
