import type { ReplyOf } from '@shared/contract/endpoint';
import type { readUnitLife } from '@shared/fleet/units-contract';
import { notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';

type Event = ReplyOf<typeof readUnitLife>['events'][number];

/** Noon of a day in the store's zone: a day without a time is drawn in its middle. */
const noon = (day: string) => `((${day} + time '12:00') AT TIME ZONE here.time_zone)`;

const serial = `CASE WHEN p.serial_number = '' THEN NULL
  ELSE jsonb_build_object('en', p.serial_number, 'es', p.serial_number) END`;

/**
 * What happened to a unit and its parts, newest first.
 * @throws Problem 404 when the unit does not exist or lies out of the actor's sight.
 */
export async function unitLife(
  tenant: Tenant,
  actor: Actor,
  unitId: string,
): Promise<ReplyOf<typeof readUnitLife>> {
  const binds = new Binds();
  const unit = await tenant.row<{ timeZone: string }>(
    `SELECT s.time_zone AS "timeZone" FROM units u JOIN stores s ON s.id = u.store_id
     WHERE u.id = ${binds.add(unitId)} AND ${visibleStores(actor, 'fleet.read', binds)}`,
    binds.values,
  );
  if (!unit) throw notFound('unit');
  const rows = await tenant.rows<Omit<Event, 'at'> & { at: Date }>(
    `WITH here AS (SELECT u.*, s.time_zone FROM units u JOIN stores s ON s.id = u.store_id
       WHERE u.id = $1)
     SELECT 'unit' AS id, 'installed' AS kind, ${noon('installed_on')} AS at,
       NULL AS "componentKind", NULL AS cause, NULL AS severity, NULL::jsonb AS what, '' AS note,
       NULL AS person, NULL::uuid AS "taskId", NULL::uuid AS "findingId"
     FROM here WHERE installed_on IS NOT NULL
     UNION ALL
     SELECT 'fitted ' || p.id,
       CASE WHEN old.id IS NULL THEN 'installed' ELSE 'replaced' END, ${noon('p.installed_on')},
       p.kind, old.removal_cause, NULL, ${serial}, '', NULL, NULL, NULL
     FROM components p CROSS JOIN here
     LEFT JOIN LATERAL (SELECT o.id, o.removal_cause FROM components o
       WHERE o.unit_id = p.unit_id AND o.kind = p.kind AND o.id <> p.id
         AND o.removed_on = p.installed_on ORDER BY o.id LIMIT 1) old ON true
     WHERE p.unit_id = $1
     UNION ALL
     SELECT 'inspected ' || i.id, 'inspected', i.finished_at, NULL, NULL, NULL,
       v.content -> 'title', i.note, who.name, i.task_id, NULL
     FROM inspections i JOIN procedure_versions v ON v.id = i.procedure_version_id
     JOIN people who ON who.id = i.person_id
     WHERE i.unit_id = $1 AND i.undone_at IS NULL
     UNION ALL
     SELECT 'found ' || f.id, 'found', f.found_at, f.component_kind, f.cause, f.severity, NULL,
       f.note, who.name, NULL, f.id
     FROM findings f JOIN people who ON who.id = f.found_by WHERE f.unit_id = $1
     UNION ALL
     SELECT 'repaired ' || m.id, CASE WHEN m.replaced = '{}' THEN 'repaired' ELSE 'replaced' END,
       m.done_at, m.replaced[1], m.cause, NULL, NULL, m.note, who.name, NULL, m.finding_id
     FROM repairs m JOIN people who ON who.id = m.done_by WHERE m.unit_id = $1
     ORDER BY at DESC, "componentKind", id`,
    [unitId],
  );
  return {
    events: rows.map((row) => ({ ...row, at: row.at.toISOString() })),
    timeZone: unit.timeZone,
  };
}
