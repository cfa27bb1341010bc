import type { TaskState } from '@shared/tasks/task-state';
import { stateWord } from '../ui/text/state-word';
import type { StateCounts } from './tasks-api';

/** Which state is shown first where there is room for few: what someone must act on. */
export const byUrgency: readonly TaskState[] = [
  'overdue',
  'missed',
  'due-soon',
  'open',
  'planned',
  'done-late',
  'done',
  'excused',
  'covered',
];

/** The states that occur with how often, the most urgent first. */
export function ordered(
  counts: StateCounts,
): readonly { readonly state: TaskState; readonly count: number }[] {
  return byUrgency.flatMap((state) => {
    const count = counts[state] ?? 0;
    return count > 0 ? [{ state, count }] : [];
  });
}

export function totalOf(counts: StateCounts): number {
  return ordered(counts).reduce((sum, { count }) => sum + count, 0);
}

/** The counts in words, for an accessible name: "1 overdue, 12 done". */
export function countWords(counts: StateCounts, locale: string): string {
  const format = new Intl.NumberFormat(locale);
  return ordered(counts)
    .map(({ state, count }) => `${format.format(count)} ${stateWord(state)}`)
    .join(', ');
}

/** What a cell of the board draws. */
export interface CellSigns {
  readonly signs: readonly TaskState[];
  /** Written beside the sign where there are more than three; else 0. */
  readonly count: number;
}

/** Up to three tasks are drawn one by one; more are one sign of the most urgent, and a number. */
export function cellSigns(counts: StateCounts): CellSigns {
  const states = ordered(counts);
  const total = totalOf(counts);
  if (total > 3) return { signs: states.slice(0, 1).map(({ state }) => state), count: total };
  return {
    signs: states.flatMap(({ state, count }) => Array.from({ length: count }, () => state)),
    count: 0,
  };
}
