import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type {
  activatePerson,
  deactivatePerson,
  editPerson,
  editRoles,
  exportPeople,
  inviteAgain,
  invitePerson,
  listPeople,
  readPerson,
} from '@shared/people/people-contract';
import type { Asked, SentBody } from '../api/api';
import { Api } from '../api/api';

export type Person = ReplyOf<typeof readPerson>;
export type PersonRow = ReplyOf<typeof listPeople>['rows'][number];
export type PeopleQuery = NonNullable<Asked<typeof listPeople>['query']>;
export type Invitation = SentBody<typeof invitePerson>;
export type PersonDetails = Omit<SentBody<typeof editPerson>, 'version'>;
export type Grant = SentBody<typeof editRoles>['roles'][number];

/** Everything the people's pages ask of the server. */
@Injectable({ providedIn: 'root' })
export class PeopleApi {
  private readonly api = inject(Api);

  list(query: () => PeopleQuery) {
    return this.api.resource<typeof listPeople>('/people', () => ({ query: query() }));
  }

  file(query: PeopleQuery, format: 'csv' | 'xlsx'): string {
    const { page: _page, pageSize: _pageSize, ...filters } = query;
    return this.api.address<typeof exportPeople>('/people/export', {
      query: { ...filters, format },
    });
  }

  one(id: () => string) {
    return this.api.resource<typeof readPerson>('/people/:id', () => ({ params: { id: id() } }));
  }

  read(id: string) {
    return this.api.call<typeof readPerson>('GET', '/people/:id', { params: { id } });
  }

  invite(body: Invitation) {
    return this.api.call<typeof invitePerson>('POST', '/people', { body });
  }

  inviteAgain(id: string) {
    return this.api.call<typeof inviteAgain>('POST', '/people/:id/invitation', { params: { id } });
  }

  edit(id: string, version: number, details: PersonDetails) {
    return this.api.call<typeof editPerson>('PATCH', '/people/:id', {
      params: { id },
      body: { version, ...details },
    });
  }

  editRoles(id: string, version: number, roles: readonly Grant[]) {
    return this.api.call<typeof editRoles>('PUT', '/people/:id/roles', {
      params: { id },
      body: { version, roles: [...roles] },
    });
  }

  setActive(id: string, version: number, active: boolean) {
    const sent = { params: { id }, body: { version } };
    return active
      ? this.api.call<typeof activatePerson>('POST', '/people/:id/activate', sent)
      : this.api.call<typeof deactivatePerson>('POST', '/people/:id/deactivate', sent);
  }
}
