import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type {
  exportFindings,
  listFindings,
  readFinding,
  reopenFinding,
  reportFinding,
  settleFinding,
} from '@shared/findings/findings-contract';
import type { listRegions, listStores, listUnits, readStore } from '@shared/fleet/fleet-contract';
import type { readTaskSheet } from '@shared/inspections/inspections-contract';
import type { Asked, SentBody } from '../api/api';
import { Api } from '../api/api';

export type Finding = ReplyOf<typeof readFinding>;
export type FindingQuery = NonNullable<Asked<typeof listFindings>['query']>;
export type Settlement = SentBody<typeof settleFinding>;
export type Report = SentBody<typeof reportFinding>;
export type TaskSheet = ReplyOf<typeof readTaskSheet>;
export type StoreChoice = ReplyOf<typeof listStores>['rows'][number];

/** Everything the findings' pages ask of the server. */
@Injectable({ providedIn: 'root' })
export class FindingsApi {
  private readonly api = inject(Api);

  list(query: () => FindingQuery) {
    return this.api.resource<typeof listFindings>('/findings', () => ({ query: query() }));
  }

  file(query: FindingQuery, format: 'csv' | 'xlsx'): string {
    const { page: _page, pageSize: _pageSize, ...filters } = query;
    return this.api.address<typeof exportFindings>('/findings/export', {
      query: { ...filters, format },
    });
  }

  one(id: () => string) {
    return this.api.resource<typeof readFinding>('/findings/:id', () => ({ params: { id: id() } }));
  }

  /** The procedure and readings of the task that a finding came from. */
  sheet(taskId: () => string | null | undefined) {
    return this.api.resource<typeof readTaskSheet>('/tasks/:id/sheet', () => {
      const id = taskId();
      return id ? { params: { id } } : undefined;
    });
  }

  report(body: Report) {
    return this.api.call<typeof reportFinding>('POST', '/findings', { body });
  }

  settle(id: string, body: Settlement) {
    return this.api.call<typeof settleFinding>('POST', '/findings/:id/settlement', {
      params: { id },
      body,
    });
  }

  reopen(id: string, version: number) {
    return this.api.call<typeof reopenFinding>('DELETE', '/findings/:id/settlement', {
      params: { id },
      body: { version },
    });
  }

  regions() {
    return this.api.resource<typeof listRegions>('/regions', () => ({ query: { pageSize: 200 } }));
  }

  store(id: () => string) {
    return this.api.resource<typeof readStore>('/stores/:id', () =>
      id() ? { params: { id: id() } } : undefined,
    );
  }

  stores(q: string) {
    return this.api.call<typeof listStores>('GET', '/stores', { query: { q, pageSize: 20 } });
  }

  units(store: () => string) {
    return this.api.resource<typeof listUnits>('/units', () =>
      store() ? { query: { store: store(), pageSize: 200 } } : undefined,
    );
  }
}
