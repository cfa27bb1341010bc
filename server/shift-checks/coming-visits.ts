import type { ReplyOf } from '@shared/contract/endpoint';
import type { readShift } from '@shared/shift-checks/shift-checks-contract';
import type { Tenant } from '@db/tenant-transaction';

/** How far ahead a store looks. */
const DAYS = 14;

/** Who comes to a store in the next two weeks and for how long; local days of the store. */
export function comingVisits(
  tenant: Tenant,
  store: { readonly id: string; readonly timeZone: string },
  now: Date,
): Promise<ReplyOf<typeof readShift>['visits']> {
  return tenant.rows(
    `SELECT v.id, r.on_date AS "onDate", p.name AS technician, v.note,
       count(t.id)::int AS tasks, coalesce(sum((c.content ->> 'minutes')::int), 0)::int AS minutes
     FROM visits v
     JOIN routes r ON r.id = v.route_id
     JOIN people p ON p.id = r.technician_id
     LEFT JOIN tasks t ON t.visit_id = v.id AND t.outcome = 'none'
     LEFT JOIN LATERAL (
       SELECT content FROM procedure_versions
       WHERE procedure_id = t.procedure_id AND published_at IS NOT NULL
       ORDER BY number DESC LIMIT 1
     ) c ON true
     WHERE v.store_id = $1 AND r.published_at IS NOT NULL
       AND r.on_date >= ($2::timestamptz AT TIME ZONE $3)::date
       AND r.on_date < ($2::timestamptz AT TIME ZONE $3)::date + $4::int
     GROUP BY v.id, r.on_date, p.name, v.note ORDER BY r.on_date, p.name`,
    [store.id, now, store.timeZone, DAYS],
  );
}
