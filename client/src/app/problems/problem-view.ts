import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { PageError } from '../ui/page-states/page-error';
import { PageForbidden } from '../ui/page-states/page-forbidden';
import { toProblem } from './problem';
import { problemWords } from './problem-words';

/**
 * What a page shows in place of what it could not load:
 * `@if (stores.error(); as failure) { <vw-problem-view [failure]="failure" (again)="stores.reload()" /> }`
 */
@Component({
  selector: 'vw-problem-view',
  imports: [PageError, PageForbidden],
  template: `
    @if (forbidden()) {
      <vw-page-forbidden [reason]="words().advice" />
    } @else {
      <vw-page-error
        [heading]="words().title"
        [advice]="words().advice"
        [requestId]="words().requestId"
        (again)="again.emit()"
      />
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProblemView {
  readonly failure = input.required<unknown>();

  readonly again = output();

  protected readonly words = computed(() => problemWords(this.failure()));
  protected readonly forbidden = computed(() => toProblem(this.failure()).status === 403);
}
