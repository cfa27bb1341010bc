import { Problem } from '@shared/problem';

/**
 * Lets so many pieces of work run at once, and so many wait for their turn in order.
 * @throws Problem 503 when too many wait already: an answer now is better than one too late
 */
export function atMost(running: number, waiting: number) {
  let free = running;
  const queue: (() => void)[] = [];
  return async <T>(work: () => Promise<T>): Promise<T> => {
    if (free > 0) free -= 1;
    else if (queue.length >= waiting) {
      throw new Problem(503, 'busy', 'Too much is going on just now. Try again shortly.');
    } else await new Promise<void>((turn) => queue.push(turn));
    try {
      return await work();
    } finally {
      const next = queue.shift();
      if (next) next();
      else free += 1;
    }
  };
}
