import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterOutlet } from '@angular/router';
import { NoticeBar } from './ui/notice/notice-bar';

/** The root: whatever page the address names, and the bar for notices over it. */
@Component({
  selector: 'vw-root',
  imports: [NoticeBar, RouterOutlet],
  template: '<router-outlet /><vw-notice-bar />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class App {}
