/** From when on the day's letter may be queued, on the reader's own clock. */
export const REMIND_FROM = '06:30';

/**
 * SQL for (personId, taskId, kind …) that hold now (`$1`, an instant) and that the person has not been
 * told: tasks not done that are due soon, overdue, or that lapsed since the person's last letter, as
 * after an outage. Before a first letter, what has lapsed is history and is left out.
 *
 * Whom a task concerns: the technician it is assigned to; a store's manager, for what the store is to
 * do itself; a regional facility manager, for what is overdue in the region, for technicians' tasks
 * that were missed, and for those that come due with nobody assigned.
 *
 * @param people which people (alias `p`); SQL text of our own, never of a request
 */
export function untoldTasksSql(people: string): string {
  return `
    WITH reader AS (
      SELECT p.id, coalesce((SELECT max(l.created_at) FROM letters l
        WHERE l.person_id = p.id AND l.kind = 'reminders'), $1::timestamptz) AS told_at
      FROM people p
      WHERE ${people} AND p.disabled_at IS NULL AND p.email IS NOT NULL
        AND ($1::timestamptz AT TIME ZONE p.time_zone)::time >= '${REMIND_FROM}'
    ), live AS (
      SELECT t.id, t.store_id, t.unit_id, t.rule_id, t.procedure_id, t.audience, t.assigned_to,
        t.closes_at, t.lapses_at, s.chain_id, s.region_id,
        CASE WHEN $1::timestamptz < t.closes_at THEN 'due-soon'
          WHEN $1::timestamptz < t.lapses_at THEN 'overdue' ELSE 'missed' END AS kind
      FROM tasks t JOIN stores s ON s.id = t.store_id AND s.retired_at IS NULL
      WHERE t.outcome = 'none' AND t.due_soon_at <= $1::timestamptz
        AND t.lapses_at > (SELECT min(told_at) FROM reader)
    ), manages AS (
      SELECT r.id AS reader_id, g.role, g.scope_kind, g.scope_id
      FROM reader r JOIN role_grants g ON g.person_id = r.id
      WHERE g.role IN ('regional-facility-manager', 'store-manager')
    ), concerns AS (
      SELECT l.assigned_to AS reader_id, l.id AS task_id
      FROM live l WHERE l.audience = 'technician' AND l.assigned_to IS NOT NULL
      UNION
      SELECT m.reader_id, l.id FROM manages m JOIN live l ON
        (m.scope_kind = 'organisation' OR (m.scope_kind = 'chain' AND m.scope_id = l.chain_id)
          OR (m.scope_kind = 'region' AND m.scope_id = l.region_id)
          OR (m.scope_kind = 'store' AND m.scope_id = l.store_id))
        AND CASE m.role
          WHEN 'store-manager' THEN l.audience = 'store'
          ELSE l.kind = 'overdue' OR (l.audience = 'technician'
            AND (l.kind = 'missed' OR l.assigned_to IS NULL))
        END
    )
    SELECT r.id AS "personId", l.id AS "taskId", l.kind, l.closes_at AS "closesAt", l.store_id,
      l.unit_id, l.rule_id, l.procedure_id
    FROM concerns c
    JOIN reader r ON r.id = c.reader_id
    JOIN live l ON l.id = c.task_id AND l.lapses_at > r.told_at
    WHERE NOT EXISTS (SELECT FROM task_notices n WHERE n.person_id = r.id AND n.task_id = l.id
      AND n.kind = CASE l.kind WHEN 'due-soon' THEN 'due-soon' ELSE 'overdue' END)`;
}
