import type { TaskOutcome } from '../tasks/task-state';
import type { WindowCounts } from './on-time-rate';

/** What compliance looks at of one task; times in epoch milliseconds. */
export interface CountedTask {
  readonly outcome: TaskOutcome;
  readonly outcomeAt: number | null;
  /** End of the window, exclusive. */
  readonly closesAt: number;
}

/**
 * In which count a task stands at the instant `now`, or null while its window has not closed: a task
 * counts on the local day on which its window closes, not on the day on which it was done, so that
 * doing next month's work early changes nothing about this month.
 *
 * @example windowEnd({ outcome: 'done', outcomeAt: 9, closesAt: 10 }, 10) // 'onTime'
 * @example windowEnd({ outcome: 'done', outcomeAt: 10, closesAt: 10 }, 11) // 'late'
 * @example windowEnd({ outcome: 'done', outcomeAt: 3, closesAt: 10 }, 9) // null: counts when it closes
 */
export function windowEnd(task: CountedTask, now: number): keyof WindowCounts | null {
  if (now < task.closesAt) return null;
  switch (task.outcome) {
    case 'excused':
      return 'excused';
    case 'covered':
      return 'covered';
    case 'done':
      return task.outcomeAt !== null && task.outcomeAt < task.closesAt ? 'onTime' : 'late';
    case 'none':
      return 'notDone';
  }
}

export const noWindows: WindowCounts = { onTime: 0, late: 0, notDone: 0, excused: 0, covered: 0 };

/**
 * Counts the closed windows of tasks at the instant `now`.
 *
 * @example
 * // One done in time, one done late, one still open:
 * countWindows([
 *   { outcome: 'done', outcomeAt: 1, closesAt: 2 },
 *   { outcome: 'done', outcomeAt: 3, closesAt: 2 },
 *   { outcome: 'none', outcomeAt: null, closesAt: 9 },
 * ], 5) // { onTime: 1, late: 1, notDone: 0, excused: 0, covered: 0 }
 */
export function countWindows(tasks: Iterable<CountedTask>, now: number): WindowCounts {
  const counts = { ...noWindows };
  for (const task of tasks) {
    const end = windowEnd(task, now);
    if (end !== null) counts[end] += 1;
  }
  return counts;
}

/** The counts of two groups of tasks that share none. */
export function addCounts(a: WindowCounts, b: WindowCounts): WindowCounts {
  return {
    onTime: a.onTime + b.onTime,
    late: a.late + b.late,
    notDone: a.notDone + b.notDone,
    excused: a.excused + b.excused,
    covered: a.covered + b.covered,
  };
}
