import { Problem } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';

/**
 * SQL of the active people who administer the whole organisation and have a password, other than the
 * one bound to `$1`.
 */
export const otherAdministrators = `
  SELECT p.id FROM people p JOIN role_grants g ON g.person_id = p.id
  WHERE g.role = 'administrator' AND g.scope_kind = 'organisation' AND p.disabled_at IS NULL
    AND p.password_hash IS NOT NULL AND p.id <> $1`;

/**
 * Lets only one change of administrators happen at a time: two who take each other's role at once
 * would otherwise leave nobody.
 */
export async function lockAdministrators(tenant: Tenant): Promise<void> {
  await tenant.rows('SELECT id FROM organisations WHERE id = $1 FOR UPDATE', [
    tenant.organisationId,
  ]);
}

/** @throws Problem 409 when nobody but this person administers the organisation */
export async function keepAdministrator(tenant: Tenant, personId: string): Promise<void> {
  if (await tenant.row(`${otherAdministrators} LIMIT 1`, [personId])) return;
  throw new Problem(409, 'last-administrator', 'This is the last administrator.', {
    detail: 'Make somebody else administrator of the whole organisation first.',
  });
}
