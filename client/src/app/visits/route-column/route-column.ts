import { LiveAnnouncer } from '@angular/cdk/a11y';
import type { CdkDragDrop } from '@angular/cdk/drag-drop';
import { CdkDrag, CdkDragHandle, CdkDropList } from '@angular/cdk/drag-drop';
import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  inject,
  Injector,
  input,
  LOCALE_ID,
  output,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Icon } from '../../ui/icon/icon';
import type { Column } from '../plan-desk';
import { PlanDesk } from '../plan-desk';
import { VisitCard } from '../visit-card/visit-card';
import type { Unplanned, Visit } from '../visits-api';
import { elsewhereText, milesText, minutesText, routeStateWord, stopsText } from '../visit-words';

/** What is carried by hand: a visit of a day, or a store whose tasks wait. */
export type Carried =
  | { readonly kind: 'visit'; readonly visit: Visit }
  | { readonly kind: 'store'; readonly store: Unplanned; readonly taskIds: readonly string[] };

/** One technician's day as a line with stops, put in order by hand, by key or nearest-next. */
@Component({
  selector: 'vw-route-column',
  imports: [CdkDrag, CdkDragHandle, CdkDropList, Icon, MatButton, VisitCard],
  templateUrl: './route-column.html',
  styleUrl: './route-column.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RouteColumn {
  protected readonly desk = inject(PlanDesk);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly document = inject(DOCUMENT);
  private readonly injector = inject(Injector);
  private readonly locale = inject(LOCALE_ID);

  readonly column = input.required<Column>();
  /** Past days are shown and not changed. */
  readonly fixed = input(false);

  readonly edited = output<Visit>();

  protected readonly elsewhereText = elsewhereText;
  protected readonly route = computed(() => this.column().route);
  protected readonly visits = computed(() => this.route()?.visits ?? []);
  protected readonly state = computed(() => {
    const route = this.route();
    if (!route || (route.state === 'draft' && this.visits().length === 0)) return null;
    return { state: route.state, word: routeStateWord(route.state) };
  });
  protected readonly sum = computed(() => {
    const route = this.route();
    if (!route || route.visits.length === 0) return '';
    return [
      stopsText(route.visits.length),
      milesText(route.metres, this.locale),
      minutesText(route.minutes),
    ].join(' · ');
  });
  protected readonly mayPublish = computed(() => {
    const route = this.route();
    if (!route || this.fixed() || route.state === 'published') return false;
    return route.visits.length > 0 || route.state === 'changed';
  });

  protected leg(visit: Visit): string {
    return visit.legMetres === null ? '' : milesText(visit.legMetres, this.locale);
  }

  protected carried(visit: Visit): Carried {
    return { kind: 'visit', visit };
  }

  protected dropped({ item, previousIndex, currentIndex }: CdkDragDrop<unknown>): void {
    const carried = item.data as Carried;
    const { technician } = this.column();
    if (carried.kind === 'store') {
      this.desk.add(carried.store, carried.taskIds, technician, currentIndex);
      return;
    }
    const route = this.route();
    if (route?.visits.some(({ id }) => id === carried.visit.id)) {
      this.desk.order(route, previousIndex, currentIndex);
    } else {
      this.desk.move(carried.visit, technician.id, this.desk.day(), currentIndex);
    }
  }

  protected shift(visit: Visit, from: number, by: 1 | -1): void {
    const route = this.route();
    if (!route) return;
    this.desk.order(route, from, from + by);
    const place = from + by + 1;
    void this.announcer.announce(
      $localize`:@@visits.now-stop:${visit.store.name}:store: is stop ${place}:place: of ${route.visits.length}:count: now.`,
    );
    this.keepFocus(visit.id, by);
  }

  /** The card moved in the page and took the focus away from its button: give it back. */
  private keepFocus(id: string, by: 1 | -1): void {
    afterNextRender(
      () => {
        const names = by < 0 ? ['up', 'down'] : ['down', 'up'];
        const buttons = names.map((name) => this.document.getElementById(`${name}-${id}`));
        const usable = buttons.find((button) => button && !button.hasAttribute('disabled'));
        usable?.focus();
      },
      { injector: this.injector },
    );
  }
}
