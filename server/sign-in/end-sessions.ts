import type { Tenant } from '@db/tenant-transaction';

/**
 * Ends a person's sessions on every server at once, in the transaction of what makes it necessary.
 * @param keep the session that stays, as its cookie names it
 */
export async function endSessionsOf(
  tenant: Tenant,
  personId: string,
  keep: string | null = null,
): Promise<number> {
  const ended = await tenant.rows(
    `DELETE FROM sessions WHERE person_id = $1 AND sid IS DISTINCT FROM $2::text RETURNING expire`,
    [personId, keep],
  );
  return ended.length;
}
