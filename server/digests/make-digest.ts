import type { Month } from '@shared/compliance/month';
import type { DigestContent } from '@shared/digests/digest-content';
import type { Locale } from '@shared/mail/locale';
import type { Tenant } from '@db/tenant-transaction';
import { digestMessage } from '../mail/messages/digest-message';
import { queueLetter } from '../mail/queue-letter';
import { monthRates } from './month-rates';
import { monthWork } from './month-work';

interface Owner {
  readonly personId: string;
  readonly address: string;
  readonly locale: Locale;
}

/**
 * Writes the digest of one chain's month and a letter to each account owner of the chain, in one
 * transaction: both are kept or neither is. The pair of chain and month is unique, so that a second
 * asker, at once or later, makes nothing and writes to nobody.
 *
 * @param chain.at when it is made, for the record
 * @returns whether it was made now; false also where nothing happened that could be told
 */
export async function makeDigest(
  tenant: Tenant,
  chain: {
    readonly id: string;
    readonly name: string;
    readonly month: Month;
    readonly at: Date;
    readonly baseUrl: string;
  },
): Promise<boolean> {
  const content: DigestContent = {
    shape: 1,
    chainName: chain.name,
    month: chain.month,
    ...(await monthRates(tenant, chain.id, chain.month)),
    ...(await monthWork(tenant, chain.id, chain.month)),
  };
  if (!saysAnything(content)) return false;
  const digest = await tenant.row<{ id: string }>(
    `INSERT INTO digests (organisation_id, chain_id, month, content, made_at)
     VALUES ($1, $2, $3, $4, $5) ON CONFLICT (chain_id, month) DO NOTHING RETURNING id`,
    [tenant.organisationId, chain.id, `${chain.month}-01`, JSON.stringify(content), chain.at],
  );
  if (!digest) return false;
  for (const owner of await accountOwners(tenant, chain.id)) {
    await queueLetter(tenant, {
      message: digestMessage,
      content: { digestId: digest.id, digest: content, baseUrl: chain.baseUrl },
      to: owner,
      dedupeKey: `digest:${chain.id}:${chain.month}:${owner.personId}`,
      at: chain.at,
    });
  }
  return true;
}

function saysAnything({ counts, findings, repairs, overdue, stopped }: DigestContent): boolean {
  const windows = Object.values(counts).reduce((sum, count) => sum + count, 0);
  return windows + findings.count + repairs.count + overdue.count + stopped.length > 0;
}

function accountOwners(tenant: Tenant, chainId: string): Promise<Owner[]> {
  return tenant.rows<Owner>(
    `SELECT p.id AS "personId", p.email AS address, p.locale FROM people p
     WHERE p.disabled_at IS NULL AND p.email IS NOT NULL
       AND EXISTS (SELECT FROM role_grants g WHERE g.person_id = p.id AND g.role = 'account-owner'
         AND (g.scope_kind = 'organisation' OR (g.scope_kind = 'chain' AND g.scope_id = $1)))
     ORDER BY p.id`,
    [chainId],
  );
}
