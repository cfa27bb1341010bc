import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { readToday } from '@shared/today/today-contract';
import { Api } from '../api/api';

export type Today = ReplyOf<typeof readToday>;
export type TodayStop = Today['visits'][number];
export type TodayTask = TodayStop['tasks'][number];

/** What a technician's day asks of the server. */
@Injectable({ providedIn: 'root' })
export class TodayApi {
  private readonly api = inject(Api);

  today() {
    return this.api.resource<typeof readToday>('/today', () => ({}));
  }
}
