import type { QueryOf } from '@shared/contract/endpoint';
import type { Ability } from '@shared/access/ability';
import { MOST_DAYS_DEFERRED } from '@shared/tasks/defer-task';
import type { TaskState } from '@shared/tasks/task-state';
import type { exportTasks } from '@shared/tasks/tasks-contract';
import type { Binds } from '@db/binds';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import type { OpenSpan } from './open-span';

export type TaskFilters = Omit<QueryOf<typeof exportTasks>, 'format' | 'sort'>;

/**
 * SQL over `tasks t` alone that is true for the tasks an actor may see under an ability and that fit
 * the filters. Places and words are looked up in small tables first, so that counting joins nothing.
 *
 * @param now the instant that decides in which state a task stands
 * @param span where tasks lie that can be done now, to look nowhere else for them
 */
export function taskConditions(
  actor: Actor,
  ability: Ability,
  filters: Partial<TaskFilters>,
  now: Date,
  binds: Binds,
  span?: OpenSpan,
): string {
  const all: string[] = [];
  const places = storeConditions(actor, ability, filters, binds);
  if (places !== 'true') {
    all.push(`t.store_id = ANY(ARRAY(SELECT s.id FROM stores s WHERE ${places}))`);
  }
  const equal = (column: string, value: string | undefined) => {
    if (value !== undefined) all.push(`t.${column} = ${binds.add(value)}`);
  };
  equal('store_id', filters.store);
  equal('unit_id', filters.unit);
  equal('rule_id', filters.rule);
  equal('audience', filters.audience);
  equal('assigned_to', filters.technician);
  if (filters.unassigned === 'yes') all.push('t.assigned_to IS NULL');
  if (filters.unassigned === 'no') all.push('t.assigned_to IS NOT NULL');
  all.push(...dayConditions(filters, binds), ...wordConditions(filters.q ?? '', binds));
  const at = () => `${binds.add(now)}::timestamptz`;
  if (filters.state) {
    if (span && onlyOpen(filters)) {
      // Said once for all of them, these rule whole months out.
      all.push(`t.outcome = 'none' AND t.lapses_at > ${at()} AND t.opens_at <= ${at()}`);
      all.push(`t.occurs_local <= ${binds.add(span.latest)}::date`);
      if (span.earliest) all.push(`t.occurs_local >= ${binds.add(span.earliest)}::date`);
    }
    all.push(anyOf(filters.state.map((state) => inState[state](at()))));
  }
  if (filters.end) {
    all.push(`t.closes_at <= ${at()}`, anyOf(filters.end.map((end) => ended[end])));
  }
  return all.length === 0 ? 'true' : all.join(' AND ');
}

/** SQL true for the rows of `stores s` that an actor may see under an ability and that fit. */
export function storeConditions(
  actor: Actor,
  ability: Ability,
  { region, chain }: Pick<Partial<TaskFilters>, 'region' | 'chain'>,
  binds: Binds,
): string {
  const all = [visibleStores(actor, ability, binds)].filter((it) => it !== 'true');
  if (region) all.push(`s.region_id = ${binds.add(region)}`);
  if (chain) all.push(`s.chain_id = ${binds.add(chain)}`);
  return all.length === 0 ? 'true' : all.join(' AND ');
}

const anyOf = (parts: readonly string[]) => `(${parts.length > 0 ? parts.join(' OR ') : 'false'})`;

/** Whether the filters ask for nothing but what can be done now. */
export const onlyOpen = ({ state }: Partial<TaskFilters>): boolean =>
  state?.every((it) => it === 'open' || it === 'due-soon' || it === 'overdue') ?? false;

/** The same rule as shared/tasks/task-state.ts, as ranges that an index can serve. */
const inState: Readonly<Record<TaskState, (now: string) => string>> = {
  planned: (now) => `t.outcome = 'none' AND t.opens_at > ${now}`,
  open: (now) => `t.outcome = 'none' AND t.opens_at <= ${now} AND t.due_soon_at > ${now}`,
  'due-soon': (now) => `t.outcome = 'none' AND t.due_soon_at <= ${now} AND t.closes_at > ${now}`,
  overdue: (now) => `t.outcome = 'none' AND t.closes_at <= ${now} AND t.lapses_at > ${now}`,
  missed: (now) => `t.outcome = 'none' AND t.lapses_at <= ${now}`,
  done: () => `t.outcome = 'done' AND t.outcome_at < t.closes_at`,
  'done-late': () => `t.outcome = 'done' AND t.outcome_at >= t.closes_at`,
  excused: () => `t.outcome = 'excused'`,
  covered: () => `t.outcome = 'covered'`,
};

/** The same rule as shared/compliance/window-end.ts, for windows that have closed. */
const ended: Readonly<Record<NonNullable<TaskFilters['end']>[number], string>> = {
  onTime: `t.outcome = 'done' AND t.outcome_at < t.closes_at`,
  late: `t.outcome = 'done' AND t.outcome_at >= t.closes_at`,
  notDone: `t.outcome = 'none'`,
  excused: `t.outcome = 'excused'`,
  covered: `t.outcome = 'covered'`,
};

/**
 * Days asked for, with what follows from them for `occurs_local`, by which tasks are partitioned: a
 * task is due on the day it occurs, or so many days later when it was deferred, and closes no earlier.
 */
function dayConditions(
  { from, to, closesFrom, closesTo }: Partial<TaskFilters>,
  binds: Binds,
): string[] {
  const all: string[] = [];
  if (from) {
    const day = `${binds.add(from)}::date`;
    all.push(`t.due_on >= ${day}`, `t.occurs_local >= ${day} - ${MOST_DAYS_DEFERRED}`);
  }
  if (to) {
    const day = `${binds.add(to)}::date`;
    all.push(`t.due_on <= ${day}`, `t.occurs_local < ${day} + 1`);
  }
  if (closesFrom) all.push(`t.closes_on >= ${binds.add(closesFrom)}::date`);
  if (closesTo) {
    const day = `${binds.add(closesTo)}::date`;
    all.push(`t.closes_on <= ${day}`, `t.occurs_local < ${day} + 1`);
  }
  return all;
}

/** Each word must stand in the store, the unit's tag or the rule's name. */
function wordConditions(q: string, binds: Binds): string[] {
  const words = q.split(/\s+/).filter((word) => word !== '');
  return words.slice(0, 8).map((word) => {
    const like = binds.add(`%${word.replace(/[\\%_]/g, '\\$&')}%`);
    return anyOf([
      `t.store_id IN (SELECT id FROM stores WHERE number || ' ' || name ILIKE ${like})`,
      `t.unit_id IN (SELECT id FROM units WHERE tag ILIKE ${like})`,
      `t.rule_id IN (SELECT id FROM rules WHERE name ILIKE ${like})`,
    ]);
  });
}
