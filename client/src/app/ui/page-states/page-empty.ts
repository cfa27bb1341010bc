import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Icon } from '../icon/icon';
import type { IconName } from '../icon/icon-paths';

/** Says that there is nothing yet, why, and (projected) what to do next. */
@Component({
  selector: 'vw-page-empty',
  imports: [Icon],
  template: `
    <div class="state">
      <vw-icon class="picture" [name]="icon()" />
      @if (level() === 1) {
        <h1>{{ heading() }}</h1>
      } @else {
        <h2>{{ heading() }}</h2>
      }
      @if (advice()) {
        <p>{{ advice() }}</p>
      }
      <div class="next"><ng-content /></div>
    </div>
  `,
  styleUrl: './page-states.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PageEmpty {
  readonly heading = input.required<string>();
  readonly advice = input('');
  readonly icon = input<IconName>('list');
  /** 1 where the state is the whole page. */
  readonly level = input<1 | 2>(2);
}
