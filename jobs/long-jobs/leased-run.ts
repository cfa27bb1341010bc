import { type Tenant, inTenant } from '@db/tenant-transaction';
import {
  LeaseLost,
  type LongJobRun,
  type LongJobServices,
  type Progress,
} from '@server/long-jobs/long-job';

/** A row of `long_jobs` as it was claimed. */
export interface ClaimedJob {
  readonly id: string;
  readonly organisation_id: string;
  readonly kind: string;
  readonly input: unknown;
  readonly done: number;
  readonly total: number | null;
  readonly result: object | null;
  /** Grows with each claim: whoever writes must still hold this number. */
  readonly attempts: number;
  readonly asked_by: string;
}

/** The try that a worker makes at a claimed job. */
export class LeasedRun implements LongJobRun {
  readonly id: string;
  readonly organisationId: string;
  readonly askedBy: string;
  readonly input: unknown;
  readonly reached: LongJobRun['reached'];
  private finished = false;

  constructor(
    private readonly services: LongJobServices,
    private readonly job: ClaimedJob,
    private readonly leaseSeconds: number,
  ) {
    this.id = job.id;
    this.organisationId = job.organisation_id;
    this.askedBy = job.asked_by;
    this.input = job.input;
    this.reached = { done: job.done, total: job.total, result: job.result };
  }

  get isFinished(): boolean {
    return this.finished;
  }

  inTenant<T>(work: (tenant: Tenant) => Promise<T>): Promise<T> {
    return inTenant(this.services.sequelize, this.organisationId, work);
  }

  show({ done, total }: Progress): Promise<void> {
    return this.inTenant((tenant) => this.write(tenant, 'done = $3, total = $4', [done, total]));
  }

  keep(tenant: Tenant, { done, total }: Progress, result: object): Promise<void> {
    return this.write(tenant, 'done = $3, total = $4, result = $5', [
      done,
      total,
      JSON.stringify(result),
    ]);
  }

  async finish(tenant: Tenant, { done, total }: Progress, result: object): Promise<void> {
    await this.write(
      tenant,
      `done = $3, total = $4, result = $5, state = 'finished', finished_at = now()`,
      [done, total, JSON.stringify(result)],
    );
    this.finished = true;
  }

  /** Says that the worker is alive. */
  renew(): Promise<void> {
    return this.inTenant((tenant) => this.write(tenant, 'attempts = attempts', []));
  }

  /** Ends the job as one that cannot be done, with the reason in words. */
  fail(error: string): Promise<void> {
    return this.inTenant((tenant) =>
      this.write(tenant, `state = 'failed', finished_at = now(), error = $3`, [error]),
    );
  }

  /** Leaves the job to be claimed again after a while. */
  async putBack(seconds: number): Promise<void> {
    await this.inTenant((tenant) =>
      tenant.rows(
        `UPDATE long_jobs SET leased_until = now() + make_interval(secs => $3)
         WHERE id = $1 AND attempts = $2 AND state = 'running'`,
        [this.id, this.job.attempts, seconds],
      ),
    );
  }

  private async write(tenant: Tenant, assignments: string, values: unknown[]): Promise<void> {
    const held = await tenant.row(
      `UPDATE long_jobs SET ${assignments},
         leased_until = now() + make_interval(secs => ${Number(this.leaseSeconds)})
       WHERE id = $1 AND attempts = $2 AND state = 'running' RETURNING id`,
      [this.id, this.job.attempts, ...values],
    );
    if (!held) throw new LeaseLost();
  }
}
