import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Icon } from '../icon/icon';

/**
 * A caution that must be seen before what follows it. `stop` is for the point at which one stops
 * and calls someone licensed. Say what to check and when to stop; never that something is safe.
 */
@Component({
  selector: 'vw-caution',
  imports: [Icon],
  template: `
    <div class="box" role="note" [class.stop]="kind() === 'stop'">
      <vw-icon [name]="kind() === 'stop' ? 'stop' : 'warning'" />
      <div>
        <p class="kind">
          @if (kind() === 'stop') {
            <ng-container i18n="@@ui.stop">Stop</ng-container>
          } @else {
            <ng-container i18n="@@ui.caution">Caution</ng-container>
          }
        </p>
        <ng-content />
      </div>
    </div>
  `,
  styles: `
    :host {
      display: block;
    }
    .box {
      display: flex;
      gap: var(--vw-space-3);
      padding: var(--vw-space-3) var(--vw-space-4);
      color: var(--vw-ink);
      background: var(--vw-amber-tint);
      border-left: 4px solid var(--vw-amber);
      border-radius: var(--vw-radius);
    }
    vw-icon {
      width: 24px;
      height: 24px;
      color: var(--vw-amber-ink);
    }
    .kind {
      color: var(--vw-amber-ink);
      font-weight: 700;
    }
    .stop {
      background: var(--vw-vermilion-tint);
      border-left-color: var(--vw-vermilion);
    }
    .stop vw-icon,
    .stop .kind {
      color: var(--vw-vermilion);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Caution {
  readonly kind = input<'caution' | 'stop'>('caution');
}
