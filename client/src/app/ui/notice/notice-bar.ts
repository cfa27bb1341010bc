import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { Icon } from '../icon/icon';
import type { Notice } from './notices';
import { Notices } from './notices';

/** Shows the current notice, with its action (usually Undo), over the foot of the page. */
@Component({
  selector: 'vw-notice-bar',
  imports: [Icon],
  templateUrl: './notice-bar.html',
  styleUrl: './notice-bar.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NoticeBar {
  protected readonly notices = inject(Notices);

  protected act(notice: Notice): void {
    this.notices.dismiss();
    notice.action?.run();
  }
}
