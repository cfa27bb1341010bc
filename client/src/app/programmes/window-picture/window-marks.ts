import type { WindowPlan } from '@shared/recurrence/window';

/** Where the moments of a task's window stand on a line from 0 to 100. */
export interface WindowMarks {
  readonly opens: number;
  readonly dueSoon: number;
  readonly due: number;
  readonly closes: number;
  /** Null where it stays open until the next one opens. */
  readonly lapses: number | null;
}

/**
 * Lays a window out on a line, its ends kept clear of the edges. In days, a due day is one whole day
 * wide and the due time stands within it; in hours, the due time is a point.
 *
 * @param timeOfDay share of the day that has passed at the due time, 0 to 1
 * @example windowMarks({ kind: 'days', before: 2, after: 1, late: 0, dueSoon: 1 }, 0.5)
 * // four days wide, due in the middle of the third
 */
export function windowMarks(plan: WindowPlan, timeOfDay: number): WindowMarks {
  const days = plan.kind === 'days';
  const due = days ? plan.before + timeOfDay : plan.before;
  const closes = plan.before + plan.after + (days ? 1 : 0);
  const dueSoon = Math.max(0, plan.before - plan.dueSoon);
  const lapses = plan.late === null ? null : closes + plan.late;
  // Room behind the end, for what is late; never so much that the window itself shrinks to a dot.
  const length = Math.max(closes, 0.5);
  const whole =
    lapses === null ? length * 1.25 : Math.min(Math.max(lapses, length * 1.08), length * 2.5);
  const place = (at: number): number => Math.min(96, 4 + (at / whole) * 92);
  return {
    opens: place(0),
    dueSoon: place(dueSoon),
    due: place(due),
    closes: place(closes),
    lapses: lapses === null ? null : place(lapses),
  };
}
