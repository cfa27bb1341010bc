import type { RuleDefinition } from '@shared/programmes/rule-definition';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';

/** Keeps what a rule says under a revision, for good: history names the revision a task followed. */
export async function keepRevision(
  tenant: Tenant,
  actor: Actor,
  given: { ruleId: string; revision: number; definition: RuleDefinition; at: Date },
): Promise<void> {
  await tenant.rows(
    `INSERT INTO rule_revisions (organisation_id, rule_id, revision, definition, made_by, made_at)
     VALUES ($1, $2, $3, $4, $5, $6)`,
    [
      tenant.organisationId,
      given.ruleId,
      given.revision,
      JSON.stringify(given.definition),
      actor.personId,
      given.at,
    ],
  );
}
