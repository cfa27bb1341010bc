import { runCheck } from '@server/imports/run-check';
import { runImport } from '@server/imports/run-import';
import type { LongJobHandler } from '@server/long-jobs/long-job';

/** What does each kind of long job. */
export const longJobHandlers: Readonly<Record<string, LongJobHandler>> = {
  'import-check': runCheck,
  'import-rows': runImport,
};
