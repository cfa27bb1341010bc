import type { ReplyOf } from '@shared/contract/endpoint';
import type { Place } from '@shared/access/role';
import { photoLimits } from '@shared/uploads/photo-limits';
import type { addPhoto as endpoint } from '@shared/uploads/uploads-contract';
import { Problem, conflict, notFound } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { authoriseAt } from '../access/authorise';
import { recordEvent } from '../audit/record-event';
import type { Services } from '../http/services';
import { FileStore, newFileKey } from './file-store';
import type { EncodedPhoto } from './re-encode-photo';

type Reply = ReplyOf<typeof endpoint>;

/**
 * Keeps a photo of a store. Sent again under the same id by the same person it changes nothing.
 * The files go first: a row never points at nothing, and a file without a row harms nobody.
 * @throws Problem 409 when the id stands for another photo, 429 after too many in a day
 */
export async function addPhoto(
  tenant: Tenant,
  actor: Actor,
  services: Services,
  { id, storeId }: { readonly id: string; readonly storeId: string },
  photo: EncodedPhoto,
): Promise<Reply> {
  const place = await tenant.row<Place>(
    `SELECT id AS "storeId", chain_id AS "chainId", region_id AS "regionId" FROM stores WHERE id = $1`,
    [storeId],
  );
  if (!place) throw notFound('store');
  authoriseAt(actor, 'findings.report', place);
  const before = await tenant.row<Reply & { own: boolean }>(
    `SELECT id, width, height, bytes, uploaded_by = $2 AND store_id = $3 AS own
     FROM uploads WHERE id = $1`,
    [id, actor.personId, storeId],
  );
  if (before) {
    const { own, ...reply } = before;
    if (!own) throw conflict('This id stands for another photo.');
    return reply;
  }
  await checkQuota(tenant, actor, services.now());
  const files = new FileStore(services);
  const key = newFileKey(tenant.organisationId, 'photo');
  const thumbnailKey = `${key}-small`;
  await files.put(key, photo.full.bytes, 'image/jpeg');
  await files.put(thumbnailKey, photo.thumbnail.bytes, 'image/jpeg');
  const { width, height, bytes } = photo.full;
  await tenant.rows(
    `INSERT INTO uploads (id, organisation_id, purpose, store_id, storage_key, thumbnail_key,
       content_type, bytes, width, height, uploaded_by, uploaded_at)
     VALUES ($1, $2, 'photo', $3, $4, $5, 'image/jpeg', $6, $7, $8, $9, $10)`,
    [
      id,
      tenant.organisationId,
      storeId,
      key,
      thumbnailKey,
      bytes.length,
      width,
      height,
      actor.personId,
      services.now(),
    ],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'photo',
    subjectId: id,
    action: 'added',
    detail: { storeId, bytes: bytes.length },
  });
  return { id, width, height, bytes: bytes.length };
}

async function checkQuota(tenant: Tenant, actor: Actor, now: Date): Promise<void> {
  const sent = await tenant.row<{ count: number }>(
    `SELECT count(*)::int AS count FROM uploads
     WHERE uploaded_by = $1 AND uploaded_at > $2::timestamptz - interval '1 day'`,
    [actor.personId, now],
  );
  if ((sent?.count ?? 0) >= photoLimits.perDay) {
    throw new Problem(429, 'too-many', 'That is more photos than one person sends in a day.');
  }
}
