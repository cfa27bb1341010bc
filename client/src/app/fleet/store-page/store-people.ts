import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { catchError, distinctUntilChanged, forkJoin, map, of, switchMap } from 'rxjs';
import { roleWord } from '../../session/role-word';
import { PageLoading } from '../../ui/page-states/page-loading';
import type { Store } from '../fleet-api';
import { FleetApi } from '../fleet-api';
import { coveringOf, coveringQueries } from './covering';

/** Who covers a store: its manager, technicians, and those who answer for it. */
@Component({
  selector: 'vw-store-people',
  imports: [PageLoading, RouterLink],
  template: `
    <section class="vw-sheet panel">
      <h2 i18n="@@fleet.people">Who covers it</h2>
      @if (people(); as people) {
        <ul>
          @for (person of people; track person.id + person.role) {
            <li>
              <a [routerLink]="['/people', person.id]">{{ person.name }}</a>
              <span class="vw-secondary">{{ word(person.role) }}</span>
              <span class="vw-secondary vw-small scope">{{ person.scope }}</span>
            </li>
          } @empty {
            <li class="vw-secondary" i18n="@@fleet.people-none">
              Nobody holds a role for this store, its region or its chain.
            </li>
          }
        </ul>
      } @else if (people() === null) {
        <p class="vw-secondary" i18n="@@fleet.people-failed">This could not be loaded just now.</p>
      } @else {
        <vw-page-loading [lines]="3" />
      }
    </section>
  `,
  styleUrl: '../fleet-page.scss',
  styles: `
    ul {
      margin: 0;
      padding: 0;
      list-style: none;
    }
    li {
      display: grid;
      grid-template-columns: minmax(8rem, 1fr) minmax(8rem, 1fr) minmax(6rem, 1fr);
      gap: 0 var(--vw-space-3);
      align-items: center;
      min-height: 40px;
      border-bottom: 1px solid var(--vw-line);
    }
    li:last-child {
      border-bottom: 0;
    }
    @media (width < 720px) {
      li {
        grid-template-columns: 1fr;
        padding: var(--vw-space-2) 0;
      }
      .scope {
        display: none;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StorePeople {
  private readonly api = inject(FleetApi);

  readonly store = input.required<Store>();

  protected readonly word = roleWord;
  /** Undefined while it is asked, null where it failed: the page stands without it. */
  protected readonly people = toSignal(
    toObservable(this.store).pipe(
      distinctUntilChanged(
        (a, b) => a.id === b.id && a.regionId === b.regionId && a.chainId === b.chainId,
      ),
      switchMap((store) =>
        forkJoin(coveringQueries(store).map((query) => this.api.people(query))).pipe(
          map((replies) =>
            coveringOf(
              replies.flatMap(({ rows }) => rows),
              store,
            ),
          ),
          catchError(() => of(null)),
        ),
      ),
    ),
  );
}
