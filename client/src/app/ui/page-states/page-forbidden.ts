import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Icon } from '../icon/icon';

/** Says that this is outside the person's roles, and whom to ask. */
@Component({
  selector: 'vw-page-forbidden',
  imports: [Icon],
  template: `
    <div class="state">
      <vw-icon class="picture" name="lock" />
      <h1 i18n="@@ui.forbidden">This is not yours to see</h1>
      <p>
        @if (reason()) {
          {{ reason() }}
        } @else {
          <ng-container i18n="@@ui.forbidden-advice"
            >Your roles do not reach this page. Ask an administrator if you need it for your
            work.</ng-container
          >
        }
      </p>
    </div>
  `,
  styleUrl: './page-states.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PageForbidden {
  /** The server's reason, where it gave one. */
  readonly reason = input('');
}
