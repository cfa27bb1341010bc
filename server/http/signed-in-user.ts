import 'passport';
import 'pino-http';

/** What a session remembers of the person: enough to find them, nothing that could go stale. */
export interface SignedInUser {
  readonly personId: string;
  readonly organisationId: string;
}

declare global {
  // Express and passport are extended through this namespace; there is no other way.
  // eslint-disable-next-line @typescript-eslint/no-namespace
  namespace Express {
    // eslint-disable-next-line @typescript-eslint/no-empty-object-type
    interface User extends SignedInUser {}
  }
}
