import type { RuleDefinition } from '@shared/programmes/rule-definition';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { countRuleChanges, type RuleChangeCount } from '../tasks/count-rule-changes';
import { editRule } from './edit-rule';

/**
 * What an edit of a rule would do to its tasks. The edit is made and taken back, so it is refused for
 * the same reasons as the edit itself, and its schedules are the very ones that it would make.
 * @throws Problem 404; 403; 409 when somebody changed it meanwhile; 422 with what is wrong.
 */
export async function previewRuleEdit(
  tenant: Tenant,
  actor: Actor,
  edit: RuleDefinition & { id: string; version: number; now: Date },
): Promise<RuleChangeCount> {
  await tenant.rows('SAVEPOINT before_trial');
  try {
    await editRule(tenant, actor, edit);
    return await countRuleChanges(tenant, edit.id, edit.now);
  } finally {
    await tenant.rows('ROLLBACK TO SAVEPOINT before_trial');
  }
}
