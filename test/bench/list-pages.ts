import type { Role } from '@shared/access/role';

/** One list as one role opens it. */
export interface ListPage {
  readonly name: string;
  readonly as: Role;
  readonly path: string;
}

/** What the addresses of a fleet's lists need to know of it. */
export interface FleetFacts {
  /** Today, YYYY-MM-DD. */
  readonly today: string;
  /** A store, a technician and a rule in the first manager's region. */
  readonly storeId: string;
  readonly technicianId: string;
  readonly ruleId: string;
}

const planner = 'regional-facility-manager';

/** Every list page, as the role that lives on it opens it. */
export function listPages({ today, storeId, technicianId, ruleId }: FleetFacts): ListPage[] {
  const month = today.slice(0, 7);
  const yearAgo = `${Number(month.slice(0, 4)) - 1}${month.slice(4)}`;
  const page = (name: string, path: string, as: Role = planner): ListPage => ({ name, as, path });
  const active = 'state=open,due-soon,overdue';
  return [
    page('tasks, to be done', `/tasks?${active}`),
    page('tasks, all', '/tasks'),
    page('tasks, all, page 20', '/tasks?page=20'),
    page('tasks, searched', `/tasks?${active}&q=motor%20f-2`),
    page('tasks, overdue, by store', '/tasks?state=overdue&sort=store'),
    page('tasks of a technician', `/tasks?technician=${technicianId}&${active}`),
    page('tasks of a store, latest', `/tasks?store=${storeId}&sort=-due`),
    page('tasks missed in a month', `/tasks?end=notDone&closesFrom=${month}-01&rule=${ruleId}`),
    page('tasks, all, organisation', '/tasks', 'administrator'),
    page('tasks, to be done, organisation', `/tasks?${active}`, 'administrator'),
    page('calendar', `/tasks/calendar?month=${month}&audience=technician`),
    page('calendar with a day', `/tasks/calendar?month=${month}&day=${today}`),
    page('board', '/tasks/board?audience=technician'),
    page('board, all audiences', '/tasks/board'),
    page('board, most overdue first', '/tasks/board?sort=overdue'),
    page('board, lowest rate first', '/tasks/board?sort=rate'),
    page('stores', '/stores'),
    page('stores, searched', '/stores?q=mill'),
    page('stores, organisation', '/stores', 'administrator'),
    page('units', '/units'),
    page('units, organisation', '/units', 'administrator'),
    page('components', '/components'),
    page('components, organisation', '/components', 'administrator'),
    page('regions', '/regions'),
    page('chains', '/chains', 'administrator'),
    page('findings, open', '/findings?settled=no'),
    page('findings, organisation', '/findings', 'administrator'),
    page('compliance, a month by store', `/compliance?from=${month}&to=${month}`),
    page('compliance, a year by store', `/compliance?from=${yearAgo}&to=${month}`),
    page('compliance, a year by rule', `/compliance?from=${yearAgo}&to=${month}&by=rule`),
    page('compliance picture', `/compliance/picture?from=${yearAgo}&to=${month}`),
    page('compliance, a chain', `/compliance?from=${yearAgo}&to=${month}`, 'account-owner'),
    page('people', '/people', 'administrator'),
    page('procedures', '/procedures'),
    page('programmes', '/programmes'),
    page('rules', '/rules'),
    page('letters', '/mail/letters', 'administrator'),
    page('routes', `/routes?from=${today}`),
    page('digests', '/digests', 'account-owner'),
    page('today', '/today', 'technician'),
  ];
}
