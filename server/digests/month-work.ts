import { addToMonth, type Month } from '@shared/compliance/month';
import type { DigestContent } from '@shared/digests/digest-content';
import type { Tenant } from '@db/tenant-transaction';

type Work = Pick<DigestContent, 'overdue' | 'findings' | 'repairs' | 'stopped'>;

/** The instant at which a month, given by its first day, is over at the store. */
const monthEnd = `($3::date::timestamp AT TIME ZONE s.time_zone)`;
const monthStart = `($2::date::timestamp AT TIME ZONE s.time_zone)`;

/**
 * What stood open and what was found and repaired in a chain's month, each store's month by its own
 * clock. Everything is asked as of the month's end, so that a digest made days later says the same.
 */
export async function monthWork(tenant: Tenant, chainId: string, month: Month): Promise<Work> {
  const values = [chainId, `${month}-01`, `${addToMonth(month, 1)}-01`];
  return {
    overdue: await overdueAtEnd(tenant, values),
    findings: await findingsByCause(tenant, values),
    repairs: await repairsOf(tenant, values),
    stopped: await stoppedAtEnd(tenant, values),
  };
}

async function overdueAtEnd(tenant: Tenant, values: unknown[]): Promise<Work['overdue']> {
  const [chainId, , end] = values;
  // A window closed some months ago may still be overdue where a rule lets it be done late for long.
  const stores = await tenant.rows<Work['overdue']['stores'][number]>(
    `SELECT s.id AS "storeId", s.number, s.name, count(*)::int AS count,
       min(t.closes_on)::text AS "oldestClosedOn"
     FROM stores s JOIN tasks t ON t.store_id = s.id
     WHERE s.chain_id = $1
       AND t.closes_at <= ($2::date::timestamp AT TIME ZONE s.time_zone)
       AND t.lapses_at > ($2::date::timestamp AT TIME ZONE s.time_zone)
       AND (t.outcome = 'none' OR t.outcome_at >= ($2::date::timestamp AT TIME ZONE s.time_zone))
     GROUP BY s.id, s.number, s.name
     ORDER BY count(*) DESC, min(t.closes_on), s.number, s.id`,
    [chainId, end],
  );
  return { count: stores.reduce((sum, { count }) => sum + count, 0), stores };
}

async function findingsByCause(tenant: Tenant, values: unknown[]): Promise<Work['findings']> {
  const byCause = await tenant.rows<Work['findings']['byCause'][number]>(
    `SELECT f.cause, count(*)::int AS count,
       count(*) FILTER (WHERE f.severity = 'stop')::int AS stop,
       count(*) FILTER (WHERE f.settled_at IS NULL OR f.settled_at >= ${monthEnd})::int AS unsettled
     FROM findings f JOIN stores s ON s.id = f.store_id
     WHERE s.chain_id = $1 AND f.found_at >= ${monthStart} AND f.found_at < ${monthEnd}
     GROUP BY f.cause ORDER BY count(*) DESC, f.cause`,
    values,
  );
  return {
    count: byCause.reduce((sum, { count }) => sum + count, 0),
    unsettled: byCause.reduce((sum, { unsettled }) => sum + unsettled, 0),
    byCause,
  };
}

async function repairsOf(tenant: Tenant, values: unknown[]): Promise<Work['repairs']> {
  const row = await tenant.row<Work['repairs']>(
    `SELECT count(*)::int AS count, coalesce(sum(p.parts_cents), 0)::float AS "partsCents",
       coalesce(sum(p.labour_cents), 0)::float AS "labourCents"
     FROM repairs p JOIN units u ON u.id = p.unit_id JOIN stores s ON s.id = u.store_id
     WHERE s.chain_id = $1 AND p.done_at >= ${monthStart} AND p.done_at < ${monthEnd}`,
    values,
  );
  return row ?? { count: 0, partsCents: 0, labourCents: 0 };
}

function stoppedAtEnd(tenant: Tenant, values: unknown[]): Promise<Work['stopped']> {
  const [chainId, , end] = values;
  return tenant.rows<Work['stopped'][number]>(
    `SELECT s.id AS "storeId", s.number, s.name, f.id AS "findingId", u.tag AS "unitTag", f.cause,
       (f.found_at AT TIME ZONE s.time_zone)::date::text AS "foundOn"
     FROM findings f JOIN stores s ON s.id = f.store_id LEFT JOIN units u ON u.id = f.unit_id
     WHERE s.chain_id = $1 AND f.severity = 'stop'
       AND f.found_at < ($2::date::timestamp AT TIME ZONE s.time_zone)
       AND (f.settled_at IS NULL OR f.settled_at >= ($2::date::timestamp AT TIME ZONE s.time_zone))
     ORDER BY f.found_at, f.id`,
    [chainId, end],
  );
}
