import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { TaskState } from '@shared/tasks/task-state';
import { stateWord } from '../text/state-word';
import { VatGlyph } from '../vat-glyph/vat-glyph';

/** A state's glyph and its word. */
@Component({
  selector: 'vw-state-word',
  imports: [VatGlyph],
  template: '<vw-vat-glyph [state]="state()" [level]="level()" [decorative]="true" />{{ word() }}',
  styles: `
    :host {
      display: inline-flex;
      align-items: center;
      gap: 6px;
      vertical-align: middle;
      white-space: nowrap;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StateWord {
  readonly state = input.required<TaskState>();
  readonly level = input(0.6);

  protected readonly word = computed(() => stateWord(this.state()));
}
