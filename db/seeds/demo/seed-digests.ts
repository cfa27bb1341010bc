import { addToMonth, type Month, monthOf } from '@shared/compliance/month';
import type { Tenant } from '@db/tenant-transaction';
import { makeDigest } from '@server/digests/make-digest';
import { chains } from '../world/places';

/** Older months only: the latest is the worker's own, and goes out as mail. */
const OLDER_MONTHS = 3;

/**
 * The digests of some months back, made when they were due. Their letters count as sent then: nobody
 * wants last summer's mail today.
 */
export async function seedDigests(
  tenant: Tenant,
  chainIds: readonly string[],
  baseUrl: string,
  now: Date,
): Promise<void> {
  const present = monthOf(now.toISOString());
  for (let back = OLDER_MONTHS + 1; back > 1; back -= 1) {
    const month: Month = addToMonth(present, -back);
    const at = new Date(`${addToMonth(month, 1)}-01T13:00:00Z`);
    for (const [index, id] of chainIds.entries()) {
      await makeDigest(tenant, { id, name: chains[index] ?? '', month, at, baseUrl });
    }
  }
  await tenant.rows(
    `UPDATE letters l SET state = 'sent', attempts = 1, created_at = d.made_at, sent_at = d.made_at
     FROM digests d
     WHERE l.dedupe_key = concat_ws(':', 'digest', d.chain_id, to_char(d.month, 'YYYY-MM'), l.person_id)`,
  );
}
