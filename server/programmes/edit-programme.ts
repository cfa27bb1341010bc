import { conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { nameTaken } from './name-taken';
import { authoriseProgramme } from './programme-policy';
import { findProgramme } from './programme-queries';

/**
 * Changes a programme's name and description.
 * @throws Problem 404; 403; 409 when somebody changed it meanwhile; 422 when the name is taken.
 */
export async function editProgramme(
  tenant: Tenant,
  actor: Actor,
  given: { id: string; version: number; name: string; description: string },
): Promise<void> {
  const before = await findProgramme(tenant, given.id, { lock: true });
  await authoriseProgramme(tenant, actor, given.id);
  if (before.version !== given.version) throw conflict();
  const taken = await tenant.row('SELECT id FROM programmes WHERE name = $1 AND id <> $2', [
    given.name,
    given.id,
  ]);
  if (taken) throw nameTaken();
  await tenant.rows(
    'UPDATE programmes SET name = $2, description = $3, version = version + 1 WHERE id = $1',
    [given.id, given.name, given.description],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'programme',
    subjectId: given.id,
    action: 'programme-edited',
    detail: { before: before.name, after: given.name },
  });
}
