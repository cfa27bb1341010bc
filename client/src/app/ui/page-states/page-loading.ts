import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

/** Grey lines in the shape of what is coming; said once to a screen reader. */
@Component({
  selector: 'vw-page-loading',
  template: `
    <p class="vw-hidden" role="status" i18n="@@ui.loading">Loading</p>
    <div class="lines" aria-hidden="true">
      @for (width of widths(); track $index) {
        <span class="line" [style.width.%]="width"></span>
      }
    </div>
  `,
  styleUrl: './page-states.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PageLoading {
  /** How many lines to draw; close to what will come, so that the page does not jump. */
  readonly lines = input(6);

  protected readonly widths = computed(() =>
    Array.from({ length: this.lines() }, (_, index) => 92 - ((index * 37) % 48)),
  );
}
