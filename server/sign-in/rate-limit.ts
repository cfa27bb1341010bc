import type { Pool } from 'pg';
import { RateLimiterPostgres, type RateLimiterRes } from 'rate-limiter-flexible';
import { Problem } from '@shared/problem';

export interface RateLimit {
  /** Counts one try. @throws Problem 429, saying in how many minutes there are tries again */
  take(key: string): Promise<void>;
  /** Counts one try; false instead of a problem when there are none left. */
  has(key: string): Promise<boolean>;
  /** Forgets what was counted. */
  clear(key: string): Promise<void>;
}

/** So many tries in so many seconds, counted in PostgreSQL so that all servers share the count. */
export function rateLimit(
  pool: Pool,
  limit: { readonly name: string; readonly tries: number; readonly seconds: number },
): RateLimit {
  const limiter = new RateLimiterPostgres({
    storeClient: pool,
    tableName: 'rate_limits',
    tableCreated: true,
    keyPrefix: limit.name,
    points: limit.tries,
    duration: limit.seconds,
  });
  /** Milliseconds to wait; 0 when the try counts. */
  async function wait(key: string): Promise<number> {
    try {
      await limiter.consume(key);
      return 0;
    } catch (refused) {
      // The package throws errors of its store, but a plain result when there are no tries left.
      if (refused instanceof Error) throw refused;
      return Math.max(1, (refused as RateLimiterRes).msBeforeNext);
    }
  }
  return {
    async take(key) {
      const left = await wait(key);
      if (left === 0) return;
      throw new Problem(429, 'too-many-tries', 'Too many tries.', {
        detail: `Try again in ${Math.ceil(left / 60_000)} minutes.`,
      });
    },
    has: async (key) => (await wait(key)) === 0,
    clear: async (key) => {
      await limiter.delete(key);
    },
  };
}
