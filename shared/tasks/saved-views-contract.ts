import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { byId, version } from './task-parts';

/** How many views of one page a person may keep. */
export const MOST_VIEWS = 50;

const page = z
  .string()
  .max(40)
  .regex(/^[a-z]+(-[a-z]+)*$/, 'Name a page as its address does.');
const fields = {
  name: z.string().trim().min(1).max(80),
  /** Filters, sort and columns as the page's address holds them, without the question mark. */
  query: z.string().max(2000),
  /** For everybody of the organisation; each still sees only what they may. */
  shared: z.boolean(),
};

export const savedView = z.strictObject({
  id: z.uuid(),
  page: z.string(),
  ...fields,
  version,
  /** Whose it is. */
  owner: z.string(),
  mayEdit: z.boolean(),
});

export const listSavedViews = endpoint({
  method: 'GET',
  path: '/saved-views',
  summary: 'One’s own views of a page and those that others share, by name',
  access: 'signed-in',
  query: z.strictObject({ page }),
  reply: z.strictObject({
    rows: z.array(savedView),
    /** Whether this person may share views with everybody. */
    mayShare: z.boolean(),
  }),
});

export const saveView = endpoint({
  method: 'POST',
  path: '/saved-views',
  summary: 'Keep a view of a page under a name',
  access: 'signed-in',
  body: z.strictObject({ id: z.uuid(), page, ...fields }),
  reply: savedView,
});

export const editView = endpoint({
  method: 'PATCH',
  path: '/saved-views/:id',
  summary: 'Rename a view, share it, or keep other filters in it',
  access: 'signed-in',
  params: byId,
  body: z.strictObject({ ...fields, version }),
  reply: savedView,
});

export const deleteView = endpoint({
  method: 'DELETE',
  path: '/saved-views/:id',
  summary: 'Forget a view',
  access: 'signed-in',
  params: byId,
  body: z.strictObject({ version }),
  reply: z.undefined(),
});

export const savedViewsEndpoints = [listSavedViews, saveView, editView, deleteView];
