import { inject, Injectable } from '@angular/core';
import type { BodyOf, ReplyOf } from '@shared/contract/endpoint';
import type {
  createChain,
  editChain,
  listChains,
  retireChain,
} from '@shared/fleet/groups-contract';
import type {
  createStore,
  editStore,
  exportStores,
  listStores,
  locateStore,
  readStore,
  restoreStore,
  retireStore,
} from '@shared/fleet/stores-contract';
import type { listPeople } from '@shared/people/people-contract';
import type { Asked } from '../api/api';
import { Api } from '../api/api';

export type GroupKind = 'chains' | 'regions';
export type Group = ReplyOf<typeof createChain>;
export type GroupQuery = NonNullable<Asked<typeof listChains>['query']>;
export type StoreRow = ReplyOf<typeof listStores>['rows'][number];
export type StoreQuery = NonNullable<Asked<typeof listStores>['query']>;
export type Store = ReplyOf<typeof readStore>;
export type StoreBody = Omit<BodyOf<typeof createStore>, 'id'>;
export type PlaceQuery = NonNullable<Asked<typeof locateStore>['query']>;
export type PersonRow = ReplyOf<typeof listPeople>['rows'][number];
export type PeopleQuery = NonNullable<Asked<typeof listPeople>['query']>;
export type FoundPlace = NonNullable<ReplyOf<typeof locateStore>['place']>;

/** What the pages ask of the server about chains, regions and stores. */
@Injectable({ providedIn: 'root' })
export class FleetApi {
  private readonly api = inject(Api);

  /** Chains and regions are alike in all they can do; their contracts differ in the path alone. */
  groups(kind: GroupKind, query: () => GroupQuery) {
    return this.api.resource<typeof listChains>(`/${kind}` as '/chains', () => ({
      query: query(),
    }));
  }

  createGroup(kind: GroupKind, body: BodyOf<typeof createChain>) {
    return this.api.call<typeof createChain>('POST', `/${kind}` as '/chains', { body });
  }

  editGroup(kind: GroupKind, id: string, body: BodyOf<typeof editChain>) {
    return this.api.call<typeof editChain>('PATCH', `/${kind}/:id` as '/chains/:id', {
      params: { id },
      body,
    });
  }

  setGroupRetired(kind: GroupKind, { id, version }: Group, retired: boolean) {
    const path = `/${kind}/:id/${retired ? 'retire' : 'restore'}`;
    return this.api.call<typeof retireChain>('POST', path as '/chains/:id/retire', {
      params: { id },
      body: { version },
    });
  }

  stores(query: () => StoreQuery | undefined) {
    return this.api.resource<typeof listStores>('/stores', () => {
      const asked = query();
      return asked && { query: asked };
    });
  }

  findStores(query: StoreQuery) {
    return this.api.call<typeof listStores>('GET', '/stores', { query });
  }

  storesFile(query: StoreQuery, format: 'csv' | 'xlsx'): string {
    const { page: _page, pageSize: _pageSize, ...filters } = query;
    return this.api.address<typeof exportStores>('/stores/export', {
      query: { ...filters, format },
    });
  }

  store(id: () => string | undefined) {
    return this.api.resource<typeof readStore>('/stores/:id', () => {
      const asked = id();
      return asked ? { params: { id: asked } } : undefined;
    });
  }

  readStore(id: string) {
    return this.api.call<typeof readStore>('GET', '/stores/:id', { params: { id } });
  }

  locate(query: PlaceQuery) {
    return this.api.call<typeof locateStore>('GET', '/stores/locate', { query });
  }

  createStore(id: string, body: StoreBody) {
    return this.api.call<typeof createStore>('POST', '/stores', { body: { ...body, id } });
  }

  editStore(id: string, version: number, body: StoreBody) {
    return this.api.call<typeof editStore>('PATCH', '/stores/:id', {
      params: { id },
      body: { ...body, version },
    });
  }

  people(query: PeopleQuery) {
    return this.api.call<typeof listPeople>('GET', '/people', { query });
  }

  setStoreRetired({ id, version }: Pick<Store, 'id' | 'version'>, retired: boolean) {
    const sent = { params: { id }, body: { version } };
    return retired
      ? this.api.call<typeof retireStore>('POST', '/stores/:id/retire', sent)
      : this.api.call<typeof restoreStore>('POST', '/stores/:id/restore', sent);
  }
}
