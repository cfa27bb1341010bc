import { RateLimiterPostgres, type RateLimiterRes } from 'rate-limiter-flexible';
import { Problem } from '@shared/problem';
import type { Services } from '../http/services';

/**
 * Slows guessing down, counted in PostgreSQL so that all servers share the count. Per account and
 * address together: a stranger's guesses never lock the owner out elsewhere.
 */
export function signInLimits({ sessionPool }: Pick<Services, 'sessionPool'>) {
  const store = { storeClient: sessionPool, tableName: 'rate_limits', tableCreated: true } as const;
  const perPair = new RateLimiterPostgres({
    ...store,
    keyPrefix: 'sign-in-pair',
    points: 10,
    duration: 900,
  });
  const perAddress = new RateLimiterPostgres({
    ...store,
    keyPrefix: 'sign-in-address',
    points: 100,
    duration: 900,
  });
  return {
    /** @throws Problem 429 after ten tries for one account, or a hundred in all, in 15 minutes. */
    async take(address: string, email: string): Promise<void> {
      try {
        await perAddress.consume(address);
        await perPair.consume(`${address} ${email}`);
      } catch (refused) {
        if (refused instanceof Error) throw refused;
        const minutes = Math.ceil((refused as RateLimiterRes).msBeforeNext / 60_000);
        throw new Problem(429, 'too-many-tries', 'Too many tries.', {
          detail: `Try again in ${minutes} minutes.`,
        });
      }
    },
    succeeded: (address: string, email: string) => perPair.delete(`${address} ${email}`),
  };
}
