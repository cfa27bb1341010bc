import type { ReplyOf } from '@shared/contract/endpoint';
import type { readLongJob } from '@shared/long-jobs/long-jobs-contract';
import { notFound } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';

export type LongJob = ReplyOf<typeof readLongJob>;

type Row = Omit<LongJob, 'createdAt' | 'finishedAt'> & { createdAt: Date; finishedAt: Date | null };

/** A long job that this person asked for. @throws Problem 404 for any other. */
export async function ownLongJob(tenant: Tenant, actor: Actor, id: string): Promise<LongJob> {
  const row = await tenant.row<Row>(
    `SELECT id, kind, state, done, total, error, created_at AS "createdAt",
       finished_at AS "finishedAt"
     FROM long_jobs WHERE id = $1 AND asked_by = $2`,
    [id, actor.personId],
  );
  if (!row) throw notFound('job');
  return {
    ...row,
    createdAt: row.createdAt.toISOString(),
    finishedAt: row.finishedAt?.toISOString() ?? null,
  };
}
