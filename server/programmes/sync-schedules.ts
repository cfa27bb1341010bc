import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import { enrolledPlacesSql } from './enrolled-places-sql';

export interface SyncScope {
  /** Only this programme's rules. */
  readonly programmeId?: string;
  /** Only these stores and their units: after a change in the fleet, both sides of a move. */
  readonly storeIds?: readonly string[];
}

export interface SyncCount {
  readonly made: number;
  readonly changed: number;
  readonly ended: number;
}

/**
 * Makes `schedules` agree with rules × enrolments × live places: makes the missing, moves those whose
 * unit or dates changed, ends the rest, all in one statement. Does nothing when run again.
 *
 * A new schedule begins at the store's today at the earliest, so that no task is born missed. One
 * whose days or store changed has `generated_to` emptied: its tasks to come must be looked at again.
 *
 * @param now the instant that decides what "today" is, in each store's zone
 */
export async function syncSchedules(
  tenant: Tenant,
  now: Date,
  scope: SyncScope = {},
): Promise<SyncCount> {
  if (!scope.programmeId && !scope.storeIds) {
    // The whole organisation may have hundreds of thousands of schedules.
    await tenant.rows(`SELECT set_config('statement_timeout', '120000', true)`);
  }
  if (!scope.storeIds) {
    // The planner takes the sets below for a row or two each and would loop over thousands by
    // thousands, above all in a fleet that has just come in and was never analysed.
    await tenant.rows(`SELECT set_config('enable_nestloop', 'off', true)`);
  }
  await tenant.rows(`SELECT pg_advisory_xact_lock(hashtextextended($1, 0))`, [
    `schedules ${tenant.organisationId}`,
  ]);
  const binds = new Binds();
  const at = `${binds.add(now)}::timestamptz`;
  const organisation = `${binds.add(tenant.organisationId)}::uuid`;
  const programme = scope.programmeId && `${binds.add(scope.programmeId)}::uuid`;
  const stores = scope.storeIds && `${binds.add(scope.storeIds)}::uuid[]`;
  const counted = await tenant.row<SyncCount>(
    `WITH ${enrolledPlacesSql(programme ? `p.id = ${programme}` : 'true')},
     of_rules AS (
       SELECT r.id AS rule_id, d.store_id, NULL::uuid AS unit_id, d.days
       FROM rules r JOIN store_days d ON d.programme_id = r.programme_id
       WHERE r.retired_at IS NULL AND r.applies_to = 'store'
         AND EXISTS (SELECT FROM live_units u WHERE u.store_id = d.store_id
           AND (r.unit_kind IS NULL OR u.kind = r.unit_kind)
           AND (r.pump_face IS NULL OR u.pump_face = r.pump_face))
       UNION ALL
       SELECT r.id, u.store_id, u.id, d.days
       FROM rules r JOIN unit_days d ON d.programme_id = r.programme_id
       JOIN live_units u ON u.id = d.unit_id
       WHERE r.retired_at IS NULL AND r.applies_to = 'unit'
         AND (r.unit_kind IS NULL OR u.kind = r.unit_kind)
         AND (r.pump_face IS NULL OR u.pump_face = r.pump_face)
     ),
     wanted AS MATERIALIZED (
       SELECT o.rule_id, o.store_id, o.unit_id, coalesce(o.unit_id, o.store_id) AS place_id,
         lower(span.days) AS from_on, upper(span.days) - 1 AS until_on, today.today
       FROM of_rules o JOIN live_stores s ON s.id = o.store_id
       CROSS JOIN LATERAL (SELECT (${at} AT TIME ZONE s.time_zone)::date AS today) today
       CROSS JOIN LATERAL (
         SELECT days FROM unnest(o.days) AS of_all (days)
         WHERE upper_inf(days) OR upper(days) > today.today ORDER BY days LIMIT 1
       ) span
       WHERE ${stores ? `o.store_id = ANY(${stores})` : 'true'}
     ),
     standing AS MATERIALIZED (
       SELECT sc.id, sc.rule_id, coalesce(sc.unit_id, sc.store_id) AS place_id, sc.ended_at
       FROM schedules sc
       WHERE ${programme ? `sc.rule_id IN (SELECT id FROM rules WHERE programme_id = ${programme})` : 'true'}
         AND ${
           stores
             ? `(sc.store_id = ANY(${stores})
               OR sc.unit_id IN (SELECT id FROM units WHERE store_id = ANY(${stores})))`
             : 'true'
         }
     ),
     ended AS (
       UPDATE schedules sc SET ended_at = ${at} FROM standing st
       WHERE sc.id = st.id AND st.ended_at IS NULL AND NOT EXISTS (
         SELECT FROM wanted w WHERE w.rule_id = st.rule_id AND w.place_id = st.place_id)
       RETURNING 1
     ),
     compared AS (
       SELECT sc.id, w.store_id, w.until_on,
         CASE WHEN sc.ended_at IS NULL AND sc.from_on <= w.today AND w.from_on <= w.today
           THEN sc.from_on ELSE greatest(w.from_on, w.today) END AS from_on
       FROM wanted w JOIN schedules sc
         ON sc.rule_id = w.rule_id AND coalesce(sc.unit_id, sc.store_id) = w.place_id
     ),
     changed AS (
       UPDATE schedules sc
       SET store_id = c.store_id, from_on = c.from_on, until_on = c.until_on, ended_at = NULL,
         generated_to = NULL, generated_revision = NULL
       FROM compared c
       WHERE sc.id = c.id AND (sc.ended_at IS NOT NULL OR sc.store_id <> c.store_id
         OR sc.from_on <> c.from_on OR sc.until_on IS DISTINCT FROM c.until_on)
       RETURNING 1
     ),
     made AS (
       INSERT INTO schedules (organisation_id, rule_id, store_id, unit_id, from_on, until_on)
       SELECT ${organisation}, w.rule_id, w.store_id, w.unit_id, greatest(w.from_on, w.today),
         w.until_on
       FROM wanted w
       WHERE NOT EXISTS (SELECT FROM schedules sc
         WHERE sc.rule_id = w.rule_id AND coalesce(sc.unit_id, sc.store_id) = w.place_id)
       RETURNING 1
     )
     SELECT (SELECT count(*)::int FROM made) AS made, (SELECT count(*)::int FROM changed) AS changed,
       (SELECT count(*)::int FROM ended) AS ended`,
    binds.values,
  );
  if (!scope.storeIds) await tenant.rows(`SELECT set_config('enable_nestloop', 'on', true)`);
  return counted ?? { made: 0, changed: 0, ended: 0 };
}
