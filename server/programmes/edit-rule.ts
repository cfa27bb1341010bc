import type { RuleDefinition } from '@shared/programmes/rule-definition';
import { conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { checkDefinition } from './check-definition';
import { keepRevision } from './keep-revision';
import { nameTaken } from './name-taken';
import { authoriseProgramme } from './programme-policy';
import { lockRule } from './rule-queries';
import { syncSchedules } from './sync-schedules';

/**
 * Gives a rule a new revision. Tasks written ahead are brought in line by the worker; what was done
 * keeps the revision it was done under.
 * @throws Problem 404; 403; 409 when somebody changed it meanwhile; 422 with what is wrong.
 */
export async function editRule(
  tenant: Tenant,
  actor: Actor,
  { id, version, now, ...definition }: RuleDefinition & { id: string; version: number; now: Date },
): Promise<void> {
  const before = await lockRule(tenant, id);
  await authoriseProgramme(tenant, actor, before.programmeId);
  if (before.version !== version) throw conflict();
  await checkDefinition(tenant, definition);
  const taken = await tenant.row(
    'SELECT id FROM rules WHERE programme_id = $1 AND name = $2 AND id <> $3',
    [before.programmeId, definition.name, id],
  );
  if (taken) throw nameTaken();
  await tenant.rows(
    `UPDATE rules SET procedure_id = $2, name = $3, audience = $4, applies_to = $5, unit_kind = $6,
       pump_face = $7, recurrence = $8, time_window = $9, horizon_days = $10, rank = $11,
       revision = revision + 1, version = version + 1
     WHERE id = $1`,
    [
      id,
      definition.procedureId,
      definition.name,
      definition.audience,
      definition.appliesTo,
      definition.unitKind,
      definition.pumpFace,
      JSON.stringify(definition.recurrence),
      JSON.stringify(definition.window),
      definition.horizonDays,
      definition.rank,
    ],
  );
  const revision = before.revision + 1;
  await keepRevision(tenant, actor, { ruleId: id, revision, definition, at: now });
  const schedules = await syncSchedules(tenant, now, { programmeId: before.programmeId });
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'rule',
    subjectId: id,
    action: 'rule-edited',
    detail: { revision, schedules },
  });
}
