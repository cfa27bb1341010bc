import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { FindingWords } from '../../findings/finding-words';
import { keptReason } from '../../task-sheet/sheet-words';
import { Icon } from '../../ui/icon/icon';
import { stateWord } from '../../ui/text/state-word';
import { VatGlyph } from '../../ui/vat-glyph/vat-glyph';
import type { TodayStop } from '../today-api';
import { minutesText, whenText, windowLeft } from '../today-words';

/** One store of the day: how to get in, when not to work, what to bring, what to do. */
@Component({
  selector: 'vw-stop-card',
  imports: [Icon, RouterLink, VatGlyph],
  templateUrl: './stop-card.html',
  styleUrl: './stop-card.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StopCard {
  private readonly words = inject(FindingWords);
  private readonly locale = inject(LOCALE_ID);
  private readonly now = Date.now();

  readonly stop = input.required<TodayStop>();
  /** The day that is shown, `YYYY-MM-DD`. */
  readonly date = input.required<string>();
  readonly standing = input.required<'done' | 'next' | 'later'>();

  protected readonly minutes = computed(() =>
    this.stop().minutes > 0 ? minutesText(this.stop().minutes) : '',
  );
  protected readonly rush = computed(() =>
    this.stop()
      .store.rush.map(({ from, to }) => `${this.clock(from)}–${this.clock(to)}`)
      .join(', '),
  );
  protected readonly bring = computed(() =>
    [...this.stop().tools, ...this.stop().parts].map((thing) => this.words.text(thing)),
  );
  protected readonly lines = computed(() => {
    const { tasks, store } = this.stop();
    return tasks.map((task) => ({
      id: task.id,
      link: ['/tasks', task.id, 'sheet'],
      unitTag: task.unitTag,
      title: this.words.text(task.title),
      state: task.state,
      word: stateWord(task.state),
      level: windowLeft(task, this.now),
      when: whenText(task, this.date(), store.timeZone, this.locale),
      cautions: task.cautions,
      minutes: minutesText(task.minutes),
      couldNot: task.couldNot ? keptReason(task.couldNot) : '',
    }));
  });

  private clock(time: string): string {
    return new Intl.DateTimeFormat(this.locale, { timeStyle: 'short', timeZone: 'UTC' }).format(
      new Date(`1970-01-01T${time}:00Z`),
    );
  }
}
