import { mayEverywhere } from '@shared/access/ability';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { readProcedure } from '@shared/procedures/procedures-contract';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { findProcedure, rulesUsing, versionsOf } from './procedure-queries';

/**
 * A procedure with its versions as the contract tells it. Who may not edit sees no drafts.
 * @throws Problem 404
 */
export async function presentProcedure(
  tenant: Tenant,
  actor: Actor,
  id: string,
): Promise<ReplyOf<typeof readProcedure>> {
  const { code, retiredAt, version } = await findProcedure(tenant, id);
  const mayEdit = mayEverywhere('procedures.edit', actor.grants);
  const versions = await versionsOf(tenant, id);
  return {
    id,
    code,
    retiredAt: retiredAt?.toISOString() ?? null,
    version,
    versions: versions
      .filter(({ publishedAt }) => mayEdit || publishedAt)
      .map((it) => ({ ...it, publishedAt: it.publishedAt?.toISOString() ?? null })),
    rules: await rulesUsing(tenant, id),
    mayEdit,
  };
}
