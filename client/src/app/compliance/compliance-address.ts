import { computed, inject, Injectable } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router } from '@angular/router';
import { Session } from '../session/session';
import type { ComplianceQuery } from './compliance-api';
import { monthsFrom, presentMonth } from './month-choice';
import type { PlaceFilters } from './tasks-behind';

type Change = Readonly<Record<string, string | number | null>>;

/** Filters that are set one by one and taken away together. */
export const filterNames = ['store', 'region', 'chain', 'rule', 'audience'] as const;

/** The address of the compliance pages: what is asked for lives there and nowhere else. */
@Injectable()
export class ComplianceAddress {
  private readonly router = inject(Router);
  private readonly parameters = toSignal(inject(ActivatedRoute).queryParamMap, {
    requireSync: true,
  });

  /** The month it is now for this person. */
  readonly present = presentMonth(new Date(), inject(Session).timeZone());

  readonly months = computed(() => monthsFrom(this.get('from'), this.get('to'), this.present));
  readonly filters = computed<PlaceFilters>(() => ({
    store: this.get('store'),
    region: this.get('region'),
    chain: this.get('chain'),
    rule: this.get('rule'),
    audience: this.get('audience'),
    q: this.get('q'),
  }));
  readonly page = computed(() => Number(this.get('page')) || 1);
  readonly pageSize = computed(() => Number(this.get('pageSize')) || 50);

  /** The part of the query that table and picture share. */
  readonly asked = computed(() => {
    const filters = Object.entries(this.filters()).filter(([, value]) => value !== '');
    return {
      ...this.months(),
      ...(Object.fromEntries(filters) as Partial<ComplianceQuery>),
      page: this.page(),
      pageSize: this.pageSize(),
    };
  });

  /** A parameter by name; empty where it is not set. */
  get(name: string): string {
    return this.parameters().get(name) ?? '';
  }

  /** Sets parameters (null takes one away) and goes back to the first page. */
  ask(change: Change): void {
    void this.router.navigate([], {
      queryParams: { page: null, ...change },
      queryParamsHandling: 'merge',
    });
  }

  clear(): void {
    this.ask({ q: null, ...Object.fromEntries(filterNames.map((name) => [name, null])) });
  }
}
