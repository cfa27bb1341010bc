import type { Logger } from 'pino';
import { QueryTypes, type Sequelize } from 'sequelize';
import { type GenerationCount, generateTasks } from '@server/tasks/generate-tasks';

export interface WriteAheadServices {
  readonly sequelize: Sequelize;
  readonly log: Pick<Logger, 'error' | 'info'>;
}

/**
 * As most rules look ahead. Months that a rule with a longer horizon needs are made when it is written
 * for; each one too many would have to be planned for by every statement over tasks.
 */
const MONTHS_AHEAD = '4 months';

/**
 * Has the months to come ready and writes the tasks of every organisation up to its rules' horizons.
 * Run again, by any number of workers, it adds only what is missing.
 * @throws AggregateError after the others when some organisation's tasks could not be written
 */
export async function writeTasksAhead(
  { sequelize, log }: WriteAheadServices,
  now: Date,
): Promise<void> {
  await sequelize.query(
    `SELECT ensure_task_months($1::date, ($1::date + $2::interval)::date)
     WHERE to_regclass('tasks_' || to_char($1::date + $2::interval, 'YYYY_MM')) IS NULL`,
    { bind: [now.toISOString().slice(0, 10), MONTHS_AHEAD] },
  );
  const organisations = await sequelize.query<{ id: string }>(
    'SELECT id FROM all_organisations()',
    {
      type: QueryTypes.SELECT,
    },
  );
  const failures: unknown[] = [];
  for (const { id } of organisations) {
    try {
      const count = await generateTasks(sequelize, id, now);
      if (didSomething(count)) log.info({ organisation: id, ...count }, 'tasks written');
    } catch (error) {
      log.error({ err: error, organisation: id }, 'tasks not written');
      failures.push(error);
    }
  }
  if (failures.length > 0) throw new AggregateError(failures, 'Tasks not written everywhere');
}

const didSomething = ({ added, moved, withdrawn }: GenerationCount) =>
  added + moved + withdrawn > 0;
