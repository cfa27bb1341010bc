import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { TaskState } from '@shared/tasks/task-state';
import { stateWord } from '../text/state-word';
import { oilPath, VAT, wallPoint } from '../vat-glyph/vat-shape';
import type { GaugeLevels } from './gauge-levels';

/** The vat at the size of a gauge: how much of the interval is left, the window on its wall. */
@Component({
  selector: 'vw-vat-gauge',
  templateUrl: './vat-gauge.html',
  styleUrl: './vat-gauge.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VatGauge {
  readonly state = input.required<TaskState>();
  readonly levels = input.required<GaugeLevels>();
  /** Words at the marks, such as "opens Mar 3", "due Mar 8", "late from Mar 12". */
  readonly opensWord = input.required<string>();
  readonly dueWord = input.required<string>();
  readonly closesWord = input.required<string>();

  protected readonly vat = VAT;
  protected readonly oil = computed(() => oilPath(this.levels().level));
  protected readonly label = computed(
    () =>
      $localize`:@@ui.gauge:${stateWord(this.state())}:state:; ${this.opensWord()}:opens:, ${this.dueWord()}:due:, ${this.closesWord()}:closes:`,
  );

  /** The stretch of the wall that is the window, from its opening down to the floor. */
  protected readonly window = computed(() => {
    const opens = wallPoint(this.levels().opens);
    const knee = opens.y < 13 ? ' 15.4 13' : '';
    return `M${opens.x} ${opens.y}L${knee.trim()} 10 17`.replace('L ', 'L');
  });

  protected readonly marks = computed(() => {
    const { opens, due } = this.levels();
    const marks = [
      { key: 'opens', ...wallPoint(opens), word: this.opensWord() },
      { key: 'due', ...wallPoint(due), word: this.dueWord() },
      { key: 'closes', ...wallPoint(0), word: this.closesWord() },
    ];
    return spread(marks);
  });
}

interface Mark {
  readonly key: string;
  readonly x: number;
  readonly y: number;
  readonly word: string;
}

/** Words need 2.3 units of height each; the upper ones give way upwards. */
function spread(marks: readonly Mark[]): readonly (Mark & { readonly wordY: number })[] {
  const placed: (Mark & { wordY: number })[] = [];
  for (const mark of [...marks].reverse()) {
    const below = placed.at(-1)?.wordY ?? Infinity;
    placed.push({ ...mark, wordY: Math.min(mark.y, below - 2.3) });
  }
  return placed.reverse();
}
