import type { Sequelize } from 'sequelize';
import { type Tenant, inTenant } from '@db/tenant-transaction';
import { bringInLine } from './bring-tasks-in-line';
import { type DueSchedule, dueScheduleIds, lockDueSchedules, monthsNeeded } from './due-schedules';
import { TaskTimetable } from './task-timetable';

/** How many tasks were written, moved to other times, and taken back. */
export interface GenerationCount {
  added: number;
  moved: number;
  withdrawn: number;
}

export interface GenerationOptions {
  /** Schedules per transaction: small enough to lock briefly, large enough to write in bulk. */
  readonly batchSize?: number;
  /** Stops between two batches, where nothing is half done. */
  readonly signal?: AbortSignal;
  /** Told of each batch just before its transaction commits; throwing rolls that batch back. */
  readonly onBatch?: (count: GenerationCount) => void | Promise<void>;
}

/**
 * Writes the tasks that an organisation's schedules owe up to their rules' horizons, and brings those
 * of changed rules and ended schedules in line. Safe to run in any number of workers at once and to
 * end anywhere: each batch locks its schedules, passes over those another worker holds, and commits
 * tasks and bookmark together, so nothing is written twice and nothing is left out.
 *
 * What has opened, was decided or deferred, or stands on a published route is never touched.
 *
 * @param now the instant that decides what has opened and, in each store's zone, how far to write
 */
export async function generateTasks(
  sequelize: Sequelize,
  organisationId: string,
  now: Date,
  { batchSize = 500, signal, onBatch }: GenerationOptions = {},
): Promise<GenerationCount> {
  const total: GenerationCount = { added: 0, moved: 0, withdrawn: 0 };
  const ids = await inTenant(sequelize, organisationId, async (tenant) => {
    const due = await dueScheduleIds(tenant, now);
    if (due.length > 0) await ensureMonths(tenant, now);
    return due;
  });
  // Expansions are the same for every schedule of a rule in a zone, whichever batch it falls in.
  const timetable = new TaskTimetable();
  for (let start = 0; start < ids.length && !signal?.aborted; start += batchSize) {
    const count = await inTenant(sequelize, organisationId, async (tenant) => {
      const batch = await lockDueSchedules(tenant, ids.slice(start, start + batchSize), now);
      const written = await writeBatch(tenant, batch, timetable, now);
      await onBatch?.(written);
      return written;
    });
    total.added += count.added;
    total.moved += count.moved;
    total.withdrawn += count.withdrawn;
  }
  return total;
}

async function writeBatch(
  tenant: Tenant,
  batch: readonly DueSchedule[],
  timetable: TaskTimetable,
  now: Date,
): Promise<GenerationCount> {
  if (batch.length === 0) return { added: 0, moved: 0, withdrawn: 0 };
  const count = await bringInLine(tenant, batch, timetable.occurrencesFor(batch), now);
  // An ended schedule with nothing left to withdraw is recognised by its empty bookmark.
  await tenant.rows(
    `UPDATE schedules sc SET generated_to = b.bookmark, generated_revision = b.revision
     FROM unnest($1::uuid[], $2::timestamp[], $3::int[]) AS b (id, bookmark, revision)
     WHERE sc.id = b.id`,
    [
      batch.map(({ id }) => id),
      batch.map(({ ended, horizon }) => (ended ? null : horizon)),
      batch.map(({ ended, revision }) => (ended ? null : revision)),
    ],
  );
  return count;
}

async function ensureMonths(tenant: Tenant, now: Date): Promise<void> {
  const months = await monthsNeeded(tenant, now);
  if (!months) return;
  await tenant.rows('SELECT ensure_task_months($1::date, $2::date)', [months.from, months.to]);
}
