import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { acknowledge, readShift } from '@shared/shift-checks/shift-checks-contract';
import type { SentBody } from '../api/api';
import { Api } from '../api/api';

export type Shift = ReplyOf<typeof readShift>;
export type Acknowledgements = SentBody<typeof acknowledge>;

/** Everything the store's shift asks of the server. */
@Injectable({ providedIn: 'root' })
export class ShiftApi {
  private readonly api = inject(Api);

  shift(store: () => string | undefined) {
    return this.api.resource<typeof readShift>('/shift', () => ({ query: { store: store() } }));
  }

  acknowledge(body: Acknowledgements) {
    return this.api.call<typeof acknowledge>('POST', '/shift/acknowledgements', { body });
  }
}
