import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
} from '@angular/core';

/** How far long work has come. Without a total it only says that it goes on. */
@Component({
  selector: 'vw-progress-line',
  template: `
    <div class="words">
      <span>{{ label() }}</span>
      <span class="count">{{ count() }}</span>
    </div>
    <div
      class="track"
      role="progressbar"
      aria-valuemin="0"
      [attr.aria-valuemax]="total()"
      [attr.aria-valuenow]="total() === null ? null : done()"
      [attr.aria-valuetext]="count() || null"
      [attr.aria-label]="label()"
    >
      <span class="bar" [class.endless]="total() === null" [style.width.%]="percent()"></span>
    </div>
  `,
  styles: `
    :host {
      display: block;
    }
    .words {
      display: flex;
      justify-content: space-between;
      gap: var(--vw-space-4);
      margin-bottom: 6px;
    }
    .count {
      color: var(--vw-ink-2);
      font-variant-numeric: tabular-nums;
    }
    .track {
      height: 8px;
      overflow: hidden;
      background: var(--vw-line);
      border-radius: 4px;
    }
    .bar {
      display: block;
      height: 100%;
      background: var(--vw-kelp);
      border-radius: 4px;
      transition: width var(--vw-motion) linear;
    }
    .endless {
      animation: pass 1.4s linear infinite;
    }
    @keyframes pass {
      from {
        transform: translateX(-100%);
      }
      to {
        transform: translateX(320%);
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProgressLine {
  private readonly locale = inject(LOCALE_ID);

  readonly label = input.required<string>();
  readonly done = input(0);
  readonly total = input<number | null>(null);

  protected readonly percent = computed(() => {
    const total = this.total();
    if (total === null) return 30;
    return total <= 0 ? 100 : Math.min(100, (this.done() / total) * 100);
  });
  protected readonly count = computed(() => {
    const total = this.total();
    if (total === null) return '';
    const format = new Intl.NumberFormat(this.locale);
    return $localize`:@@ui.progress:${format.format(this.done())}:done: of ${format.format(total)}:total:`;
  });
}
