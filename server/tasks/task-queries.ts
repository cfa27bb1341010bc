import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import { notFound } from '@shared/problem';
import { MOST_LISTED } from '@shared/tasks/task-parts';
import type { listTasks } from '@shared/tasks/tasks-contract';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { cursorBatches } from '../exports/read-batches';
import { naturalOrder } from '../fleet/search-text';
import { type OpenSpan, openSpan } from './open-span';
import { type Task, type TaskRecord, presentTask, taskColumns, taskJoins } from './present-task';
import { type TaskFilters, onlyOpen, taskConditions } from './task-conditions';

type ListQuery = QueryOf<typeof listTasks>;

const byDue = 't.due_on, t.due_at, t.id';
const store = (direction = '') => `${naturalOrder('s.number', direction)}, ${byDue}`;
const withStores = 'JOIN stores s ON s.id = t.store_id';
const withRules = 'JOIN rules r ON r.id = t.rule_id';
const withAssignees = 'LEFT JOIN people a ON a.id = t.assigned_to';

/** How to sort, and what must be joined to know. */
const sorts: Readonly<Record<ListQuery['sort'], { by: string; join?: string }>> = {
  due: { by: byDue },
  '-due': { by: 't.due_on DESC, t.due_at DESC, t.id DESC' },
  closes: { by: 't.closes_at, t.id' },
  '-closes': { by: 't.closes_at DESC, t.id DESC' },
  store: { by: store(), join: withStores },
  '-store': { by: store('DESC'), join: withStores },
  rule: { by: `lower(r.name), ${byDue}`, join: withRules },
  '-rule': { by: `lower(r.name) DESC, ${byDue}`, join: withRules },
  technician: { by: `lower(a.name), ${byDue}`, join: withAssignees },
  '-technician': { by: `lower(a.name) DESC NULLS LAST, ${byDue}`, join: withAssignees },
};

/** Tasks in the actor's sight; the page asked for, and how many there are, counted to a bound. */
export async function pageOfTasks(
  tenant: Tenant,
  actor: Actor,
  query: ListQuery,
  now: Date,
): Promise<ReplyOf<typeof listTasks>> {
  const { page, pageSize } = query;
  const binds = new Binds();
  const span = onlyOpen(query) ? await openSpan(tenant, now) : undefined;
  const where = taskConditions(actor, 'tasks.read', query, now, binds, span);
  const count = await tenant.row<{ total: number }>(
    `SELECT count(*)::int AS total
     FROM (SELECT FROM tasks t WHERE ${where} LIMIT ${MOST_LISTED + 1}) counted`,
    binds.values,
  );
  const total = count?.total ?? 0;
  const cut = { limit: pageSize, offset: (page - 1) * pageSize };
  const rows = await sortedTasks(tenant, actor, query, now, cut, span);
  return {
    rows,
    total: Math.min(total, MOST_LISTED),
    more: total > MOST_LISTED,
    page,
    pageSize,
  };
}

/** So many tasks of a list, in its order, from an offset on. */
export async function sortedTasks(
  tenant: Tenant,
  actor: Actor,
  { sort, ...filters }: Partial<TaskFilters> & Pick<ListQuery, 'sort'>,
  now: Date,
  { limit, offset = 0 }: { limit: number; offset?: number },
  span?: OpenSpan,
): Promise<Task[]> {
  const binds = new Binds();
  const where = taskConditions(actor, 'tasks.read', filters, now, binds, span);
  const { by, join = '' } = sorts[sort];
  // The page is cut out first; only its rows are joined with all that is shown of them.
  const rows = await tenant.rows<TaskRecord>(
    `WITH page AS MATERIALIZED (
       SELECT t.* FROM tasks t ${join} WHERE ${where}
       ORDER BY ${by} LIMIT ${binds.add(limit)} OFFSET ${binds.add(offset)})
     SELECT ${taskColumns} FROM page t ${taskJoins} ORDER BY ${by}`,
    binds.values,
  );
  return presentAll(tenant, actor, rows, now);
}

/** All tasks of a list in its order, a batch at a time, for a file. */
export async function* taskBatches(
  tenant: Tenant,
  actor: Actor,
  { sort, ...filters }: Partial<TaskFilters> & Pick<ListQuery, 'sort'>,
  now: Date,
): AsyncGenerator<Task[]> {
  const binds = new Binds();
  const where = taskConditions(actor, 'tasks.read', filters, now, binds);
  const titles = await procedureTitles(tenant);
  yield* cursorBatches<TaskRecord, Task>(
    tenant,
    `SELECT ${taskColumns} FROM tasks t ${taskJoins} WHERE ${where} ORDER BY ${sorts[sort].by}`,
    binds.values,
    (row) => presentTask(row, titleOf(titles, row), actor, now),
  );
}

/** One task. @throws Problem 404 when it does not exist or lies out of the actor's sight */
export async function taskById(tenant: Tenant, actor: Actor, id: string, now: Date): Promise<Task> {
  const binds = new Binds();
  const row = await tenant.row<TaskRecord>(
    `SELECT ${taskColumns} FROM tasks t ${taskJoins}
     WHERE t.id = ${binds.add(id)} AND ${taskConditions(actor, 'tasks.read', {}, now, binds)}`,
    binds.values,
  );
  if (!row) throw notFound('task');
  const [task] = await presentAll(tenant, actor, [row], now);
  return task as Task;
}

async function presentAll(
  tenant: Tenant,
  actor: Actor,
  rows: readonly TaskRecord[],
  now: Date,
): Promise<Task[]> {
  const titles = await procedureTitles(tenant, [...new Set(rows.map((row) => row.procedureId))]);
  return rows.map((row) => presentTask(row, titleOf(titles, row), actor, now));
}

type Titles = ReadonlyMap<string, Task['procedureTitle']>;

const titleOf = (titles: Titles, { procedureId }: TaskRecord) =>
  titles.get(procedureId) ?? { en: '', es: '' };

/** What procedures are called in their newest published version; all of them unless told which. */
async function procedureTitles(tenant: Tenant, ids: readonly string[] | null = null) {
  if (ids?.length === 0) return new Map<string, Task['procedureTitle']>();
  const rows = await tenant.rows<{ id: string; title: Task['procedureTitle'] }>(
    `SELECT DISTINCT ON (procedure_id) procedure_id AS id, content -> 'title' AS title
     FROM procedure_versions WHERE $1::uuid[] IS NULL OR procedure_id = ANY($1::uuid[])
     ORDER BY procedure_id, published_at IS NULL, number DESC`,
    [ids],
  );
  return new Map(rows.map(({ id, title }) => [id, title]));
}
