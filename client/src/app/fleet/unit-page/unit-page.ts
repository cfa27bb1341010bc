import { DatePipe, DecimalPipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { unitKindWords } from '@shared/fleet/fleet-words';
import { ProblemView } from '../../problems/problem-view';
import { LanguageChoice } from '../../session/language-choice';
import { PageTitle } from '../../shell/page-title';
import { Figure } from '../../ui/figure/figure';
import { Icon } from '../../ui/icon/icon';
import { LifeLine } from '../../ui/life-line/life-line';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { DayPipe } from '../day-pipe';
import { fleetFaultLine, isConflict } from '../fleet-problem';
import type { Unit } from '../unit-api';
import { UnitApi } from '../unit-api';
import { lifeEntries, lifeSpan } from './life-entries';
import { UnitParts } from './unit-parts';

/** One unit: what it is, what is in it, and what happened to it. */
@Component({
  selector: 'vw-unit-page',
  imports: [
    DatePipe,
    DayPipe,
    DecimalPipe,
    Figure,
    Icon,
    LifeLine,
    MatButton,
    PageHeader,
    PageLoading,
    ProblemView,
    RouterLink,
    TimeInZonePipe,
    UnitParts,
  ],
  templateUrl: './unit-page.html',
  styleUrl: '../fleet-page.scss',
  styles: `
    dl {
      display: grid;
      grid-template-columns: minmax(6rem, auto) 1fr;
      gap: var(--vw-space-3) var(--vw-space-4);
    }
    dt {
      color: var(--vw-ink-2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnitPage {
  private readonly api = inject(UnitApi);
  private readonly notices = inject(Notices);
  protected readonly language = inject(LanguageChoice).current;

  readonly id = input.required<string>();

  protected readonly resource = this.api.unit(() => this.id());
  protected readonly unit = computed(() =>
    this.resource.hasValue() ? this.resource.value() : null,
  );
  protected readonly life = this.api.life(() => this.id());
  protected readonly zone = computed(() =>
    this.life.hasValue() ? this.life.value().timeZone : 'UTC',
  );
  protected readonly entries = computed(() =>
    this.life.hasValue() ? lifeEntries(this.life.value().events, this.language) : [],
  );
  protected readonly span = computed(() => lifeSpan(this.entries(), Date.now()));
  protected readonly busy = signal(false);
  protected readonly kindWords = unitKindWords;
  protected readonly words = {
    findings: $localize`:@@fleet.open-findings-here:open findings`,
    inspected: $localize`:@@fleet.last-inspected-here:last inspected`,
    life: $localize`:@@fleet.life:Life of the unit`,
  };

  constructor() {
    const pageTitle = inject(PageTitle);
    effect(() => {
      const unit = this.unit();
      if (unit) pageTitle.set(`${unit.tag}, ${unit.storeNumber} ${unit.storeName}`);
    });
  }

  protected reload(): void {
    this.resource.reload();
    this.life.reload();
  }

  protected setRetired(unit: Pick<Unit, 'id' | 'version'>, retired: boolean): void {
    this.busy.set(true);
    this.api.setUnitRetired(unit, retired).subscribe({
      next: (saved) => {
        this.busy.set(false);
        this.resource.set(saved);
        if (retired) {
          const text = $localize`:@@fleet.unit-retired:Unit retired; its schedules have ended.`;
          this.notices.offerUndo(text, () => this.setRetired(saved, false));
        } else {
          this.notices.tell({ text: $localize`:@@fleet.unit-restored:The unit is in use again.` });
        }
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        this.notices.tell({ text: fleetFaultLine(failure), urgent: true });
        if (isConflict(failure)) this.resource.reload();
      },
    });
  }
}
