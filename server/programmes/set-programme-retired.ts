import { conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { authoriseProgramme } from './programme-policy';
import { findProgramme } from './programme-queries';
import { syncSchedules } from './sync-schedules';

/**
 * Retires a programme or takes it back into use; its schedules end or begin again at `now`.
 * @throws Problem 404; 403; 409 when somebody changed it meanwhile.
 */
export async function setProgrammeRetired(
  tenant: Tenant,
  actor: Actor,
  { id, version, retired, now }: { id: string; version: number; retired: boolean; now: Date },
): Promise<void> {
  const before = await findProgramme(tenant, id, { lock: true });
  await authoriseProgramme(tenant, actor, id);
  if (before.version !== version) throw conflict();
  await tenant.rows('UPDATE programmes SET retired_at = $2, version = version + 1 WHERE id = $1', [
    id,
    retired ? now : null,
  ]);
  const schedules = await syncSchedules(tenant, now, { programmeId: id });
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'programme',
    subjectId: id,
    action: retired ? 'programme-retired' : 'programme-restored',
    detail: { schedules },
  });
}
