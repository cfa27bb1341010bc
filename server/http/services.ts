import type { Pool } from 'pg';
import type { CoreServices } from '../core-services';

/** What a request may reach for. */
export interface Services extends CoreServices {
  /** Sessions read and write outside any organisation's transaction. */
  readonly sessionPool: Pool;
}
