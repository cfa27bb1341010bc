import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { IconName } from './icon-paths';
import { iconPaths } from './icon-paths';

/** A line drawing beside a word. Alone in a button it says nothing: label the button. */
@Component({
  selector: 'vw-icon',
  template: `<svg viewBox="0 0 20 20" aria-hidden="true" focusable="false">
    <path [attr.d]="path()" />
  </svg>`,
  styles: `
    :host {
      display: inline-flex;
      flex: none;
      width: 1.25em;
      height: 1.25em;
      vertical-align: -0.25em;
    }
    svg {
      width: 100%;
      height: 100%;
      fill: none;
      stroke: currentcolor;
      stroke-width: 1.6;
      stroke-linecap: round;
      stroke-linejoin: round;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Icon {
  readonly name = input.required<IconName>();

  protected readonly path = computed(() => iconPaths[this.name()]);
}
