import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { DueSchedule } from './due-schedules';
import type { GenerationCount } from './generate-tasks';
import type { TimedOccurrence } from './task-timetable';
import { wantedTables } from './wanted-tables-sql';

/**
 * Nobody has done anything with it and nobody relies on it: not open yet, not decided or deferred,
 * not on a route that a technician was given. The bound on `occurs_local` only spares old partitions.
 */
export const untouched = (now: string) => `
  t.outcome = 'none' AND t.opens_at > ${now} AND t.deferred_from IS NULL
  AND t.occurs_local > (${now} AT TIME ZONE 'UTC') - interval '2 days'
  AND NOT EXISTS (SELECT FROM visits v JOIN routes ro ON ro.id = v.route_id
    WHERE v.id = t.visit_id AND ro.published_at IS NOT NULL)`;

/**
 * Makes the tasks of locked schedules agree with the occurrences they want: takes back untouched ones
 * that no longer belong, moves untouched ones whose times or place changed, and adds the missing.
 * Set-based: occurrences travel once per rule and zone, and PostgreSQL multiplies them by schedules.
 */
export async function bringInLine(
  tenant: Tenant,
  batch: readonly DueSchedule[],
  occurrences: readonly TimedOccurrence[],
  now: Date,
): Promise<GenerationCount> {
  const changed = batch.filter((schedule) => schedule.changed);
  const withdrawn = changed.length === 0 ? 0 : await withdraw(tenant, changed, occurrences, now);
  const moved = changed.length === 0 ? 0 : await move(tenant, changed, occurrences, now);
  return { withdrawn, moved, added: await add(tenant, batch, occurrences) };
}

async function withdraw(
  tenant: Tenant,
  batch: readonly DueSchedule[],
  occurrences: readonly TimedOccurrence[],
  now: Date,
): Promise<number> {
  const binds = new Binds();
  const tables = wantedTables(binds, batch, occurrences);
  const at = `${binds.add(now)}::timestamptz`;
  return countOf(
    tenant,
    `WITH ${tables}, gone AS (
       DELETE FROM tasks t USING batch b
       WHERE t.schedule_id = b.id AND ${untouched(at)} AND NOT EXISTS (
         SELECT FROM occurrences o WHERE o.key = b.key AND o.local = t.occurs_local
           AND o.local >= b.from_local AND o.local < b.to_local)
       RETURNING 1)
     SELECT count(*)::int AS count FROM gone`,
    binds,
  );
}

async function move(
  tenant: Tenant,
  batch: readonly DueSchedule[],
  occurrences: readonly TimedOccurrence[],
  now: Date,
): Promise<number> {
  const binds = new Binds();
  const tables = wantedTables(binds, batch, occurrences);
  const at = `${binds.add(now)}::timestamptz`;
  const columns = [
    ['rule_revision', 'b.revision'],
    ['procedure_id', 'b.procedure_id'],
    ['audience', 'b.audience'],
    ['store_id', 'b.store_id'],
    ['unit_id', 'b.unit_id'],
    ['time_zone', 'b.time_zone'],
    ['due_on', 'o.due_on'],
    ['opens_at', 'o.opens_at'],
    ['due_soon_at', 'o.due_soon_at'],
    ['due_at', 'o.due_at'],
    ['closes_at', 'o.closes_at'],
    ['lapses_at', 'o.lapses_at'],
    ['closes_on', 'o.closes_on'],
  ] as const;
  return countOf(
    tenant,
    `WITH ${tables}, moved AS (
       UPDATE tasks t SET ${columns.map(([name, value]) => `${name} = ${value}`).join(', ')},
         version = t.version + 1
       FROM batch b JOIN occurrences o ON o.key = b.key AND o.local >= b.from_local AND o.local < b.to_local
       WHERE t.schedule_id = b.id AND t.occurs_local = o.local AND ${untouched(at)}
         AND (${columns.map(([name]) => `t.${name}`).join(', ')})
           IS DISTINCT FROM (${columns.map(([, value]) => value).join(', ')})
       RETURNING 1)
     SELECT count(*)::int AS count FROM moved`,
    binds,
  );
}

async function add(
  tenant: Tenant,
  batch: readonly DueSchedule[],
  occurrences: readonly TimedOccurrence[],
): Promise<number> {
  if (occurrences.length === 0) return 0;
  const binds = new Binds();
  const tables = wantedTables(binds, batch, occurrences);
  const organisation = `${binds.add(tenant.organisationId)}::uuid`;
  return countOf(
    tenant,
    `WITH ${tables}, added AS (
       INSERT INTO tasks (organisation_id, schedule_id, rule_id, rule_revision, procedure_id,
         store_id, unit_id, audience, time_zone, occurs_local, due_on, opens_at, due_soon_at, due_at,
         closes_at, lapses_at, closes_on)
       SELECT ${organisation}, b.id, b.rule_id, b.revision, b.procedure_id, b.store_id, b.unit_id,
         b.audience, b.time_zone, o.local, o.due_on, o.opens_at, o.due_soon_at, o.due_at, o.closes_at,
         o.lapses_at, o.closes_on
       FROM batch b JOIN occurrences o
         ON o.key = b.key AND o.local >= b.from_local AND o.local < b.to_local
       ON CONFLICT (schedule_id, occurs_local) DO NOTHING
       RETURNING 1)
     SELECT count(*)::int AS count FROM added`,
    binds,
  );
}

async function countOf(tenant: Tenant, sql: string, binds: Binds): Promise<number> {
  return (await tenant.row<{ count: number }>(sql, binds.values))?.count ?? 0;
}
