import { computed, inject, Injectable, linkedSignal, LOCALE_ID, signal } from '@angular/core';
import { addDays, parseCalendarDate, weekdayOf } from '@shared/calendar/calendar-date';
import { dateAt } from '@shared/calendar/instant-of';
import type { Observable } from 'rxjs';
import { catchError, concatMap, EMPTY, finalize, Subject, tap } from 'rxjs';
import { newId } from '../api/new-id';
import { kept } from '../tasks/kept';
import { Session } from '../session/session';
import { Notices } from '../ui/notice/notices';
import { calendarDay } from '../ui/text/calendar-day';
import { movedTo } from './moved-to';
import type { Plan, Route, Technician, Unplanned, Visit } from './visits-api';
import { VisitsApi } from './visits-api';
import { tasksText } from './visit-words';
import { visitsFaultLine } from './visits-problem';

/** A technician with what the day shown holds for them. */
export interface Column {
  readonly technician: Technician;
  readonly route: Route | null;
}

const emptyPlan: Plan = { technicians: [], routes: [] };

/**
 * The planner's desk: one week of routes, the day in hand, and the work that waits. Changes go out
 * one after the other, each with the version that the one before left, so that quick hands and keys
 * never run into themselves; the order on screen follows at once.
 */
@Injectable()
export class PlanDesk {
  private readonly api = inject(VisitsApi);
  private readonly notices = inject(Notices);
  private readonly locale = inject(LOCALE_ID);

  private readonly session = inject(Session);

  /** The present date where the planner is. */
  readonly today = computed(() => dateAt(Date.now(), this.session.timeZone()));
  readonly day = linkedSignal<string>(() => this.today());
  readonly region = signal('');
  readonly search = signal('');
  readonly shownStores = signal(30);

  readonly week = computed(() => {
    const day = parseCalendarDate(this.day());
    const monday = addDays(day, -weekdayOf(day));
    return Array.from({ length: 7 }, (_, index) => addDays(monday, index));
  });
  readonly planResource = this.api.plan(() => ({
    from: this.week()[0],
    days: 7,
    region: this.region() || undefined,
  }));
  readonly unplannedResource = this.api.unplanned(() => ({
    by: this.day(),
    q: this.search(),
    region: this.region() || undefined,
    pageSize: this.shownStores(),
  }));
  readonly plan = kept(this.planResource);
  readonly unplanned = kept(this.unplannedResource);

  readonly columns = computed<readonly Column[]>(() => {
    const { technicians, routes } = this.plan() ?? emptyPlan;
    const today = routes.filter(({ onDate }) => onDate === this.day());
    return technicians.map((technician) => ({
      technician,
      route: today.find((route) => route.technician.id === technician.id) ?? null,
    }));
  });

  private readonly waiting = signal(0);
  readonly saving = computed(() => this.waiting() > 0);
  private readonly queue = new Subject<() => Observable<unknown>>();

  constructor() {
    this.queue
      .pipe(
        concatMap((run) =>
          run().pipe(
            catchError((failure: unknown) => {
              this.notices.tell({ text: visitsFaultLine(failure), urgent: true });
              this.reload();
              return EMPTY;
            }),
            finalize(() => this.waiting.update((count) => count - 1)),
          ),
        ),
      )
      .subscribe();
  }

  reload(): void {
    this.planResource.reload();
    this.unplannedResource.reload();
  }

  /** Puts tasks of a store on a technician's day. */
  add(store: Unplanned, taskIds: readonly string[], technician: Technician, position?: number) {
    const wanted = {
      id: newId(),
      storeId: store.store.id,
      technicianId: technician.id,
      onDate: this.day(),
      taskIds: [...taskIds],
      position,
    };
    const name = `${store.store.number} ${store.store.name}`;
    this.run(
      () => this.api.add(wanted),
      () =>
        this.notices.tell({
          text: $localize`:@@visits.added:${name}:store: (${tasksText(taskIds.length)}:tasks:) is on the day of ${technician.name}:technician:.`,
        }),
    );
  }

