import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageForbidden } from '../ui/page-states/page-forbidden';

/** Shown in place of a page that the person's roles do not reach. */
@Component({
  selector: 'vw-not-yours',
  imports: [PageForbidden],
  template: '<vw-page-forbidden />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotYours {}
