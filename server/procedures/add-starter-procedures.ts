import { randomUUID } from 'node:crypto';
import { starterProcedures } from '@db/seeds/procedures/starter-procedures';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { authoriseEverywhere } from '../access/authorise';
import { createProcedure } from './create-procedure';
import { publishDraft } from './publish-draft';

/** Adds the starter procedures whose codes are not there yet, published; gives back how many. */
export async function addStarterProcedures(
  tenant: Tenant,
  actor: Actor,
  at: Date,
): Promise<number> {
  authoriseEverywhere(actor, 'procedures.edit');
  const there = await tenant.rows<{ code: string }>('SELECT code FROM procedures');
  const codes = new Set(there.map(({ code }) => code));
  const missing = starterProcedures.filter(({ code }) => !codes.has(code));
  for (const { code, content } of missing) {
    const id = randomUUID();
    await createProcedure(tenant, actor, { id, versionId: randomUUID(), code, content });
    await publishDraft(tenant, actor, { id, version: 0, at });
  }
  return missing.length;
}
