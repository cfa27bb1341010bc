import type { Browser, TestApp } from '@test/support/test-app';
import { type Fleet, makeFleet, makePerson } from './organisation-factory';
import { makeWork } from './task-factory';

/** Moves the times of the factory's task, due on Wednesday 10 June 2026, by whole days. */
function daysLater(days: number, more: object = {}): object {
  const at = (text: string) => new Date(Date.parse(text) + days * 86_400_000).toISOString();
  const on = (text: string) => at(`${text}T00:00:00Z`).slice(0, 10);
  return {
    occurs_local: `${on('2026-06-10')}T09:00:00`,
    due_on: on('2026-06-10'),
    opens_at: at('2026-06-08T05:00:00Z'),
    due_soon_at: at('2026-06-09T05:00:00Z'),
    due_at: at('2026-06-10T14:00:00Z'),
    closes_at: at('2026-06-13T05:00:00Z'),
    lapses_at: at('2026-06-16T05:00:00Z'),
    closes_on: on('2026-06-12'),
    ...more,
  };
}

/** Tasks in every state, as seen on Tuesday 9 June 2026 in Chicago. */
export interface TaskWorld {
  readonly fleet: Fleet;
  /** Another store of the same region. */
  readonly other: Fleet;
  /** A regional facility manager of that region, signed in. */
  readonly manager: Browser;
  readonly technician: { readonly id: string; readonly email: string };
  /** Of tasks by what they are, and of the two stores' rules. */
  readonly ids: Readonly<Record<string, string>>;
  /** What the tasks of rows are, in their order. */
  namesOf(rows: readonly { readonly id: string }[]): (string | undefined)[];
}

/** Two stores of one region, and one store of another region that the manager does not see. */
export async function makeTaskWorld(app: TestApp): Promise<TaskWorld> {
  app.setNow('2026-06-09T15:00:00Z');
  const ids: Record<string, string> = {};
  const fleet = await makeFleet(app.db);
  const { organisationId, regionId, chainId } = fleet;
  const other = await makeFleet(app.db, { organisationId, regionId, chainId });
  const elsewhere = await makeFleet(app.db, { organisationId, chainId });
  const region = { kind: 'region', id: regionId } as const;
  const person = await makePerson(app.db, organisationId, 'regional-facility-manager', region);
  const manager = await app.browser().signIn(person.email);
  const technician = await makePerson(app.db, organisationId, 'technician', region);
  const own = await makeWork(app.db, fleet);
  const others = await makeWork(app.db, other, 'store');
  const hidden = await makeWork(app.db, elsewhere);
  const done = { outcome: 'done', outcome_by: technician.id };
  ids['late'] = await own.makeTask(daysLater(-35, { ...done, outcome_at: '2026-05-10T12:00:00Z' }));
  ids['inTime'] = await own.makeTask(
    daysLater(-28, { ...done, outcome_at: '2026-05-13T12:00:00Z' }),
  );
  ids['missed'] = await own.makeTask(daysLater(-14));
  ids['excused'] = await own.makeTask(
    daysLater(-7, { outcome: 'excused', outcome_at: '2026-06-01T12:00:00Z' }),
  );
  ids['overdue'] = await others.makeTask(daysLater(-5));
  ids['dueSoon'] = await own.makeTask(daysLater(0, { assigned_to: technician.id }));
  ids['open'] = await own.makeTask(daysLater(1));
  ids['planned'] = await others.makeTask(daysLater(14));
  ids['hidden'] = await hidden.makeTask(daysLater(0));
  ids['ownRule'] = own.ruleId;
  ids['othersRule'] = others.ruleId;
  const namesOf = (rows: readonly { readonly id: string }[]) =>
    rows.map(({ id }) => Object.keys(ids).find((name) => ids[name] === id));
  return { fleet, other, manager, technician, ids, namesOf };
}
