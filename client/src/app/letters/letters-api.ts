import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { listLetters, readLetter, retryLetters, showLetter } from '@shared/mail/mail-contract';
import type { Asked } from '../api/api';
import { Api } from '../api/api';

export type LetterRow = ReplyOf<typeof listLetters>['rows'][number];
export type LetterQuery = NonNullable<Asked<typeof listLetters>['query']>;

/** Everything the letters' pages ask of the server. */
@Injectable({ providedIn: 'root' })
export class LettersApi {
  private readonly api = inject(Api);

  list(query: () => LetterQuery) {
    return this.api.resource<typeof listLetters>('/mail/letters', () => ({ query: query() }));
  }

  one(id: () => string) {
    return this.api.resource<typeof readLetter>('/mail/letters/:id', () => ({
      params: { id: id() },
    }));
  }

  /** The letter as it looks, a document of its own. */
  pageOf(id: string): string {
    return this.api.address<typeof showLetter>('/mail/letters/:id/html', { params: { id } });
  }

  retry(ids: readonly string[]) {
    return this.api.call<typeof retryLetters>('POST', '/mail/retries', { body: { ids: [...ids] } });
  }
}
