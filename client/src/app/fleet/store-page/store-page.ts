import { DatePipe } from '@angular/common';
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
import { ProblemView } from '../../problems/problem-view';
import { Session } from '../../session/session';
import { PageTitle } from '../../shell/page-title';
import { Figure } from '../../ui/figure/figure';
import { Icon } from '../../ui/icon/icon';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageLoading } from '../../ui/page-states/page-loading';
import type { Store } from '../fleet-api';
import { FleetApi } from '../fleet-api';
import { fleetFaultLine, isConflict } from '../fleet-problem';
import { storeTitle } from '../fleet-words';
import { WeekHours } from '../store-hours/week-hours';
import { StorePeople } from './store-people';
import { StoreUnits } from './store-units';
import { StoreWhere } from './store-where';

/** One store: what stands in it, where it is, when it may be visited. */
@Component({
  selector: 'vw-store-page',
  imports: [
    DatePipe,
    Figure,
    Icon,
    MatButton,
    PageHeader,
    PageLoading,
    ProblemView,
    RouterLink,
    StorePeople,
    StoreUnits,
    StoreWhere,
    WeekHours,
  ],
  templateUrl: './store-page.html',
  styleUrl: '../fleet-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StorePage {
  private readonly api = inject(FleetApi);
  private readonly notices = inject(Notices);

  protected readonly mayReadPeople = inject(Session).can('people.read');

  readonly id = input.required<string>();

  protected readonly resource = this.api.store(() => this.id());
  protected readonly store = computed(() =>
    this.resource.hasValue() ? this.resource.value() : null,
  );
  protected readonly busy = signal(false);
  protected readonly title = computed(() => {
    const store = this.store();
    return store ? storeTitle(store) : '';
  });
  protected readonly words = {
    units: $localize`:@@fleet.units-in-use:units in use`,
    findings: $localize`:@@fleet.open-findings-here:open findings`,
  };

  constructor() {
    const pageTitle = inject(PageTitle);
    effect(() => {
      if (this.title()) pageTitle.set(this.title());
    });
  }

  protected setRetired(store: Pick<Store, 'id' | 'version'>, retired: boolean): void {
    this.busy.set(true);
    this.api.setStoreRetired(store, retired).subscribe({
      next: (saved) => {
        this.busy.set(false);
        this.resource.set(saved);
        if (retired) {
          const text = $localize`:@@fleet.store-retired:Store retired; its schedules have ended.`;
          this.notices.offerUndo(text, () => this.setRetired(saved, false));
        } else {
          this.notices.tell({
            text: $localize`:@@fleet.store-restored:The store is in use again.`,
          });
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
