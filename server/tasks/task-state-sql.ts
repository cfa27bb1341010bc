import type { Binds } from '@db/binds';

/** SQL for the state in which a task `t` stands at an instant. */
export const stateAt = (now: Date, binds: Binds): string =>
  `task_state(t.outcome, t.outcome_at, t.opens_at, t.due_soon_at, t.closes_at, t.lapses_at,
    ${binds.add(now)}::timestamptz)`;
