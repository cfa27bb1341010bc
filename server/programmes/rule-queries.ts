import type { RuleDefinition } from '@shared/programmes/rule-definition';
import { notFound } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';

export interface RuleRecord extends RuleDefinition {
  readonly id: string;
  readonly programmeId: string;
  readonly programmeName: string;
  readonly procedureTitle: { readonly en: string; readonly es: string };
  readonly revision: number;
  readonly retiredAt: Date | null;
  readonly version: number;
  readonly stores: number;
  readonly units: number;
}

const select = `
  SELECT r.id, r.programme_id AS "programmeId", p.name AS "programmeName",
    r.procedure_id AS "procedureId", title.title AS "procedureTitle", r.name, r.audience,
    r.applies_to AS "appliesTo", r.unit_kind AS "unitKind", r.pump_face AS "pumpFace", r.recurrence,
    r.time_window AS "window", r.horizon_days AS "horizonDays", r.rank, r.revision,
    r.retired_at AS "retiredAt", r.version, reach.stores, reach.units
  FROM rules r JOIN programmes p ON p.id = r.programme_id
  JOIN LATERAL (SELECT v.content -> 'title' AS title FROM procedure_versions v
    WHERE v.procedure_id = r.procedure_id ORDER BY v.published_at IS NULL, v.number DESC LIMIT 1) title
    ON true
  CROSS JOIN LATERAL (SELECT count(DISTINCT sc.store_id)::int AS stores,
      count(sc.unit_id)::int AS units
    FROM schedules sc WHERE sc.rule_id = r.id AND sc.ended_at IS NULL) reach`;

/** The rules of a programme; those in force first, the most frequent first among them. */
export function rulesOf(tenant: Tenant, programmeId: string): Promise<RuleRecord[]> {
  return tenant.rows<RuleRecord>(
    `${select} WHERE r.programme_id = $1 ORDER BY r.retired_at IS NOT NULL, r.rank, lower(r.name)`,
    [programmeId],
  );
}

/** @throws Problem 404 when the organisation has no such rule. */
export async function findRule(tenant: Tenant, id: string): Promise<RuleRecord> {
  const found = await tenant.row<RuleRecord>(`${select} WHERE r.id = $1`, [id]);
  if (!found) throw notFound('rule');
  return found;
}

/** Locks a rule and gives back its version. @throws Problem 404 */
export async function lockRule(
  tenant: Tenant,
  id: string,
): Promise<{ programmeId: string; version: number; revision: number }> {
  const found = await tenant.row<{ programmeId: string; version: number; revision: number }>(
    `SELECT programme_id AS "programmeId", version, revision FROM rules WHERE id = $1 FOR UPDATE`,
    [id],
  );
  if (!found) throw notFound('rule');
  return found;
}

/** What a rule said in each of its revisions, newest first. */
export function revisionsOf(tenant: Tenant, ruleId: string) {
  return tenant.rows<{
    revision: number;
    definition: RuleDefinition;
    madeAt: Date;
    madeBy: string | null;
  }>(
    `SELECT v.revision, v.definition, v.made_at AS "madeAt", p.name AS "madeBy"
     FROM rule_revisions v LEFT JOIN people p ON p.id = v.made_by
     WHERE v.rule_id = $1 ORDER BY v.revision DESC`,
    [ruleId],
  );
}
