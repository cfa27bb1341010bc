import type { ElementRef } from '@angular/core';
import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  inject,
  input,
  LOCALE_ID,
  signal,
  viewChild,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { Icon } from '../icon/icon';
import type { IconName } from '../icon/icon-paths';
import { TimeInZonePipe } from '../text/time-in-zone-pipe';
import type { LifeKind, LifeMark } from './lay-out-marks';
import { axisTicks, layOutMarks } from './lay-out-marks';
import { lifeWord } from './life-word';

export interface LifeEntry extends LifeMark {
  /** What: "Seal weeping at the drain slot". */
  readonly what: string;
  /** Who: "M. Ortega, technician". */
  readonly who: string;
  readonly link?: readonly unknown[];
}

const ICONS: Record<LifeKind, IconName> = {
  installed: 'add',
  inspected: 'check',
  found: 'finding',
  repaired: 'tools',
  replaced: 'refresh',
  judged: 'bench',
};

/** Pixels that a mark needs to itself. */
const MARK_WIDTH = 29;

/** A component's life on one axis of time: marks above it, who and what under it. */
@Component({
  selector: 'vw-life-line',
  imports: [Icon, RouterLink, TimeInZonePipe],
  templateUrl: './life-line.html',
  styleUrl: './life-line.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LifeLine {
  private readonly locale = inject(LOCALE_ID);

  /** Whose life this is, for screen readers. */
  readonly label = input.required<string>();
  readonly entries = input.required<readonly LifeEntry[]>();
  /** Ends of the axis, epoch milliseconds. */
  readonly from = input.required<number>();
  readonly to = input.required<number>();
  /** Zone of the store, in which the dates are read. */
  readonly zone = input.required<string>();

  private readonly axis = viewChild.required<ElementRef<HTMLElement>>('axis');
  private readonly width = signal(900);
  protected readonly chosen = signal<string | null>(null);
  protected readonly icons = ICONS;
  protected readonly word = lifeWord;
  protected readonly placed = computed(() =>
    layOutMarks(this.entries(), this.from(), this.to(), (MARK_WIDTH / this.width()) * 100),
  );
  protected readonly height = computed(
    () => 62 + 30 * Math.max(0, ...this.placed().map((item) => item.lane)),
  );
  protected readonly newestFirst = computed(() => [...this.entries()].sort((a, b) => b.at - a.at));
  protected readonly ticks = computed(() => {
    const [from, to] = [this.from(), this.to()];
    const month = new Intl.DateTimeFormat(this.locale, { month: 'short', timeZone: 'UTC' });
    return axisTicks(from, to).map((tick) => ({
      ...tick,
      minor: new Date(tick.at).getUTCMonth() % 3 !== 0,
      percent: ((tick.at - from) / Math.max(1, to - from)) * 100,
      label: tick.year
        ? String(new Date(tick.at).getUTCFullYear())
        : month.format(new Date(tick.at)),
    }));
  });

  constructor() {
    const destroyRef = inject(DestroyRef);
    afterNextRender(() => {
      const observer = new ResizeObserver(([entry]) => {
        if (entry && entry.contentRect.width > 0) this.width.set(entry.contentRect.width);
      });
      observer.observe(this.axis().nativeElement);
      destroyRef.onDestroy(() => observer.disconnect());
    });
  }

  protected choose(id: string): void {
    this.chosen.update((chosen) => (chosen === id ? null : id));
  }
}
