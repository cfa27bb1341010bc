import { createHash, randomBytes } from 'node:crypto';
import { QueryTypes, type Sequelize } from 'sequelize';
import { Problem } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';

export type LinkPurpose = 'invitation' | 'password-reset';

/** How long a link works, in milliseconds: a week for an invitation, an hour for a new password. */
const life: Readonly<Record<LinkPurpose, number>> = {
  invitation: 7 * 24 * 60 * 60 * 1000,
  'password-reset': 60 * 60 * 1000,
};

const hashOf = (token: string) => createHash('sha256').update(token).digest();

/**
 * Makes a link of 32 random bytes. Only its SHA-256 is kept, so that whoever reads the database
 * cannot use it. Links of the same purpose made for the person before stop working.
 */
export async function makeOneTimeLink(
  tenant: Tenant,
  link: {
    readonly personId: string;
    readonly purpose: LinkPurpose;
    readonly madeBy: string | null;
    readonly now: Date;
  },
): Promise<{ token: string; hash: string; expiresAt: Date }> {
  const token = randomBytes(32).toString('base64url');
  const hash = hashOf(token);
  const expiresAt = new Date(link.now.getTime() + life[link.purpose]);
  await dropOneTimeLinks(tenant, link.personId, link.purpose);
  await tenant.rows(
    `INSERT INTO one_time_links (token_hash, organisation_id, person_id, purpose, made_by, made_at,
       expires_at)
     VALUES ($1, $2, $3, $4, $5, $6, $7)`,
    [hash, tenant.organisationId, link.personId, link.purpose, link.madeBy, link.now, expiresAt],
  );
  return { token, hash: hash.toString('hex'), expiresAt };
}

/** Makes the person's unused links of a purpose worthless. */
export async function dropOneTimeLinks(
  tenant: Tenant,
  personId: string,
  purpose: LinkPurpose,
): Promise<number> {
  const dropped = await tenant.rows(
    `DELETE FROM one_time_links WHERE person_id = $1 AND purpose = $2 AND used_at IS NULL
     RETURNING person_id`,
    [personId, purpose],
  );
  return dropped.length;
}

export interface FoundLink {
  readonly personId: string;
  readonly organisationId: string;
}

/** @throws Problem 410: used, expired, withdrawn and never made look alike */
export function linkSpent(): Problem {
  return new Problem(410, 'link-spent', 'This link works no more.', {
    detail: 'It was used, withdrawn, or its time is over. Ask for a new one.',
  });
}

/**
 * Whose link this is, asked before any organisation is known.
 * @throws Problem 410 when it cannot be used
 */
export async function findOneTimeLink(
  sequelize: Sequelize,
  token: string,
  purpose: LinkPurpose,
  now: Date,
): Promise<FoundLink> {
  const [found] = await sequelize.query<
    FoundLink & { purpose: LinkPurpose; expiresAt: Date; usedAt: Date | null }
  >(
    `SELECT person_id AS "personId", organisation_id AS "organisationId", purpose,
       expires_at AS "expiresAt", used_at AS "usedAt" FROM find_one_time_link($1)`,
    { bind: [hashOf(token)], type: QueryTypes.SELECT },
  );
  if (!found || found.purpose !== purpose || found.usedAt || found.expiresAt <= now) {
    throw linkSpent();
  }
  return { personId: found.personId, organisationId: found.organisationId };
}

/**
 * Uses a link up: of two who come with it at once, one gets through.
 * @throws Problem 410 when it was used or ran out meanwhile
 */
export async function useOneTimeLink(
  tenant: Tenant,
  token: string,
  purpose: LinkPurpose,
  now: Date,
): Promise<void> {
  const used = await tenant.row(
    `UPDATE one_time_links SET used_at = $3
     WHERE token_hash = $1 AND purpose = $2 AND used_at IS NULL AND expires_at > $3
     RETURNING person_id`,
    [hashOf(token), purpose, now],
  );
  if (!used) throw linkSpent();
}
