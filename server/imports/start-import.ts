import { randomUUID } from 'node:crypto';
import type { ImportMode } from '@shared/imports/imports-contract';
import { Problem } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { askLongJob } from '../long-jobs/ask-long-job';
import { editableImport } from './editable-import';

/**
 * Asks for the rows of a checked file to be taken in. One import runs at a time in an organisation.
 * @throws Problem 404; 409 when it is not checked, has nothing to take in, or may not be so
 */
export async function startImport(
  tenant: Tenant,
  actor: Actor,
  {
    id,
    version,
    mode,
  }: { readonly id: string; readonly version: number; readonly mode: ImportMode },
): Promise<void> {
  const record = await editableImport(tenant, actor, { id, version });
  const { checked } = record;
  if (!checked || record.jobKind !== 'import-check' || record.jobState !== 'finished') {
    throw new Problem(409, 'not-checked', 'Have the rows looked at first.');
  }
  if (checked.goodRows === 0) {
    throw new Problem(409, 'no-good-rows', 'No row is without a problem.');
  }
  if (mode === 'all-or-nothing' && checked.badRows > 0) {
    throw new Problem(
      409,
      'rows-at-fault',
      'Some rows have problems. Correct the file, or take in only the good rows.',
    );
  }
  await requireFree(tenant);
  const jobId = randomUUID();
  await askLongJob(tenant, {
    id: jobId,
    kind: 'import-rows',
    input: { importId: id },
    askedBy: actor.personId,
  });
  await tenant.rows(
    'UPDATE imports SET mode = $2, job_id = $3, version = version + 1 WHERE id = $1',
    [id, mode, jobId],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'import',
    subjectId: id,
    action: 'import-started',
    detail: { mode },
  });
}

async function requireFree(tenant: Tenant): Promise<void> {
  await tenant.rows('SELECT pg_advisory_xact_lock(hashtextextended($1, 0))', [
    `imports ${tenant.organisationId}`,
  ]);
  const other = await tenant.row(
    `SELECT id FROM long_jobs WHERE kind = 'import-rows' AND state IN ('waiting', 'running')`,
  );
  if (other) {
    throw new Problem(
      409,
      'other-import-running',
      'Another import is running. Wait until it is done.',
    );
  }
}
