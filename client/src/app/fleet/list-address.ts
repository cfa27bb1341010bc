import { inject } from '@angular/core';
import { Router } from '@angular/router';
import type { PageChange } from '../ui/data-table/data-table';

export type AddressChange = Readonly<Record<string, string | number | null>>;

/** Inputs bound to the address arrive as text, or not at all. */
export const asText = (value: string | undefined): string => value ?? '';
export const asPage = (value: string | undefined): number => Number(value) || 1;
export const asPageSize = (value: string | undefined): number => Number(value) || 50;

/**
 * Writes a list's filters, order and page into the address, which the page reads them back from.
 * A change of anything but the page leads to the first page. Call it where injection is possible.
 */
export function listAddress() {
  const router = inject(Router);
  const ask = (change: AddressChange): void => {
    void router.navigate([], {
      queryParams: { page: null, ...change },
      queryParamsHandling: 'merge',
    });
  };
  /** Takes filters away. */
  const drop = (keys: readonly string[]): void =>
    ask(Object.fromEntries(keys.map((key) => [key, null])));
  const turn = ({ page, pageSize }: PageChange): void => ask({ page, pageSize });
  return { ask, drop, turn };
}

/** What `state` in the address may be; anything else is read as nothing. */
export function asStanding(value: string): 'live' | 'retired' | 'all' {
  return value === 'retired' || value === 'all' ? value : 'live';
}
