import type { Sequelize } from 'sequelize';
import { type CalendarDate, addDays, addMonths } from '@shared/calendar/calendar-date';
import { inTenant } from '@db/tenant-transaction';
import { generateTasks } from '@server/tasks/generate-tasks';
import { countClosedWindows } from '@server/compliance/count-closed-windows';
import { seedHistory } from '../history/seed-history';
import { makeWorld } from '../world/fleet';
import { organisation } from '../world/places';
import { namedId, seededRandom } from '../world/random';
import { seedDigests } from './seed-digests';
import { seedFleet } from './seed-fleet';
import { actorOf, seedPeople } from './seed-people';
import { seedProgrammes } from './seed-programmes';
import { seedVisits } from './seed-visits';

const SEED = 20_260_301;
const MONTHS_OF_HISTORY = 18;

/**
 * Makes the invented contractor with its chains, stores, units and people, dated relative to today;
 * the same day gives the same world.
 * @param owner as the tables' owner, for the organisation's own row alone
 * @param app as the application, for everything within it
 * @param baseUrl where links in letters lead
 */
export async function makeDemoWorld(
  owner: Sequelize,
  app: Sequelize,
  baseUrl: string,
  now: Date,
): Promise<void> {
  const random = seededRandom(SEED);
  const today = now.toISOString().slice(0, 10) as CalendarDate;
  const first = `${addMonths(today, -MONTHS_OF_HISTORY).slice(0, 7)}-01` as CalendarDate;
  const organisationId = namedId(random);
  await owner.query('INSERT INTO organisations (id, name, time_zone) VALUES ($1, $2, $3)', {
    bind: [organisationId, organisation.name, organisation.timeZone],
  });
  await owner.query('SELECT ensure_task_months($1, $2)', {
    bind: [addDays(first, -31), addMonths(today, 14)],
  });
  const world = makeWorld(random, today);
  const staff = await inTenant(app, organisationId, async (tenant) => {
    await seedFleet(tenant, world);
    const staff = await seedPeople(tenant, world, random);
    const [administrator, trainer] = staff;
    if (!administrator || !trainer) throw new Error('The demo world has nobody to act.');
    const founder = actorOf(tenant, administrator, [administrator.grant, trainer.grant]);
    await seedProgrammes(tenant, founder, world.chainIds, first, random);
    return staff;
  });
  await generateTasks(app, organisationId, now);
  await inTenant(app, organisationId, async (tenant) => {
    await seedHistory(tenant, world, staff, first, random, now);
    await seedVisits(tenant, staff, random, now);
    await countClosedWindows(tenant, now);
    await seedDigests(tenant, world.chainIds, baseUrl, now);
  });
}
