import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { listDigests, readDigest } from '@shared/digests/digests-contract';
import type { Asked } from '../api/api';
import { Api } from '../api/api';

export type DigestRow = ReplyOf<typeof listDigests>['rows'][number];
export type DigestQuery = NonNullable<Asked<typeof listDigests>['query']>;

/** Everything the digests' pages ask of the server. */
@Injectable({ providedIn: 'root' })
export class DigestsApi {
  private readonly api = inject(Api);

  list(query: () => DigestQuery) {
    return this.api.resource<typeof listDigests>('/digests', () => ({ query: query() }));
  }

  one(id: () => string) {
    return this.api.resource<typeof readDigest>('/digests/:id', () => ({ params: { id: id() } }));
  }
}
