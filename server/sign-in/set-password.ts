import { type FieldError, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import { hashPassword, passwordFaults } from './password';

/** The words of a person's own that make a poor password. */
export async function passwordContext(tenant: Tenant, personId: string): Promise<string[]> {
  const row = await tenant.row<{ name: string; email: string | null; organisation: string }>(
    `SELECT p.name, p.email, o.name AS organisation
     FROM people p JOIN organisations o ON o.id = p.organisation_id WHERE p.id = $1`,
    [personId],
  );
  return row ? [row.name, row.email ?? '', row.organisation] : [];
}

/**
 * Gives a person a new password.
 * @param field the name under which the password was sent
 * @throws Problem 422 with what is wrong with it
 */
export async function setPassword(
  tenant: Tenant,
  personId: string,
  password: string,
  field = 'password',
): Promise<void> {
  const faults: FieldError[] = passwordFaults(
    password,
    await passwordContext(tenant, personId),
    field,
  );
  if (faults.length > 0) throw invalid(faults);
  await tenant.rows('UPDATE people SET password_hash = $2, version = version + 1 WHERE id = $1', [
    personId,
    await hashPassword(password),
  ]);
}
