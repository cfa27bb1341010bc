import type { LongJobServices } from '@server/long-jobs/long-job';
import { longJobHandlers } from './long-job-handlers';
import { workLongJobs } from './work-long-jobs';

const settings = { handlers: longJobHandlers, leaseSeconds: 60, tries: 5 };
let working: Promise<unknown> | undefined;

/**
 * Sets this worker to the long jobs that wait, unless it is at them already, and does not wait for
 * them: letters and reminders must go out meanwhile.
 */
export async function runLongJobs(services: LongJobServices): Promise<void> {
  working ??= workLongJobs(services, settings)
    .catch((error: unknown) => services.log.error({ err: error }, 'long jobs cannot be worked'))
    .finally(() => {
      working = undefined;
    });
}
