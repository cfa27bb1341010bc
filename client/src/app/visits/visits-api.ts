import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type {
  addVisit,
  editVisit,
  listComing,
  listUnplanned,
  moveVisit,
  orderNearestNext,
  orderRoute,
  publishRoute,
  readPlan,
  removeVisit,
} from '@shared/visits/visits-contract';
import type { Asked, SentBody } from '../api/api';
import { Api } from '../api/api';

export type Plan = ReplyOf<typeof readPlan>;
export type Route = Plan['routes'][number];
export type Technician = Plan['technicians'][number];
export type Visit = Route['visits'][number];
export type PlannedTask = Visit['tasks'][number];
export type Unplanned = ReplyOf<typeof listUnplanned>['rows'][number];
export type Coming = ReplyOf<typeof listComing>['visits'][number];
export type NewVisit = SentBody<typeof addVisit>;

/** Everything the visits' pages ask of the server. */
@Injectable({ providedIn: 'root' })
export class VisitsApi {
  private readonly api = inject(Api);

  plan(query: () => NonNullable<Asked<typeof readPlan>['query']>) {
    return this.api.resource<typeof readPlan>('/routes', () => ({ query: query() }));
  }

  unplanned(query: () => NonNullable<Asked<typeof listUnplanned>['query']>) {
    return this.api.resource<typeof listUnplanned>('/visits/unplanned', () => ({
      query: query(),
    }));
  }

  coming(query: () => NonNullable<Asked<typeof listComing>['query']>) {
    return this.api.resource<typeof listComing>('/visits/coming', () => ({ query: query() }));
  }

  add(body: NewVisit) {
    return this.api.call<typeof addVisit>('POST', '/visits', { body });
  }

  edit(id: string, body: SentBody<typeof editVisit>) {
    return this.api.call<typeof editVisit>('PATCH', '/visits/:id', { params: { id }, body });
  }

  move(id: string, body: SentBody<typeof moveVisit>) {
    return this.api.call<typeof moveVisit>('POST', '/visits/:id/move', { params: { id }, body });
  }

  remove(id: string, version: number) {
    return this.api.call<typeof removeVisit>('DELETE', '/visits/:id', {
      params: { id },
      body: { version },
    });
  }

  order(id: string, version: number, visitIds: readonly string[]) {
    return this.api.call<typeof orderRoute>('PUT', '/routes/:id/order', {
      params: { id },
      body: { version, visitIds: [...visitIds] },
    });
  }

  orderNearestNext(id: string, version: number) {
    return this.api.call<typeof orderNearestNext>('POST', '/routes/:id/nearest-next', {
      params: { id },
      body: { version },
    });
  }

  publish(id: string, version: number) {
    return this.api.call<typeof publishRoute>('POST', '/routes/:id/publish', {
      params: { id },
      body: { version },
    });
  }
}
