/** What came of handing a letter to the SMTP server. */
export type DeliveryOutcome =
  | { readonly kind: 'sent' }
  /** Refused for good: trying again would only bring the same answer. */
  | { readonly kind: 'refused'; readonly error: string }
  /** Not this time. `server`: not the letter's fault, so the next letter would fare no better. */
  | { readonly kind: 'later'; readonly error: string; readonly fault: 'letter' | 'server' };

interface SmtpFailure {
  readonly code?: string;
  readonly responseCode?: number;
  readonly message?: string;
}

/**
 * Reads a failure of nodemailer. Only an answer of 5xx to this letter's envelope or text is final
 * (RFC 5321, 4.2.1); a 5xx to the greeting or the sign-in speaks of the server, not of the letter.
 */
export function outcomeOf(error: unknown): DeliveryOutcome {
  const { code, responseCode, message = String(error) } = (error ?? {}) as SmtpFailure;
  const text = message.slice(0, 500);
  const aboutLetter = code === 'EENVELOPE' || code === 'EMESSAGE';
  if (aboutLetter && responseCode !== undefined && responseCode >= 500) {
    return { kind: 'refused', error: text };
  }
  return { kind: 'later', error: text, fault: aboutLetter ? 'letter' : 'server' };
}

/**
 * Seconds to wait after the given number of attempts (from 1): one minute, doubled each time, at most
 * half an hour, so that mail flows soon after an outage of days.
 *
 * @example [1, 2, 3, 6, 20].map(backOffSeconds) // [60, 120, 240, 1800, 1800]
 */
export function backOffSeconds(attempts: number): number {
  return Math.min(60 * 2 ** Math.min(attempts - 1, 10), 1800);
}
