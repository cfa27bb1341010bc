import type { FieldError } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';

/**
 * What keeps photos from being used in a store: those that were never sent, or belong to another
 * store. Empty when all fit.
 * @param fields the field each photo was named in, by the photo's id
 */
export async function photoFaults(
  tenant: Tenant,
  storeId: string,
  fields: ReadonlyMap<string, string>,
): Promise<FieldError[]> {
  if (fields.size === 0) return [];
  const known = await tenant.rows<{ id: string }>(
    `SELECT id FROM uploads WHERE id = ANY($1::uuid[]) AND store_id = $2 AND purpose = 'photo'`,
    [[...fields.keys()], storeId],
  );
  const ids = new Set(known.map(({ id }) => id));
  return [...fields]
    .filter(([id]) => !ids.has(id))
    .map(([, field]) => ({
      field,
      reason: 'unknown-photo',
      message: 'A photo has not arrived yet. Send it again.',
    }));
}
