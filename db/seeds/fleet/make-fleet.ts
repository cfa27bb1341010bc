import type { Sequelize } from 'sequelize';
import { type CalendarDate, addMonths } from '@shared/calendar/calendar-date';
import { inTenant } from '@db/tenant-transaction';
import type { Actor } from '@server/access/actor';
import { countClosedWindows } from '@server/compliance/count-closed-windows';
import { generateTasks } from '@server/tasks/generate-tasks';
import { seedProgrammes } from '../demo/seed-programmes';
import { insertRows } from '../insert-rows';
import { namedId, seededRandom } from '../world/random';
import { liveThroughMonth } from './fleet-history';
import { seedFleetPeople } from './fleet-people';
import { fleetPlaces } from './fleet-places';

const MONTHS_OF_HISTORY = 12;

export interface MadeFleet {
  readonly organisationId: string;
  readonly stores: number;
  readonly units: number;
  readonly schedules: number;
  readonly tasks: number;
  /** The part of everybody's address after the @. */
  readonly domain: string;
}

/**
 * Makes an organisation of so many stores with a year behind it, for trying the product under load.
 * The same count on the same day gives the same fleet.
 *
 * @param owner as the tables' owner, for the organisation's own row, months and statistics
 * @param app as the application, for everything within
 * @param tell hears of each step as it begins
 */
export async function makeFleet(
  owner: Sequelize,
  app: Sequelize,
  stores: number,
  now: Date,
  tell: (step: string) => void = () => undefined,
): Promise<MadeFleet> {
  const random = seededRandom(stores);
  const today = now.toISOString().slice(0, 10) as CalendarDate;
  const first = `${addMonths(today, -MONTHS_OF_HISTORY).slice(0, 7)}-01` as CalendarDate;
  const organisationId = namedId(random);
  const domain = `fleet${stores}.example`;
  await owner.query('INSERT INTO organisations (id, name, time_zone) VALUES ($1, $2, $3)', {
    bind: [organisationId, `Fleet of ${stores} stores`, 'America/Chicago'],
  });
  await owner.query('SELECT ensure_task_months($1, $2)', {
    bind: [first, addMonths(today, 4)],
  });
  tell('places, people and rules');
  const places = fleetPlaces(stores, random, today);
  const administrator = await inTenant(app, organisationId, async (tenant) => {
    for (const table of ['chains', 'regions', 'stores', 'units', 'components'] as const) {
      await insertRows(tenant, table, places.rows[table]);
    }
    const [founder] = await seedFleetPeople(tenant, places, domain, random);
    return founder;
  });
  await owner.query('ANALYZE');
  await inTenant(app, organisationId, async (tenant) => {
    const scope = { scopeKind: 'organisation', scopeId: organisationId } as const;
    const founder: Actor = {
      personId: administrator?.id ?? '',
      organisationId,
      name: 'Administrator 1',
      email: administrator?.email ?? null,
      locale: 'en',
      timeZone: 'America/Chicago',
      grants: [
        { role: 'administrator', ...scope },
        { role: 'trainer', ...scope },
      ],
    };
    await seedProgrammes(tenant, founder, places.chainIds, first, random);
  });
  tell('tasks');
  await owner.query('ANALYZE');
  await generateTasks(app, organisationId, now);
  await owner.query('ANALYZE tasks');
  for (let month = first; month <= addMonths(today, 1); month = addMonths(month, 1)) {
    tell(`what became of those of ${month.slice(0, 7)}`);
    await inTenant(app, organisationId, (tenant) => liveThroughMonth(tenant, month, now));
  }
  tell('compliance');
  await inTenant(app, organisationId, (tenant) => countClosedWindows(tenant, now));
  await owner.query('VACUUM (ANALYZE)');
  return { organisationId, domain, ...(await countsOf(app, organisationId)) };
}

function countsOf(app: Sequelize, organisationId: string) {
  return inTenant(app, organisationId, async (tenant) => {
    const counts = await tenant.row<Pick<MadeFleet, 'stores' | 'units' | 'schedules' | 'tasks'>>(
      `SELECT (SELECT count(*)::int FROM stores) AS stores, (SELECT count(*)::int FROM units) AS units,
         (SELECT count(*)::int FROM schedules) AS schedules, (SELECT count(*)::int FROM tasks) AS tasks`,
    );
    return counts ?? { stores: 0, units: 0, schedules: 0, tasks: 0 };
  });
}
