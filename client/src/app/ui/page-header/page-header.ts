import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Icon } from '../icon/icon';

/**
 * The head of a page: title and subtitle, then figures (`<vw-figure>`), then actions
 * (`actions` attribute) or a legend at the far end.
 */
@Component({
  selector: 'vw-page-header',
  imports: [Icon, RouterLink],
  template: `
    @if (backLink(); as link) {
      <a class="back" [routerLink]="link"><vw-icon name="back" />{{ backLabel() }}</a>
    }
    <div class="line">
      <div class="words">
        <h1>{{ heading() }}</h1>
        @if (subtitle()) {
          <p class="subtitle">{{ subtitle() }}</p>
        }
      </div>
      <div class="figures"><ng-content select="vw-figure" /></div>
      <div class="actions vw-no-print"><ng-content select="[actions]" /></div>
    </div>
  `,
  styles: `
    :host {
      display: block;
    }
    .back {
      display: inline-flex;
      align-items: center;
      gap: 4px;
      min-height: 32px;
      color: var(--vw-ink-2);
      font-size: var(--vw-text-small);
      text-decoration: none;
    }
    .back:hover {
      color: var(--vw-ink);
      text-decoration: underline;
    }
    .line {
      display: flex;
      flex-wrap: wrap;
      align-items: flex-end;
      gap: var(--vw-space-3) var(--vw-space-6);
    }
    .words {
      min-width: 0;
    }
    .subtitle {
      color: var(--vw-ink-2);
    }
    .figures {
      display: flex;
      flex-wrap: wrap;
      gap: var(--vw-space-3) var(--vw-space-6);
    }
    .figures:empty,
    .actions:empty {
      display: none;
    }
    .actions {
      display: flex;
      flex-wrap: wrap;
      gap: var(--vw-space-2) var(--vw-space-3);
      align-items: center;
      margin-left: auto;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PageHeader {
  readonly heading = input.required<string>();
  readonly subtitle = input('');
  /** Router commands to the page above this one. */
  readonly backLink = input<string | readonly unknown[]>();
  readonly backLabel = input('');
}
