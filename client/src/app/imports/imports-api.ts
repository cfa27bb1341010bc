import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type {
  cancelImport,
  checkImport,
  downloadTemplate,
  exportImportProblems,
  listImportProblems,
  listImports,
  readImport,
  startImport,
  uploadImport,
} from '@shared/imports/imports-contract';
import type { DateOrder, ImportField, ImportKind } from '@shared/imports/import-fields';
import type { Asked } from '../api/api';
import { Api } from '../api/api';

export type Import = ReplyOf<typeof readImport>;
export type ImportRow = ReplyOf<typeof listImports>['rows'][number];
export type ImportOutcome = NonNullable<Import['checked']>;
export type ImportMode = NonNullable<Import['mode']>;
export type ImportProblem = ReplyOf<typeof listImportProblems>['rows'][number];
export type ProblemQuery = NonNullable<Asked<typeof listImportProblems>['query']>;

/** Everything the pages of imports ask of the server. */
@Injectable({ providedIn: 'root' })
export class ImportsApi {
  private readonly api = inject(Api);

  list(query: () => NonNullable<Asked<typeof listImports>['query']>) {
    return this.api.resource<typeof listImports>('/imports', () => ({ query: query() }));
  }

  one(id: () => string) {
    return this.api.resource<typeof readImport>('/imports/:id', () => ({ params: { id: id() } }));
  }

  template(kind: ImportKind, format: 'csv' | 'xlsx'): string {
    return this.api.address<typeof downloadTemplate>('/imports/template', {
      query: { kind, format },
    });
  }

  upload(id: string, kind: ImportKind, file: File) {
    const body = new FormData();
    body.append('file', file);
    return this.api.call<typeof uploadImport>('POST', '/imports', { query: { id, kind }, body });
  }

  check(
    { id, version }: Pick<Import, 'id' | 'version'>,
    fields: readonly (ImportField | null)[],
    dateOrder: DateOrder,
  ) {
    return this.api.call<typeof checkImport>('POST', '/imports/:id/check', {
      params: { id },
      body: { version, fields: [...fields], dateOrder },
    });
  }

  problems(id: () => string | undefined, query: () => ProblemQuery) {
    return this.api.resource<typeof listImportProblems>('/imports/:id/problems', () => {
      const asked = id();
      return asked ? { params: { id: asked }, query: query() } : undefined;
    });
  }

  problemsFile(id: string, format: 'csv' | 'xlsx'): string {
    return this.api.address<typeof exportImportProblems>('/imports/:id/problems/export', {
      params: { id },
      query: { format },
    });
  }

  start({ id, version }: Pick<Import, 'id' | 'version'>, mode: ImportMode) {
    return this.api.call<typeof startImport>('POST', '/imports/:id/start', {
      params: { id },
      body: { version, mode },
    });
  }

  cancel(id: string) {
    return this.api.call<typeof cancelImport>('POST', '/imports/:id/cancel', { params: { id } });
  }
}
