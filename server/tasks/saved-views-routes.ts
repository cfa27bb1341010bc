import {
  deleteView as deleteViewEndpoint,
  editView as editViewEndpoint,
  listSavedViews,
  saveView as saveViewEndpoint,
} from '@shared/tasks/saved-views-contract';
import type { Routes } from '../http/routes';
import { deleteView, editView, saveView, savedViewsOf } from './saved-views';

export function savedViewsRoutes(routes: Routes): void {
  routes.on(listSavedViews, ({ tenant, actor, query }) => savedViewsOf(tenant, actor, query.page));

  routes.on(saveViewEndpoint, ({ tenant, actor, body }) => saveView(tenant, actor, body));

  routes.on(editViewEndpoint, ({ tenant, actor, params, body }) =>
    editView(tenant, actor, params.id, body),
  );

  routes.on(deleteViewEndpoint, ({ tenant, actor, params, body }) =>
    deleteView(tenant, actor, params.id, body.version),
  );
}
