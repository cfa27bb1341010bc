import { conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { checkDefinition } from './check-definition';
import { authoriseProgramme } from './programme-policy';
import { findRule, lockRule } from './rule-queries';
import { syncSchedules } from './sync-schedules';

/**
 * Retires a rule or takes it back into use; its schedules end or begin again at `now`.
 * @throws Problem 404; 403; 409 when somebody changed it meanwhile; 422 when it may not come back.
 */
export async function setRuleRetired(
  tenant: Tenant,
  actor: Actor,
  { id, version, retired, now }: { id: string; version: number; retired: boolean; now: Date },
): Promise<void> {
  const { programmeId, version: found } = await lockRule(tenant, id);
  await authoriseProgramme(tenant, actor, programmeId);
  if (found !== version) throw conflict();
  if (!retired) await checkDefinition(tenant, await findRule(tenant, id));
  await tenant.rows('UPDATE rules SET retired_at = $2, version = version + 1 WHERE id = $1', [
    id,
    retired ? now : null,
  ]);
  const schedules = await syncSchedules(tenant, now, { programmeId });
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'rule',
    subjectId: id,
    action: retired ? 'rule-retired' : 'rule-restored',
    detail: { schedules },
  });
}
