import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type {
  deleteView,
  editView,
  listSavedViews,
  saveView,
} from '@shared/tasks/saved-views-contract';
import type { SentBody } from '../../api/api';
import { Api } from '../../api/api';

export type SavedView = ReplyOf<typeof saveView>;
export type NewView = SentBody<typeof saveView>;

/** Kept filters of a page. */
@Injectable({ providedIn: 'root' })
export class SavedViewsApi {
  private readonly api = inject(Api);

  list(page: () => string) {
    return this.api.resource<typeof listSavedViews>('/saved-views', () => ({
      query: { page: page() },
    }));
  }

  save(body: NewView) {
    return this.api.call<typeof saveView>('POST', '/saved-views', { body });
  }

  edit({ id, version, name, query, shared }: SavedView) {
    return this.api.call<typeof editView>('PATCH', '/saved-views/:id', {
      params: { id },
      body: { version, name, query, shared },
    });
  }

  remove({ id, version }: SavedView) {
    return this.api.call<typeof deleteView>('DELETE', '/saved-views/:id', {
      params: { id },
      body: { version },
    });
  }
}
