import { createHash } from 'node:crypto';
import type { ReplyOf } from '@shared/contract/endpoint';
import { notFound } from '@shared/problem';
import type { listOwnSessions } from '@shared/sign-in/account-contract';
import type { Tenant } from '@db/tenant-transaction';
import { deviceInWords } from './device-in-words';
import { IDLE } from './sessions';

interface SessionRow {
  sid: string;
  expire: Date;
  startedAt: string | null;
  userAgent: string | null;
}

/** A name for a session that cannot be turned into its cookie. */
const nameOf = (sid: string) => createHash('sha256').update(sid).digest('hex').slice(0, 32);

const live = (tenant: Tenant, personId: string) =>
  tenant.rows<SessionRow>(
    `SELECT sid, expire, sess ->> 'startedAt' AS "startedAt", sess ->> 'userAgent' AS "userAgent"
     FROM sessions WHERE person_id = $1 AND expire > now() ORDER BY expire DESC, sid`,
    [personId],
  );

/** Where a person is signed in, the latest used first. */
export async function ownSessions(
  tenant: Tenant,
  personId: string,
  currentSid: string,
): Promise<ReplyOf<typeof listOwnSessions>> {
  const rows = await live(tenant, personId);
  return {
    sessions: rows.map(({ sid, expire, startedAt, userAgent }) => {
      // Every use puts the end off by the same time, so the end tells when the last use was.
      const lastSeenAt = new Date(expire.getTime() - IDLE).toISOString();
      return {
        id: nameOf(sid),
        current: sid === currentSid,
        device: deviceInWords(userAgent ?? undefined),
        createdAt: startedAt ?? lastSeenAt,
        lastSeenAt,
      };
    }),
  };
}

/** Ends one of the person's sessions. @throws Problem 404 when they have none of that name */
export async function endOwnSession(
  tenant: Tenant,
  personId: string,
  name: string,
): Promise<{ sid: string }> {
  const found = (await live(tenant, personId)).find(({ sid }) => nameOf(sid) === name);
  if (!found) throw notFound('session');
  await tenant.rows('DELETE FROM sessions WHERE sid = $1', [found.sid]);
  return { sid: found.sid };
}