  /** Puts a visit at another place of its day. */
  order(route: Route, from: number, to: number): void {
    if (from === to || to < 0 || to >= route.visits.length) return;
    const visits = movedTo(route.visits, from, to);
    const ids = visits.map(({ id }) => id);
    this.put({ ...route, visits });
    this.run(() => this.api.order(route.id, this.versionOf(route.id), ids));
  }

  nearestNext(route: Route): void {
    this.run(
      () => this.api.orderNearestNext(route.id, this.versionOf(route.id)),
      (changed) => {
        const same = changed.visits.every(({ id }, index) => id === route.visits[index]?.id);
        this.notices.tell({
          text: same
            ? $localize`:@@visits.nearest-same:The order was nearest-next already.`
            : $localize`:@@visits.nearest-done:Ordered from the nearest stop to the next.`,
        });
      },
    );
  }

  publish(route: Route): void {
    const { name } = route.technician;
    this.run(
      () => this.api.publish(route.id, this.versionOf(route.id)),
      () =>
        this.notices.tell({
          text: $localize`:@@visits.published:${name}:technician: and the stores see this day now.`,
        }),
    );
  }

  move(visit: Visit, technicianId: string, onDate: string, position?: number): void {
    this.run(
      () =>
        this.api.move(visit.id, {
          version: this.visitVersion(visit),
          technicianId,
          onDate,
          position,
        }),
      (route) => {
        if (onDate === this.day()) return;
        const day = calendarDay(onDate, this.locale);
        this.notices.tell({
          text: $localize`:@@visits.moved-day:Moved to ${route.technician.name}:technician:, ${day}:day:.`,
        });
      },
    );
  }

  /** Changes note and tasks, and then, where asked for, day or technician. */
  edit(
    visit: Visit,
    change: { readonly note: string; readonly taskIds: readonly string[] },
    to: { readonly technicianId: string; readonly onDate: string } | null,
  ): void {
    this.run(() =>
      this.api.edit(visit.id, {
        version: this.visitVersion(visit),
        note: change.note,
        taskIds: [...change.taskIds],
      }),
    );
    if (to) this.move(visit, to.technicianId, to.onDate);
  }

  remove(route: Route, visit: Visit): void {
    const back = {
      id: visit.id,
      storeId: visit.store.id,
      technicianId: route.technician.id,
      onDate: route.onDate,
      taskIds: visit.tasks.map(({ id }) => id),
      note: visit.note,
      position: visit.position,
    };
    const name = `${visit.store.number} ${visit.store.name}`;
    this.run(
      () => this.api.remove(visit.id, this.visitVersion(visit)),
      () =>
        this.notices.offerUndo(
          $localize`:@@visits.removed:${name}:store: is off the day; its tasks wait again.`,
          () => this.run(() => this.api.add(back)),
        ),
    );
  }

  private run(call: () => Observable<Route>, then: (route: Route) => void = () => undefined): void {
    this.waiting.update((count) => count + 1);
    this.queue.next(() =>
      call().pipe(
        tap((route) => {
          const more = this.waiting() > 1;
          const shown = this.find(route.id);
          // What was moved since keeps its place on screen; its own answer is still to come.
          this.put(more && shown ? { ...shown, version: route.version } : route);
          if (!more) this.reload();
          then(route);
        }),
      ),
    );
  }

  private put(route: Route): void {
    this.planResource.update((plan) => {
      if (!plan) return plan;
      const others = plan.routes.filter(({ id }) => id !== route.id);
      return { ...plan, routes: [...others, route] };
    });
  }

  private find(id: string): Route | undefined {
    return this.plan()?.routes.find((route) => route.id === id);
  }

  private versionOf(id: string): number {
    return this.find(id)?.version ?? 0;
  }

  private visitVersion(visit: Visit): number {
    const all = this.plan()?.routes.flatMap(({ visits }) => visits) ?? [];
    return all.find(({ id }) => id === visit.id)?.version ?? visit.version;
  }
}
