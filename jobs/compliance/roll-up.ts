import { QueryTypes, type Sequelize } from 'sequelize';
import type { Logger } from 'pino';
import { countClosedWindows } from '@server/compliance/count-closed-windows';
import { inTenant } from '@db/tenant-transaction';

export interface RollUpServices {
  readonly sequelize: Sequelize;
  readonly log: Pick<Logger, 'error'>;
}

/**
 * Brings the compliance counts of every organisation up to the instant `now`.
 * @throws AggregateError after the others when some organisation's could not be counted
 */
export async function rollUpCompliance(
  { sequelize, log }: RollUpServices,
  now: Date,
): Promise<void> {
  const organisations = await sequelize.query<{ id: string }>(
    'SELECT id FROM all_organisations()',
    {
      type: QueryTypes.SELECT,
    },
  );
  const failures: unknown[] = [];
  for (const { id } of organisations) {
    try {
      await inTenant(sequelize, id, (tenant) => countClosedWindows(tenant, now));
    } catch (error) {
      log.error({ err: error, organisation: id }, 'compliance not counted');
      failures.push(error);
    }
  }
  if (failures.length > 0) throw new AggregateError(failures, 'Compliance not counted everywhere');
}
