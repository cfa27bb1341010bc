import type { Tenant } from '@db/tenant-transaction';
import type { Services } from '../http/services';

/** What long work may reach for: as a request, without the sessions. */
export type LongJobServices = Omit<Services, 'sessionPool'>;

/** How far work has come. `total` is null until it is known. */
export interface Progress {
  readonly done: number;
  readonly total: number | null;
}

/**
 * One try at a long job, held by one worker under a lease. Whatever it writes down is refused once the
 * lease is lost or the job cancelled: then {@link LeaseLost} is thrown, and the transaction at hand
 * must roll back. So two workers never both get their writes in.
 */
export interface LongJobRun<Input = unknown, Result extends object = object> {
  readonly id: string;
  readonly organisationId: string;
  /** The person who asked for it; to be loaded anew, as roles change meanwhile. */
  readonly askedBy: string;
  readonly input: Input;
  /** What an earlier try had reached when its worker was lost. */
  readonly reached: Progress & { readonly result: Result | null };
  /** Runs work in a transaction of the job's organisation. */
  inTenant<T>(work: (tenant: Tenant) => Promise<T>): Promise<T>;
  /** Shows how far it is, at once. */
  show(progress: Progress): Promise<void>;
  /** Writes down how far it is together with the caller's other writes: a later try goes on from here. */
  keep(tenant: Tenant, progress: Progress, result: Result): Promise<void>;
  /** Ends the job together with the caller's last writes. */
  finish(tenant: Tenant, progress: Progress, result: Result): Promise<void>;
}

/**
 * Does one kind of long work. It must be safe to begin again: a worker that dies hands its job to the
 * next. A `Problem` thrown ends the job with its title shown; any other error has it tried again.
 */
export type LongJobHandler = (services: LongJobServices, run: LongJobRun) => Promise<void>;

/** The job was cancelled, or taken over by another worker. */
export class LeaseLost extends Error {
  constructor() {
    super('The lease of this long job is lost.');
  }
}
