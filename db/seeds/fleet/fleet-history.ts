import type { Tenant } from '@db/tenant-transaction';

/**
 * A number from 0 to 1 that hangs on what a task is and nothing else, so that the same fleet has the
 * same history whichever ids PostgreSQL gave.
 */
const chance = (salt: string) => `
  (('x' || substr(md5(s.number || coalesce(u.tag, '') || r.name || t.occurs_local || '${salt}'), 1, 7))
    ::bit(28)::int / 268435456.0)`;

/** Who does a task: of a store its manager, else one of the region's technicians. */
const hands = `
  CASE WHEN t.audience = 'store' THEN manager.id
    ELSE crew.ids[1 + floor(${chance('who')} * cardinality(crew.ids))::int] END`;

const places = `
  JOIN stores s ON s.id = t.store_id
  JOIN rules r ON r.id = t.rule_id
  LEFT JOIN units u ON u.id = t.unit_id
  JOIN (SELECT scope_id AS store_id, min(person_id::text)::uuid AS id FROM role_grants
    WHERE role = 'store-manager' GROUP BY 1) manager ON manager.store_id = t.store_id
  JOIN (SELECT scope_id AS region_id, array_agg(person_id ORDER BY person_id) AS ids FROM role_grants
    WHERE role = 'technician' GROUP BY 1) crew ON crew.region_id = s.region_id`;

/**
 * Lives through the tasks of a month that had opened by `now`: of those whose window closed nine in
 * ten were done in time, one in twenty-five late, one in fifty excused; of the open ones a third is done.
 *
 * @param month first day of the month, YYYY-MM-DD
 */
export async function liveThroughMonth(tenant: Tenant, month: string, now: Date): Promise<void> {
  await tenant.rows(
    `UPDATE tasks t SET
       outcome = CASE WHEN it.luck < 0.94 THEN 'done' ELSE 'excused' END,
       outcome_at = CASE WHEN it.luck < 0.9 OR it.luck >= 0.94
         THEN t.opens_at + (least(t.closes_at, $2) - t.opens_at) * it.moment
         ELSE t.closes_at + (least(t.lapses_at, $2, t.closes_at + interval '9 days') - t.closes_at)
           * it.moment END,
       outcome_by = it.who,
       outcome_reason = CASE WHEN it.luck < 0.94 THEN NULL ELSE 'Store closed' END,
       assigned_to = CASE WHEN t.audience = 'technician' THEN it.who END,
       version = 1
     FROM (SELECT t.id, t.occurs_local, ${chance('luck')} AS luck, ${chance('moment')} AS moment,
         ${hands} AS who
       FROM tasks t ${places}
       WHERE t.occurs_local >= $1::date AND t.occurs_local < $1::date + interval '1 month'
         AND t.opens_at < $2) it
     WHERE t.id = it.id AND t.occurs_local = it.occurs_local
       AND it.luck < CASE WHEN t.closes_at <= $2 THEN 0.96 ELSE 0.33 END`,
    [month, now],
  );
  await tenant.rows(
    `UPDATE tasks t SET assigned_to = it.who
     FROM (SELECT t.id, t.occurs_local, ${hands} AS who FROM tasks t ${places}
       WHERE t.occurs_local >= $1::date AND t.occurs_local < $1::date + interval '1 month'
         AND t.audience = 'technician' AND t.outcome = 'none' AND ${chance('planned')} < 0.7) it
     WHERE t.id = it.id AND t.occurs_local = it.occurs_local`,
    [month],
  );
  await tenant.rows(
    `INSERT INTO inspections (id, organisation_id, task_id, procedure_version_id, store_id, unit_id,
       person_id, started_at, finished_at)
     SELECT md5('inspection' || t.id)::uuid, t.organisation_id, t.id, v.id, t.store_id, t.unit_id,
       t.outcome_by, t.outcome_at - interval '12 minutes', t.outcome_at
     FROM tasks t
     JOIN (SELECT DISTINCT ON (procedure_id) procedure_id, id FROM procedure_versions
       WHERE published_at IS NOT NULL ORDER BY procedure_id, number DESC) v USING (procedure_id)
     WHERE t.occurs_local >= $1::date AND t.occurs_local < $1::date + interval '1 month'
       AND t.audience = 'technician' AND t.outcome = 'done'`,
    [month],
  );
  await tenant.rows(
    `INSERT INTO findings (id, organisation_id, store_id, unit_id, component_id, component_kind,
       inspection_id, cause, severity, note, found_at, found_by, settled_at, settled_by, settled_note)
     SELECT md5('finding' || i.id)::uuid, i.organisation_id, i.store_id, i.unit_id, c.id, c.kind, i.id,
       CASE c.kind WHEN 'pump' THEN 'worn-seal' ELSE 'bearing' END,
       CASE WHEN ${chance('stop')} < 0.2 THEN 'stop' ELSE 'plan' END, 'Seen at inspection',
       i.finished_at, i.person_id, settled.at, CASE WHEN settled.at IS NOT NULL THEN i.person_id END,
       CASE WHEN settled.at IS NOT NULL THEN 'Mended' END
     FROM tasks t ${places}
     JOIN inspections i ON i.task_id = t.id
     JOIN components c ON c.unit_id = i.unit_id AND c.removed_on IS NULL
       AND c.kind = CASE WHEN ${chance('part')} < 0.6 THEN 'pump' ELSE 'motor' END
     CROSS JOIN LATERAL (SELECT CASE WHEN ${chance('settled')} < 0.8
       THEN least(i.finished_at + interval '5 days', $2) END AS at) settled
     WHERE t.occurs_local >= $1::date AND t.occurs_local < $1::date + interval '1 month'
       AND ${chance('finding')} < 0.04`,
    [month, now],
  );
}
