import { inject, Injectable } from '@angular/core';
import type {
  exportCompliance,
  readCompliance,
  readComplianceFilters,
  readCompliancePicture,
} from '@shared/compliance/compliance-contract';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { Asked } from '../api/api';
import { Api } from '../api/api';

export type ComplianceQuery = NonNullable<Asked<typeof readCompliance>['query']>;
export type PictureQuery = NonNullable<Asked<typeof readCompliancePicture>['query']>;
export type ComplianceRow = ReplyOf<typeof readCompliance>['rows'][number];
export type Grouping = NonNullable<ComplianceQuery['by']>;

/** Everything the compliance pages ask of the server. */
@Injectable({ providedIn: 'root' })
export class ComplianceApi {
  private readonly api = inject(Api);

  table(query: () => ComplianceQuery) {
    return this.api.resource<typeof readCompliance>('/compliance', () => ({ query: query() }));
  }

  picture(query: () => PictureQuery) {
    return this.api.resource<typeof readCompliancePicture>('/compliance/picture', () => ({
      query: query(),
    }));
  }

  filters(store: () => string) {
    return this.api.resource<typeof readComplianceFilters>('/compliance/filters', () => ({
      query: { store: store() || undefined },
    }));
  }

  /** Where the table can be taken away as a file. */
  file(format: 'csv' | 'xlsx', query: ComplianceQuery): string {
    const { page: _page, pageSize: _pageSize, ...filters } = query;
    return this.api.address<typeof exportCompliance>('/compliance/export', {
      query: { ...filters, format },
    });
  }
}
