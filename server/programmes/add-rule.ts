import type { RuleDefinition } from '@shared/programmes/rule-definition';
import { conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { checkDefinition } from './check-definition';
import { nameTaken } from './name-taken';
import { authoriseProgramme } from './programme-policy';
import { findProgramme } from './programme-queries';
import { keepRevision } from './keep-revision';
import { syncSchedules } from './sync-schedules';

/**
 * Adds a rule to a programme and makes its schedules.
 * @throws Problem 404; 403; 422 with what is wrong with the definition; 409 when the id is taken.
 */
export async function addRule(
  tenant: Tenant,
  actor: Actor,
  {
    id,
    programmeId,
    now,
    ...definition
  }: RuleDefinition & {
    id: string;
    programmeId: string;
    now: Date;
  },
): Promise<void> {
  await findProgramme(tenant, programmeId, { lock: true });
  await authoriseProgramme(tenant, actor, programmeId);
  await checkDefinition(tenant, definition);
  const made = await tenant.row(
    `INSERT INTO rules (id, organisation_id, programme_id, procedure_id, name, audience, applies_to,
       unit_kind, pump_face, recurrence, time_window, horizon_days, rank)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12, $13)
     ON CONFLICT DO NOTHING RETURNING id`,
    [
      id,
      tenant.organisationId,
      programmeId,
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
  if (!made) {
    const taken = await tenant.row('SELECT id FROM rules WHERE programme_id = $1 AND name = $2', [
      programmeId,
      definition.name,
    ]);
    throw taken ? nameTaken() : conflict();
  }
  await keepRevision(tenant, actor, { ruleId: id, revision: 1, definition, at: now });
  const schedules = await syncSchedules(tenant, now, { programmeId });
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'rule',
    subjectId: id,
    action: 'rule-added',
    detail: { programmeId, name: definition.name, schedules },
  });
}
