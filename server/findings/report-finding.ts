import type { BodyOf } from '@shared/contract/endpoint';
import type { reportFinding as endpoint } from '@shared/findings/findings-contract';
import { invalid, notFound } from '@shared/problem';
import type { Place } from '@shared/access/role';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { authoriseAt } from '../access/authorise';
import { recordEvent } from '../audit/record-event';
import { photoFaults } from '../uploads/photo-faults';

/** Writes down what somebody saw outside an inspection. */
export async function reportFinding(
  tenant: Tenant,
  actor: Actor,
  report: BodyOf<typeof endpoint>,
  now: Date,
): Promise<void> {
  const place = await tenant.row<Place>(
    `SELECT id AS "storeId", chain_id AS "chainId", region_id AS "regionId" FROM stores WHERE id = $1`,
    [report.storeId],
  );
  if (!place) throw notFound('store');
  authoriseAt(actor, 'findings.report', place);
  if (report.unitId) {
    const unit = await tenant.row('SELECT id FROM units WHERE id = $1 AND store_id = $2', [
      report.unitId,
      report.storeId,
    ]);
    if (!unit) {
      throw invalid([
        { field: 'unitId', reason: 'unknown', message: 'This unit is not in this store.' },
      ]);
    }
  }
  const faults = await photoFaults(
    tenant,
    report.storeId,
    new Map(report.photoIds.map((id, index) => [id, `photoIds.${index}`])),
  );
  if (faults.length > 0) throw invalid(faults);
  await tenant.rows(
    `INSERT INTO findings (id, organisation_id, store_id, unit_id, component_id, component_kind, cause,
       severity, note, photo_ids, found_at, found_by)
     VALUES ($1, $2, $3, $4,
       (SELECT c.id FROM components c WHERE c.unit_id = $4 AND c.kind = $5 AND c.removed_on IS NULL
        ORDER BY c.installed_on DESC LIMIT 1),
       $5, $6, $7, $8, $9::uuid[], $10, $11)`,
    [
      report.id,
      tenant.organisationId,
      report.storeId,
      report.unitId,
      report.componentKind,
      report.cause,
      report.severity,
      report.note,
      report.photoIds,
      now,
      actor.personId,
    ],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'finding',
    subjectId: report.id,
    action: 'reported',
  });
}
