import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { TaskState } from '@shared/tasks/task-state';
import { stateWord } from '../text/state-word';
import { oilPath, VAT } from './vat-shape';

/** A task's state as a vat: each state has a shape of its own, colour only helps. */
@Component({
  selector: 'vw-vat-glyph',
  templateUrl: './vat-glyph.html',
  styleUrl: './vat-glyph.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VatGlyph {
  readonly state = input.required<TaskState>();
  /** Share of the interval that is left, 0 to 1; drawn while the task is planned, open or due soon. */
  readonly level = input(0.6);
  /** Accessible name instead of the state's word, such as "F-2 pump seal, due soon". */
  readonly name = input('');
  /** True where the word stands beside it. */
  readonly decorative = input(false);

  protected readonly vat = VAT;
  protected readonly label = computed(() => this.name() || stateWord(this.state()));
  protected readonly oil = computed(() => {
    switch (this.state()) {
      case 'planned':
      case 'open':
        return oilPath(this.level());
      case 'due-soon':
        // Low, but never so low that it reads as empty.
        return oilPath(Math.min(0.45, Math.max(0.25, this.level())));
      default:
        return '';
    }
  });
}
