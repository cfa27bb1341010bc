import { abilitiesFrom } from '@shared/access/ability';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { readSession } from '@shared/sign-in/sign-in-contract';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';

/** The signed-in person as the client knows them. */
export async function presentSession(
  tenant: Tenant,
  actor: Actor,
): Promise<ReplyOf<typeof readSession>> {
  const organisation = await tenant.row<{ id: string; name: string; timeZone: string }>(
    'SELECT id, name, time_zone AS "timeZone" FROM organisations WHERE id = $1',
    [tenant.organisationId],
  );
  const names = await tenant.rows<{ id: string; name: string }>(
    `SELECT id, name FROM organisations UNION ALL SELECT id, name FROM chains
     UNION ALL SELECT id, name FROM regions
     UNION ALL SELECT id, number || ' ' || name FROM stores WHERE id = ANY($1::uuid[])`,
    [actor.grants.map(({ scopeId }) => scopeId)],
  );
  const nameOf = new Map(names.map(({ id, name }) => [id, name]));
  const { personId: id, name, email, locale, timeZone } = actor;
  return {
    person: { id, name, email, locale, timeZone },
    organisation: organisation as NonNullable<typeof organisation>,
    roles: actor.grants.map((grant) => ({ ...grant, scopeName: nameOf.get(grant.scopeId) ?? '' })),
    abilities: abilitiesFrom(actor.grants),
  };
}
