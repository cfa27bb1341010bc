import type { TaskState } from '@shared/tasks/task-state';
import { taskStates } from '../../ui/text/state-word';
import type { TaskQuery } from '../tasks-api';

/** Reads one filter of the address; empty where it is not set. */
export type Get = (key: string) => string;

/** What somebody must still act on: what the table shows when nothing else is asked for. */
const TO_DO: readonly TaskState[] = ['open', 'due-soon', 'overdue'];

/** Filters that ask about the past too, so that the table then shows every state. */
const SPANS = ['from', 'to', 'end', 'closesFrom', 'closesTo'];

/** The states shown; empty for all. */
export function shownStates(get: Get): ReadonlySet<TaskState> {
  const asked = get('state');
  if (asked === 'all') return new Set();
  if (asked !== '') {
    const words = new Set(asked.split(','));
    return new Set(taskStates.filter((state) => words.has(state)));
  }
  return new Set(SPANS.some((key) => get(key) !== '') ? [] : TO_DO);
}

/** How a choice of states stands in the address: the usual choice is left out of it. */
export function statesInAddress(states: readonly TaskState[]): string | null {
  if (states.length === 0) return 'all';
  const usual = states.length === TO_DO.length && TO_DO.every((it) => states.includes(it));
  return usual ? null : states.join(',');
}

/** The filters of the table as the server takes them. */
export function tableFilters(get: Get): TaskQuery {
  const some = (key: string) => get(key) || undefined;
  const states = [...shownStates(get)];
  return {
    q: some('q'),
    store: some('store'),
    region: some('region'),
    chain: some('chain'),
    rule: some('rule'),
    technician: some('technician'),
    audience: some('audience') as TaskQuery['audience'],
    unit: some('unit'),
    unassigned: some('unassigned') as TaskQuery['unassigned'],
    state: states.length > 0 ? states : undefined,
    from: some('from'),
    to: some('to'),
    end: some('end')?.split(',') as TaskQuery['end'],
    closesFrom: some('closesFrom'),
    closesTo: some('closesTo'),
  };
}
