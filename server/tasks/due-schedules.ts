import type { Audience, RuleDefinition } from '@shared/programmes/rule-definition';
import type { Tenant } from '@db/tenant-transaction';

/** A schedule with tasks to write or to take back, as its batch needs it. Local times are text. */
export interface DueSchedule {
  readonly id: string;
  readonly ruleId: string;
  readonly revision: number;
  readonly recurrence: RuleDefinition['recurrence'];
  readonly window: RuleDefinition['window'];
  readonly procedureId: string;
  readonly audience: Audience;
  readonly storeId: string;
  readonly unitId: string | null;
  readonly timeZone: string;
  readonly ended: boolean;
  /** Tasks written before may no longer be right; otherwise only new ones are added. */
  readonly changed: boolean;
  /** Occurrences from here on are wanted … */
  readonly fromLocal: string;
  /** … to here, exclusive: the horizon, or the end of the enrolment if that is sooner. */
  readonly toLocal: string;
  /** Midnight after the last day of the rule's horizon. */
  readonly horizon: string;
}

const from = `
  FROM schedules sc JOIN rules r ON r.id = sc.rule_id JOIN stores s ON s.id = sc.store_id
  CROSS JOIN LATERAL (SELECT date_trunc('day', $1::timestamptz AT TIME ZONE s.time_zone)
    + make_interval(days => r.horizon_days + 1) AS horizon) ahead`;

/** What makes a schedule due: beyond its bookmark, of another revision, or ended with tasks ahead. */
const due = `
  CASE WHEN sc.ended_at IS NOT NULL THEN sc.generated_to IS NOT NULL
    ELSE sc.generated_to IS NULL OR sc.generated_to < ahead.horizon
      OR sc.generated_revision IS DISTINCT FROM r.revision END`;

/**
 * A new revision counts from the moment it was made: what lay before it was owed under the old one and
 * is written. Where nothing was written yet, the whole day of the edit still counts, or an edit that
 * comes just before the first tasks would leave a hole on that day.
 */
const start = `
  CASE WHEN sc.generated_to IS NOT NULL AND sc.generated_revision = r.revision THEN sc.generated_to
    ELSE greatest(sc.from_on::timestamp, (
      SELECT CASE
        WHEN sc.generated_to IS NULL AND NOT EXISTS (SELECT FROM tasks t WHERE t.schedule_id = sc.id)
        THEN date_trunc('day', v.made_at AT TIME ZONE s.time_zone)
        ELSE v.made_at AT TIME ZONE s.time_zone END
      FROM rule_revisions v
      WHERE v.rule_id = r.id AND v.revision = r.revision AND v.revision > 1)) END`;

/** Schedules that are due, those of one rule together, so that a batch expands few rules. */
export async function dueScheduleIds(tenant: Tenant, now: Date): Promise<string[]> {
  const rows = await tenant.rows<{ id: string }>(
    `SELECT sc.id ${from} WHERE ${due} ORDER BY sc.rule_id, sc.id`,
    [now],
  );
  return rows.map(({ id }) => id);
}

const columns = `
  sc.id, sc.rule_id AS "ruleId", r.revision, r.recurrence, r.time_window AS "window",
  r.procedure_id AS "procedureId", r.audience, sc.store_id AS "storeId",
  sc.unit_id AS "unitId", s.time_zone AS "timeZone", sc.ended_at IS NOT NULL AS ended,
  (sc.generated_to IS NULL OR sc.generated_revision IS DISTINCT FROM r.revision
    OR sc.ended_at IS NOT NULL) AS changed,
  ${start} AS "fromLocal",
  least(ahead.horizon, sc.until_on + interval '1 day') AS "toLocal", ahead.horizon`;

/** Locks those of the given schedules that are still due and that no other worker holds. */
export function lockDueSchedules(
  tenant: Tenant,
  ids: readonly string[],
  now: Date,
): Promise<DueSchedule[]> {
  return tenant.rows<DueSchedule>(
    `SELECT ${columns} ${from} WHERE sc.id = ANY($2::uuid[]) AND ${due} FOR UPDATE OF sc SKIP LOCKED`,
    [now, ids],
  );
}

/** All due schedules of one rule, whoever holds them: for looking at, not for writing. */
export function dueSchedulesOf(tenant: Tenant, ruleId: string, now: Date): Promise<DueSchedule[]> {
  return tenant.rows<DueSchedule>(`SELECT ${columns} ${from} WHERE sc.rule_id = $2 AND ${due}`, [
    now,
    ruleId,
  ]);
}

/** The first and last month in which due schedules may have tasks; undefined when none is due. */
export async function monthsNeeded(
  tenant: Tenant,
  now: Date,
): Promise<{ from: string; to: string } | undefined> {
  const row = await tenant.row<{ from: string | null; to: string | null }>(
    `SELECT min(${start})::date::text AS "from", max(ahead.horizon)::date::text AS "to"
     ${from} WHERE sc.ended_at IS NULL AND ${due}`,
    [now],
  );
  return row?.from && row.to ? { from: row.from, to: row.to } : undefined;
}
