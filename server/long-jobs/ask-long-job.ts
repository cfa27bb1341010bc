import type { Tenant } from '@db/tenant-transaction';

/**
 * Asks for a long job, in the transaction that needs it done; a worker takes it up within seconds of
 * the commit.
 * @param kind one that `jobs/long-jobs/long-job-handlers.ts` knows
 */
export async function askLongJob(
  tenant: Tenant,
  job: {
    readonly id: string;
    readonly kind: string;
    readonly input: object;
    readonly askedBy: string;
  },
): Promise<void> {
  await tenant.rows(
    `INSERT INTO long_jobs (id, organisation_id, kind, input, asked_by) VALUES ($1, $2, $3, $4, $5)`,
    [job.id, tenant.organisationId, job.kind, JSON.stringify(job.input), job.askedBy],
  );
}
