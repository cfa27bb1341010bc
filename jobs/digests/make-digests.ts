import { QueryTypes, type Sequelize } from 'sequelize';
import type { Logger } from 'pino';
import { countClosedWindows } from '@server/compliance/count-closed-windows';
import type { Config } from '@server/config';
import { makeDigest } from '@server/digests/make-digest';
import { lastDayOf, type Month } from '@shared/compliance/month';
import { monthsToDigest } from '@shared/digests/months-to-digest';
import { inTenant, type Tenant } from '@db/tenant-transaction';

export interface DigestServices {
  readonly sequelize: Sequelize;
  readonly config: Pick<Config, 'BASE_URL'>;
  readonly log: Pick<Logger, 'info' | 'error'>;
}

/** On the first of the month digests are made from this time on, on the organisation's clock. */
export const DIGEST_FROM = '06:00';

interface Chain {
  readonly id: string;
  readonly name: string;
  /** The month of the chain's latest digest. */
  readonly last: Month | null;
  /** The month it is now, by the organisation's clock less the hours until {@link DIGEST_FROM}. */
  readonly present: Month;
}

/**
 * Makes the digests that are due at `slot`: of each chain, every month that is over and has none yet.
 * What is due hangs on the digests there are, not on the day the job runs, so a first of the month
 * without a worker delays the digest and skips nobody; several workers at once make each one once.
 *
 * @returns how many were made
 */
export async function makeDigests(services: DigestServices, slot: Date): Promise<number> {
  const { sequelize, log } = services;
  const organisations = await sequelize.query<{ id: string }>(
    'SELECT id FROM all_organisations()',
    {
      type: QueryTypes.SELECT,
    },
  );
  let made = 0;
  for (const { id: organisationId } of organisations) {
    const chains = await inTenant(sequelize, organisationId, (tenant) => chainsIn(tenant, slot));
    const due = chains.filter(({ last, present }) => monthsToDigest(last, present).length > 0);
    if (due.length === 0) continue;
    try {
      await inTenant(sequelize, organisationId, (tenant) => countClosedWindows(tenant, slot));
      for (const chain of due) made += await digestChain(services, organisationId, chain, slot);
    } catch (error) {
      // One organisation's trouble must not keep the others waiting; the next slot tries again.
      log.error({ err: error, organisation: organisationId }, 'digests not made');
    }
  }
  if (made > 0) log.info({ made }, 'digests made');
  return made;
}

function chainsIn(tenant: Tenant, slot: Date): Promise<Chain[]> {
  return tenant.rows<Chain>(
    `SELECT c.id, c.name, to_char((SELECT max(d.month) FROM digests d WHERE d.chain_id = c.id),
         'YYYY-MM') AS last,
       to_char(($1::timestamptz AT TIME ZONE o.time_zone) - $2::interval, 'YYYY-MM') AS present
     FROM chains c JOIN organisations o ON o.id = c.organisation_id
     WHERE c.retired_at IS NULL ORDER BY c.name, c.id`,
    [slot, DIGEST_FROM],
  );
}

/** Makes what the chain wants, oldest month first: one that cannot be made yet holds up the later. */
async function digestChain(
  { sequelize, config }: DigestServices,
  organisationId: string,
  chain: Chain,
  slot: Date,
): Promise<number> {
  let made = 0;
  for (const month of monthsToDigest(chain.last, chain.present)) {
    const came = await inTenant(sequelize, organisationId, async (tenant) => {
      await tenant.rows(`SELECT pg_advisory_xact_lock(hashtextextended('digest ' || $1, 0))`, [
        chain.id,
      ]);
      if (!(await isSettled(tenant, chain.id, month, slot))) return 'waits';
      const { id, name } = chain;
      return makeDigest(tenant, { id, name, month, at: slot, baseUrl: config.BASE_URL });
    });
    if (came === 'waits') break;
    if (came) made += 1;
  }
  return made;
}

/**
 * Whether the month's figures can be frozen: it is over at every store of the chain, also at those
 * to the west of the organisation, and no day of it waits to be counted again.
 */
async function isSettled(
  tenant: Tenant,
  chainId: string,
  month: Month,
  slot: Date,
): Promise<boolean> {
  const row = await tenant.row<{ settled: boolean }>(
    `SELECT NOT EXISTS (SELECT FROM stores s WHERE s.chain_id = $1 AND s.retired_at IS NULL
         AND ($3::timestamptz AT TIME ZONE s.time_zone)::date <= $2::date)
       AND NOT EXISTS (SELECT FROM stale_days w JOIN stores s ON s.id = w.store_id
         WHERE s.chain_id = $1 AND w.day <= $2::date) AS settled`,
    [chainId, lastDayOf(month), slot],
  );
  return row?.settled ?? false;
}
