import { computed, inject, Injectable } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router } from '@angular/router';

/** What asks for tasks by place and hand, the same for table, month and board. */
export const placeKeys = [
  'q',
  'region',
  'chain',
  'store',
  'rule',
  'technician',
  'audience',
] as const;

/** On the board, which shows technicians' tasks unless it is asked otherwise: store staff's too. */
export const EVERYBODY = 'everybody';

export type Change = Readonly<Record<string, string | number | null>>;

/**
 * The filters of a page as they stand in its address, where a link, Back and a reload find them
 * again. Provide it in the page's component.
 */
@Injectable()
export class Address {
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);
  private readonly query = toSignal(this.route.queryParamMap, {
    initialValue: this.route.snapshot.queryParamMap,
  });

  /** The filters by place and hand; absent ones are undefined. */
  readonly place = computed((): Readonly<Record<string, string | undefined>> => {
    const place = Object.fromEntries(placeKeys.map((key) => [key, this.get(key) || undefined]));
    return place['audience'] === EVERYBODY ? { ...place, audience: undefined } : place;
  });

  get(key: string): string {
    return this.query().get(key) ?? '';
  }

  /** A whole number from 1, or `otherwise`. */
  count(key: string, otherwise: number): number {
    const value = Number(this.get(key));
    return Number.isInteger(value) && value > 0 ? value : otherwise;
  }

  /** The query without the question mark; the page turned to is left out. */
  text(): string {
    const query = new URLSearchParams();
    for (const key of [...this.query().keys].sort()) {
      if (key !== 'page') query.set(key, this.get(key));
    }
    return query.toString();
  }

  /** Changes what is named and keeps the rest; a changed filter starts at the first page. */
  ask(change: Change): void {
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams: { page: null, ...change },
      queryParamsHandling: 'merge',
    });
  }

  /** Puts the filters of a saved view in place of all that are set. */
  take(text: string): void {
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams: Object.fromEntries(new URLSearchParams(text)),
    });
  }
}
