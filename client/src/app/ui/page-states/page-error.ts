import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Icon } from '../icon/icon';

/** Says what failed and what to do; gives the number by which the server's log finds it. */
@Component({
  selector: 'vw-page-error',
  imports: [Icon, MatButton],
  template: `
    <div class="state" role="alert">
      <vw-icon class="picture fault" name="warning" />
      <h2>{{ heading() }}</h2>
      <p>{{ advice() }}</p>
      <div class="next">
        <button matButton="outlined" type="button" (click)="again.emit()" i18n="@@ui.try-again">
          Try again
        </button>
      </div>
      @if (requestId()) {
        <p class="number">
          <ng-container i18n="@@ui.request-number">Number for support</ng-container>:
          <code>{{ requestId() }}</code>
        </p>
      }
    </div>
  `,
  styleUrl: './page-states.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PageError {
  readonly heading = input.required<string>();
  readonly advice = input.required<string>();
  readonly requestId = input('');

  readonly again = output();
}
