import { inject, Injectable } from '@angular/core';
import type { BodyOf, ReplyOf } from '@shared/contract/endpoint';
import type {
  editComponent,
  exportComponents,
  installComponent,
  listComponents,
  removeComponent,
  replaceComponent,
  undoRemoval,
} from '@shared/fleet/components-contract';
import type {
  createUnit,
  editUnit,
  exportUnits,
  listUnits,
  readUnit,
  readUnitLife,
  restoreUnit,
  retireUnit,
} from '@shared/fleet/units-contract';
import type { Asked } from '../api/api';
import { Api } from '../api/api';

export type UnitRow = ReplyOf<typeof listUnits>['rows'][number];
export type UnitQuery = NonNullable<Asked<typeof listUnits>['query']>;
export type Unit = ReplyOf<typeof readUnit>;
export type UnitBody = Omit<BodyOf<typeof editUnit>, 'version'>;
export type LifeEvent = ReplyOf<typeof readUnitLife>['events'][number];
export type Part = Unit['components'][number];
export type PartRow = ReplyOf<typeof listComponents>['rows'][number];
export type PartQuery = NonNullable<Asked<typeof listComponents>['query']>;
export type NewPart = BodyOf<typeof installComponent>;
export type PartFields = Omit<NewPart, 'id' | 'kind'>;
export type Replacement = BodyOf<typeof replaceComponent>;
export type Removal = BodyOf<typeof removeComponent>;

/** What the pages ask of the server about units and their parts. */
@Injectable({ providedIn: 'root' })
export class UnitApi {
  private readonly api = inject(Api);

  units(query: () => UnitQuery | undefined) {
    return this.api.resource<typeof listUnits>('/units', () => {
      const asked = query();
      return asked && { query: asked };
    });
  }

  unitsFile(query: UnitQuery, format: 'csv' | 'xlsx'): string {
    const { page: _page, pageSize: _pageSize, ...filters } = query;
    return this.api.address<typeof exportUnits>('/units/export', { query: { ...filters, format } });
  }

  unit(id: () => string | undefined) {
    return this.api.resource<typeof readUnit>('/units/:id', () => {
      const asked = id();
      return asked ? { params: { id: asked } } : undefined;
    });
  }

  readUnit(id: string) {
    return this.api.call<typeof readUnit>('GET', '/units/:id', { params: { id } });
  }

  life(id: () => string) {
    return this.api.resource<typeof readUnitLife>('/units/:id/life', () => ({
      params: { id: id() },
    }));
  }

  createUnit(id: string, body: UnitBody, components: readonly NewPart[]) {
    return this.api.call<typeof createUnit>('POST', '/units', {
      body: { ...body, id, components: [...components] },
    });
  }

  editUnit(id: string, version: number, body: UnitBody) {
    return this.api.call<typeof editUnit>('PATCH', '/units/:id', {
      params: { id },
      body: { ...body, version },
    });
  }

  setUnitRetired({ id, version }: Pick<Unit, 'id' | 'version'>, retired: boolean) {
    const sent = { params: { id }, body: { version } };
    return retired
      ? this.api.call<typeof retireUnit>('POST', '/units/:id/retire', sent)
      : this.api.call<typeof restoreUnit>('POST', '/units/:id/restore', sent);
  }

  parts(query: () => PartQuery) {
    return this.api.resource<typeof listComponents>('/components', () => ({ query: query() }));
  }

  partsFile(query: PartQuery, format: 'csv' | 'xlsx'): string {
    const { page: _page, pageSize: _pageSize, ...filters } = query;
    return this.api.address<typeof exportComponents>('/components/export', {
      query: { ...filters, format },
    });
  }

  install(unitId: string, body: NewPart) {
    return this.api.call<typeof installComponent>('POST', '/units/:id/components', {
      params: { id: unitId },
      body,
    });
  }

  editPart({ id, version }: Part, fields: PartFields) {
    return this.api.call<typeof editComponent>('PATCH', '/components/:id', {
      params: { id },
      body: { ...fields, version },
    });
  }

  replace(id: string, body: Replacement) {
    return this.api.call<typeof replaceComponent>('POST', '/components/:id/replace', {
      params: { id },
      body,
    });
  }

  remove(id: string, body: Removal) {
    return this.api.call<typeof removeComponent>('POST', '/components/:id/remove', {
      params: { id },
      body,
    });
  }

  undoRemoval({ id, version }: Pick<Part, 'id' | 'version'>) {
    return this.api.call<typeof undoRemoval>('POST', '/components/:id/undo-removal', {
      params: { id },
      body: { version },
    });
  }
}
