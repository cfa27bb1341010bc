import type { Services } from '../http/services';
import { rateLimit } from './rate-limit';

const QUARTER_HOUR = 900;

/**
 * Slows guessing down. Per account and address together: a stranger's guesses never lock the owner
 * out elsewhere.
 */
export function signInLimits({ sessionPool }: Pick<Services, 'sessionPool'>) {
  const limit = (name: string, tries: number, seconds = QUARTER_HOUR) =>
    rateLimit(sessionPool, { name, tries, seconds });
  const perPair = limit('sign-in-pair', 10);
  const perAddress = limit('sign-in-address', 100);
  return {
    /** @throws Problem 429 after ten tries for one account, or a hundred in all, in 15 minutes. */
    async take(address: string, email: string): Promise<void> {
      await perAddress.take(address);
      await perPair.take(`${address} ${email}`);
    },
    succeeded: (address: string, email: string) => perPair.clear(`${address} ${email}`),
    /** Letters asked for from one network address. */
    letters: limit('reset-address', 20),
    /** Letters to one mailbox: enough for whoever mistypes, too few to flood it. */
    lettersTo: limit('reset-mailbox', 5, 3600),
    /** Links tried from one network address. */
    links: limit('link-address', 60),
    /** Present passwords tried by one person who is signed in. */
    ownPassword: limit('own-password', 10),
  };
}
