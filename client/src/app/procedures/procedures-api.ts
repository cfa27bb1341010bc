import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { ProcedureContent } from '@shared/procedures/procedure-content';
import type {
  addStarterProcedures,
  beginDraft,
  createProcedure,
  discardDraft,
  listProcedures,
  publishDraft,
  readProcedure,
  restoreProcedure,
  retireProcedure,
  saveDraft,
} from '@shared/procedures/procedures-contract';
import type { Asked } from '../api/api';
import { Api } from '../api/api';
import { newId } from '../api/new-id';

export type Procedure = ReplyOf<typeof readProcedure>;
export type ProcedureVersion = Procedure['versions'][number];
export type ProcedureRow = ReplyOf<typeof listProcedures>['rows'][number];
export type ProcedureQuery = NonNullable<Asked<typeof listProcedures>['query']>;

/** Everything the procedures' pages ask of the server. */
@Injectable({ providedIn: 'root' })
export class ProceduresApi {
  private readonly api = inject(Api);

  list(query: () => ProcedureQuery) {
    return this.api.resource<typeof listProcedures>('/procedures', () => ({ query: query() }));
  }

  one(id: () => string | undefined) {
    return this.api.resource<typeof readProcedure>('/procedures/:id', () => {
      const asked = id();
      return asked ? { params: { id: asked } } : undefined;
    });
  }

  read(id: string) {
    return this.api.call<typeof readProcedure>('GET', '/procedures/:id', { params: { id } });
  }

  create(id: string, code: string, content: ProcedureContent) {
    return this.api.call<typeof createProcedure>('POST', '/procedures', {
      body: { id, versionId: newId(), code, content },
    });
  }

  addStarters() {
    return this.api.call<typeof addStarterProcedures>('POST', '/procedures/starters');
  }

  beginDraft(id: string) {
    return this.api.call<typeof beginDraft>('POST', '/procedures/:id/draft', {
      params: { id },
      body: { versionId: newId() },
    });
  }

  saveDraft(id: string, version: number, content: ProcedureContent) {
    return this.api.call<typeof saveDraft>('PUT', '/procedures/:id/draft', {
      params: { id },
      body: { version, content },
    });
  }

  discardDraft(id: string, version: number) {
    return this.api.call<typeof discardDraft>('DELETE', '/procedures/:id/draft', {
      params: { id },
      body: { version },
    });
  }

  publish(id: string, version: number) {
    return this.api.call<typeof publishDraft>('POST', '/procedures/:id/publish', {
      params: { id },
      body: { version },
    });
  }

  retire(id: string, version: number) {
    return this.api.call<typeof retireProcedure>('POST', '/procedures/:id/retire', {
      params: { id },
      body: { version },
    });
  }

  restore(id: string, version: number) {
    return this.api.call<typeof restoreProcedure>('POST', '/procedures/:id/restore', {
      params: { id },
      body: { version },
    });
  }
}
