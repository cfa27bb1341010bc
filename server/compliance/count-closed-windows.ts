import type { Tenant } from '@db/tenant-transaction';

/** How a closed window stands in the counts; the same rule as shared/compliance/window-end.ts. */
const counts = `
  count(*) FILTER (WHERE t.outcome = 'done' AND t.outcome_at < t.closes_at),
  count(*) FILTER (WHERE t.outcome = 'done' AND t.outcome_at >= t.closes_at),
  count(*) FILTER (WHERE t.outcome = 'none'),
  count(*) FILTER (WHERE t.outcome = 'excused'),
  count(*) FILTER (WHERE t.outcome = 'covered')`;

const insertCounts = `
  INSERT INTO compliance_days (organisation_id, store_id, rule_id, day, on_time, late, not_done,
    excused, covered)
  SELECT t.organisation_id, t.store_id, t.rule_id, t.closes_on, ${counts}`;

/**
 * Counts again, in the organisation, every day that was marked as changed and every day on which
 * windows may have closed since the last count, up to the instant `now`. Running it again changes
 * nothing, and a worker that was away for weeks catches up in one run.
 *
 * Counts of two workers never mix: they take turns. A mark that some transaction still holds (it may
 * be about to change a task of that day) stays for the next run.
 *
 * @returns how many marks were worked off
 */
export async function countClosedWindows(tenant: Tenant, now: Date): Promise<number> {
  await tenant.rows(`SELECT pg_advisory_xact_lock(hashtextextended('compliance ' || $1, 0))`, [
    tenant.organisationId,
  ]);
  const marks = await tenant.rows<{ store_id: string; day: string }>(
    `DELETE FROM stale_days d USING (
       SELECT store_id, day FROM stale_days ORDER BY day LIMIT 20000 FOR UPDATE SKIP LOCKED) free
     WHERE d.store_id = free.store_id AND d.day = free.day
     RETURNING d.store_id, d.day`,
  );
  await recount(tenant, marks, now);
  await countRecent(tenant, now);
  return marks.length;
}

async function recount(
  tenant: Tenant,
  marks: readonly { store_id: string; day: string }[],
  now: Date,
): Promise<void> {
  if (marks.length === 0) return;
  const days = [marks.map(({ store_id }) => store_id), marks.map(({ day }) => day)];
  await tenant.rows(
    `DELETE FROM compliance_days c USING unnest($1::uuid[], $2::date[]) AS d (store_id, day)
     WHERE c.store_id = d.store_id AND c.day = d.day`,
    days,
  );
  await tenant.rows(
    `${insertCounts}
     FROM unnest($1::uuid[], $2::date[]) AS d (store_id, day)
     JOIN tasks t ON t.store_id = d.store_id AND t.closes_on = d.day
     WHERE t.closes_at <= $3
     GROUP BY t.organisation_id, t.store_id, t.rule_id, t.closes_on`,
    [...days, now],
  );
}

/**
 * The days since the last one that has any count. Two days are taken again, because that one was not
 * over when it was counted, and at the other end of the map it was still the day before.
 */
async function countRecent(tenant: Tenant, now: Date): Promise<void> {
  const last = await tenant.row<{ from: string | null }>(
    'SELECT (max(day) - 2)::text AS "from" FROM compliance_days',
  );
  const from = last?.from ?? '0001-01-01';
  await tenant.rows('DELETE FROM compliance_days WHERE day >= $1', [from]);
  await tenant.rows(
    `${insertCounts}
     FROM stores s JOIN tasks t ON t.store_id = s.id AND t.closes_on >= $1
     WHERE t.closes_at <= $2
     GROUP BY t.organisation_id, t.store_id, t.rule_id, t.closes_on`,
    [from, now],
  );
}
