import type { Place } from '@shared/access/role';
import type { BodyOf } from '@shared/contract/endpoint';
import type { settleFinding as endpoint } from '@shared/findings/findings-contract';
import { conflict, invalid, notFound } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { authoriseAt } from '../access/authorise';
import { recordEvent } from '../audit/record-event';

type Settlement = BodyOf<typeof endpoint>;

interface Locked extends Place {
  id: string;
  version: number;
  unitId: string | null;
  settledAt: Date | null;
  localDay: string;
}

/**
 * Settles a finding. A repair that replaced components ends the old ones and installs new ones on
 * that day, local to the store, so that each component keeps a life of its own.
 * @throws Problem 409 when somebody changed or settled it meanwhile
 */
export async function settleFinding(
  tenant: Tenant,
  actor: Actor,
  id: string,
  settlement: Settlement,
  now: Date,
): Promise<void> {
  const finding = await lockFinding(tenant, id, now);
  authoriseAt(actor, 'findings.settle', finding);
  if (finding.version !== settlement.version || finding.settledAt) throw conflict();
  const { repair } = settlement;
  if (repair && !finding.unitId) {
    throw invalid([
      { field: 'repair', reason: 'no-unit', message: 'A repair needs a unit it was done on.' },
    ]);
  }
  if (repair) await recordRepair(tenant, actor, finding, repair, settlement.note, now);
  await tenant.rows(
    `UPDATE findings SET settled_at = $2, settled_by = $3, settled_note = $4, version = version + 1
     WHERE id = $1`,
    [id, now, actor.personId, settlement.note],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'finding',
    subjectId: id,
    action: repair ? 'repaired' : 'settled',
    detail: repair ? { replaced: repair.replaced, cause: repair.cause } : {},
  });
}

/**
 * Opens a settled finding again.
 * @throws Problem 409 when a repair was recorded: components were replaced, which no click undoes
 */
export async function reopenFinding(
  tenant: Tenant,
  actor: Actor,
  id: string,
  version: number,
  now: Date,
): Promise<void> {
  const finding = await lockFinding(tenant, id, now);
  authoriseAt(actor, 'findings.settle', finding);
  if (finding.version !== version || !finding.settledAt) throw conflict();
  const repair = await tenant.row('SELECT id FROM repairs WHERE finding_id = $1', [id]);
  if (repair) throw conflict('A repair stands behind this settlement.');
  await tenant.rows(
    `UPDATE findings SET settled_at = NULL, settled_by = NULL, settled_note = NULL,
       version = version + 1 WHERE id = $1`,
    [id],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'finding',
    subjectId: id,
    action: 'reopened',
  });
}

async function lockFinding(tenant: Tenant, id: string, now: Date): Promise<Locked> {
  const finding = await tenant.row<Locked>(
    `SELECT f.id, f.version, f.unit_id AS "unitId", f.settled_at AS "settledAt",
       s.id AS "storeId", s.chain_id AS "chainId", s.region_id AS "regionId",
       ($2::timestamptz AT TIME ZONE s.time_zone)::date AS "localDay"
     FROM findings f JOIN stores s ON s.id = f.store_id WHERE f.id = $1 FOR UPDATE OF f`,
    [id, now],
  );
  if (!finding) throw notFound('finding');
  return finding;
}

async function recordRepair(
  tenant: Tenant,
  actor: Actor,
  finding: Locked,
  repair: NonNullable<Settlement['repair']>,
  note: string,
  now: Date,
): Promise<void> {
  await tenant.rows(
    `INSERT INTO repairs (id, organisation_id, finding_id, unit_id, cause, replaced, minutes,
       parts_cents, labour_cents, note, done_at, done_by)
     VALUES ($1, $2, $3, $4, $5, $6::text[], $7, $8, $9, $10, $11, $12)`,
    [
      repair.id,
      tenant.organisationId,
      finding.id,
      finding.unitId,
      repair.cause,
      repair.replaced,
      repair.minutes,
      repair.partsCents,
      repair.labourCents,
      note,
      now,
      actor.personId,
    ],
  );
  // What is known of the old one (model, nameplate, face) holds for its like until someone corrects it.
  await tenant.rows(
    `WITH old AS (
       UPDATE components SET removed_on = greatest($3::date, installed_on), removal_cause = $4,
         version = version + 1
       WHERE unit_id = $1 AND kind = ANY($2::text[]) AND removed_on IS NULL
       RETURNING kind, model, nameplate, pump_face)
     INSERT INTO components (id, organisation_id, unit_id, kind, model, nameplate, pump_face,
       installed_on)
     SELECT gen_random_uuid(), $5, $1, kind, coalesce(old.model, ''), coalesce(old.nameplate, '{}'),
       old.pump_face, $3::date
     FROM unnest($2::text[]) AS kind LEFT JOIN old USING (kind)`,
    [finding.unitId, repair.replaced, finding.localDay, repair.cause, tenant.organisationId],
  );
}
