import { CdkDropListGroup } from '@angular/cdk/drag-drop';
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
import { MatDialog } from '@angular/material/dialog';
import { Router, RouterLink } from '@angular/router';
import type { Role } from '@shared/access/role';
import { isCalendarDate } from '@shared/calendar/calendar-date';
import { groupOptions } from '../../fleet/group-options';
import { ProblemView } from '../../problems/problem-view';
import { Session } from '../../session/session';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { DayStrip } from '../day-strip/day-strip';
import type { Column } from '../plan-desk';
import { PlanDesk } from '../plan-desk';
import { RouteColumn } from '../route-column/route-column';
import { UnplannedList } from '../unplanned-list/unplanned-list';
import type { VisitAnswer, VisitQuestion } from '../visit-dialog/visit-dialog';
import { VisitDialog } from '../visit-dialog/visit-dialog';
import type { Visit } from '../visits-api';

const text = (value: string | undefined): string => value ?? '';
const plans = (role: Role): boolean => role === 'regional-facility-manager';

/** Bundles what waits into visits, gives them to technicians and days, orders and publishes them. */
@Component({
  selector: 'vw-plan-page',
  imports: [
    CdkDropListGroup,
    DayStrip,
    FilterSelect,
    MatButton,
    PageEmpty,
    PageHeader,
    PageLoading,
    ProblemView,
    RouteColumn,
    RouterLink,
    UnplannedList,
  ],
  providers: [PlanDesk],
  templateUrl: './plan-page.html',
  styleUrl: './plan-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanPage {
  protected readonly desk = inject(PlanDesk);
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialog);
  private readonly session = inject(Session);

  /** The day in hand, from the address; today without one. */
  readonly on = input('', { transform: text });
  readonly region = input('', { transform: text });

  private readonly allRegions = groupOptions('regions');
  /** The regions that this person plans; all of them where the scope is wider than regions. */
  protected readonly regions = computed(() => {
    const scopes = this.session.roles().filter(({ role }) => plans(role));
    if (scopes.some(({ scopeKind }) => scopeKind !== 'region')) return this.allRegions();
    return scopes.map(({ scopeId, scopeName }) => ({ value: scopeId, label: scopeName }));
  });
  protected readonly past = computed(() => this.desk.day() < this.desk.today());
  /** Which half a phone shows. */
  protected readonly half = signal<'routes' | 'waiting'>('routes');
  protected readonly waiting = computed(() => this.desk.unplanned()?.total ?? 0);

  constructor() {
    effect(() => {
      this.desk.day.set(isCalendarDate(this.on()) ? this.on() : this.desk.today());
      this.desk.region.set(this.region());
    });
  }

  protected ask(change: Readonly<Record<string, string | null>>): void {
    void this.router.navigate([], { queryParams: change, queryParamsHandling: 'merge' });
  }

  protected edit(visit: Visit, { technician, route }: Column): void {
    const onDate = route?.onDate ?? this.desk.day();
    this.dialog
      .open<VisitDialog, VisitQuestion, VisitAnswer>(VisitDialog, {
        data: {
          visit,
          technicianId: technician.id,
          onDate,
          technicians: this.desk.columns().map((column) => column.technician),
          today: this.desk.today(),
        },
        width: '32rem',
        maxWidth: 'calc(100vw - 32px)',
      })
      .afterClosed()
      .subscribe((answer) => {
        if (!answer) return;
        const elsewhere = answer.technicianId !== technician.id || answer.onDate !== onDate;
        this.desk.edit(visit, answer, elsewhere ? answer : null);
      });
  }
}
