/** What became of a task, decided by how its people work. */
export type Fate =
  | { readonly kind: 'done'; readonly at: Date }
  | { readonly kind: 'excused'; readonly at: Date; readonly reason: string }
  | { readonly kind: 'left'; readonly couldNot: string | null };

export interface Window {
  readonly opensAt: Date;
  readonly dueAt: Date;
  readonly closesAt: Date;
  readonly lapsesAt: Date;
}

const HOUR = 3_600_000;
const DAY = 24 * HOUR;

const excuses = ['Store closed for a refit', 'Unit out of service, waiting for a part'];
const reasons = [
  'no-access: Manager had the key',
  'in-use: Lunch rush, come back later',
  'unit-off',
];

/**
 * @param reliability chance, 0 to 1, that it is done in its window
 * @param now what would be done later is not done yet
 */
export function fateOf(task: Window, reliability: number, random: () => number, now: Date): Fate {
  const chance = random();
  const spread = random();
  const jitter = random();
  if (chance < reliability) {
    const from = Math.max(task.opensAt.getTime(), task.dueAt.getTime() - 2 * DAY);
    const to = Math.min(task.closesAt.getTime() - 60_000, task.dueAt.getTime() + 2 * DAY);
    return doneBy(new Date(from + (to - from) * spread), now);
  }
  if (chance < reliability + 0.006) {
    const at = new Date(task.dueAt.getTime() - HOUR * jitter);
    const reason = excuses[Math.floor(spread * excuses.length)] as string;
    return at < now ? { kind: 'excused', at, reason } : { kind: 'left', couldNot: null };
  }
  if (jitter < 0.55) {
    const late = (task.lapsesAt.getTime() - task.closesAt.getTime()) * (0.1 + 0.8 * spread);
    return doneBy(new Date(task.closesAt.getTime() + late), now);
  }
  return {
    kind: 'left',
    couldNot: jitter > 0.9 ? (reasons[Math.floor(spread * 3)] as string) : null,
  };
}

const doneBy = (at: Date, now: Date): Fate =>
  at < now ? { kind: 'done', at } : { kind: 'left', couldNot: null };
