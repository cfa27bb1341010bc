import { grantsWith } from '@shared/access/ability';
import type { BodyOf, ReplyOf } from '@shared/contract/endpoint';
import { conflict, forbidden, invalid, notFound } from '@shared/problem';
import {
  MOST_VIEWS,
  type editView as editEndpoint,
  type listSavedViews,
  type saveView as saveEndpoint,
} from '@shared/tasks/saved-views-contract';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { nameTaken } from '../programmes/name-taken';

type View = ReplyOf<typeof saveEndpoint>;
type Draft = BodyOf<typeof saveEndpoint>;
type Edit = BodyOf<typeof editEndpoint>;

/** Who plans or looks after people sets up views for everybody. */
const mayShare = (actor: Actor) =>
  [...grantsWith('tasks.plan', actor.grants), ...grantsWith('people.edit', actor.grants)].length >
  0;

const columns = `v.id, v.page, v.name, v.query, v.shared, v.version, p.name AS owner,
  v.person_id = $1 AS "mayEdit"`;

/** One's own views of a page and the shared ones. */
export async function savedViewsOf(
  tenant: Tenant,
  actor: Actor,
  page: string,
): Promise<ReplyOf<typeof listSavedViews>> {
  const rows = await tenant.rows<View>(
    `SELECT ${columns} FROM saved_views v JOIN people p ON p.id = v.person_id
     WHERE v.page = $2 AND (v.person_id = $1 OR v.shared)
     ORDER BY lower(v.name), lower(p.name), v.id`,
    [actor.personId, page],
  );
  return { rows, mayShare: mayShare(actor) };
}

/**
 * Keeps a view; the same one sent again changes nothing.
 * @throws Problem 403 when it is to be shared and may not be; 422 for a taken name or too many views
 */
export async function saveView(tenant: Tenant, actor: Actor, draft: Draft): Promise<View> {
  if (draft.shared && !mayShare(actor)) throw forbidden();
  const { id, page, name, query, shared } = draft;
  const standing = await tenant.row<{ id: string; count: number }>(
    `SELECT count(*)::int AS count, (array_agg(id) FILTER (WHERE name = $3 AND id <> $4))[1] AS id
     FROM saved_views WHERE person_id = $1 AND page = $2`,
    [actor.personId, page, name, id],
  );
  if (standing?.id) throw nameTaken();
  if ((standing?.count ?? 0) >= MOST_VIEWS) {
    throw invalid([
      { field: 'name', reason: 'too-many', message: `At most ${MOST_VIEWS} views of a page.` },
    ]);
  }
  const made = await tenant.row(
    `INSERT INTO saved_views (id, organisation_id, person_id, page, name, query, shared)
     VALUES ($1, $2, $3, $4, $5, $6, $7) ON CONFLICT (id) DO NOTHING RETURNING id`,
    [id, tenant.organisationId, actor.personId, page, name, query, shared],
  );
  if (made) await record(tenant, actor, id, 'view-saved', { page, name, shared });
  return viewById(tenant, actor, id);
}

/** @throws Problem 404; 403 when it is another's; 409 when it was changed meanwhile; 422 */
export async function editView(
  tenant: Tenant,
  actor: Actor,
  id: string,
  { name, query, shared, version }: Edit,
): Promise<View> {
  const view = await lockOwn(tenant, actor, id, version);
  if (shared && !view.shared && !mayShare(actor)) throw forbidden();
  const taken = await tenant.row(
    'SELECT id FROM saved_views WHERE person_id = $1 AND page = $2 AND name = $3 AND id <> $4',
    [actor.personId, view.page, name, id],
  );
  if (taken) throw nameTaken();
  await tenant.rows(
    `UPDATE saved_views SET name = $2, query = $3, shared = $4, version = version + 1 WHERE id = $1`,
    [id, name, query, shared],
  );
  await record(tenant, actor, id, 'view-edited', { page: view.page, name, shared });
  return viewById(tenant, actor, id);
}

/** @throws Problem 404; 403 when it is another's; 409 when it was changed meanwhile */
export async function deleteView(
  tenant: Tenant,
  actor: Actor,
  id: string,
  version: number,
): Promise<void> {
  const { page, name, shared } = await lockOwn(tenant, actor, id, version);
  await tenant.rows('DELETE FROM saved_views WHERE id = $1', [id]);
  await record(tenant, actor, id, 'view-deleted', { page, name, shared });
}

async function lockOwn(tenant: Tenant, actor: Actor, id: string, version: number): Promise<View> {
  const view = await tenant.row<View>(
    `SELECT ${columns} FROM saved_views v JOIN people p ON p.id = v.person_id
     WHERE v.id = $2 AND (v.person_id = $1 OR v.shared) FOR UPDATE OF v`,
    [actor.personId, id],
  );
  if (!view) throw notFound('view');
  if (!view.mayEdit) throw forbidden();
  if (view.version !== version) throw conflict();
  return view;
}

async function viewById(tenant: Tenant, actor: Actor, id: string): Promise<View> {
  const view = await tenant.row<View>(
    `SELECT ${columns} FROM saved_views v JOIN people p ON p.id = v.person_id
     WHERE v.id = $2 AND v.person_id = $1`,
    [actor.personId, id],
  );
  if (!view) throw notFound('view');
  return view;
}

const record = (tenant: Tenant, actor: Actor, id: string, action: string, detail: object) =>
  recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'saved-view',
    subjectId: id,
    action,
    detail,
  });
