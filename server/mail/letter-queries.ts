import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import { carriesSecret } from '@shared/mail/letter-kind';
import type { listLetters, readLetter } from '@shared/mail/mail-contract';
import { withoutSecrets } from '@shared/mail/without-secrets';
import { notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';

type Query = QueryOf<typeof listLetters>;
type Listed = ReplyOf<typeof listLetters>['rows'][number];

interface Row extends Omit<Listed, 'nextAttemptAt' | 'createdAt' | 'sentAt'> {
  nextAttemptAt: Date;
  createdAt: Date;
  sentAt: Date | null;
}

const columns = `
  l.id, l.kind, l.state, l.to_address AS "toAddress", p.name AS "personName", l.subject, l.attempts,
  l.next_attempt_at AS "nextAttemptAt", l.last_error AS "lastError", l.created_at AS "createdAt",
  l.sent_at AS "sentAt"`;

const from = 'FROM letters l LEFT JOIN people p ON p.id = l.person_id';

const sorts: Readonly<Record<Query['sort'], string>> = {
  createdAt: 'l.created_at, l.id',
  '-createdAt': 'l.created_at DESC, l.id',
  sentAt: 'l.sent_at NULLS LAST, l.id',
  '-sentAt': 'l.sent_at DESC NULLS LAST, l.id',
};

/** The outbox as asked for, with the number of letters in each state. */
export async function letterRows(
  tenant: Tenant,
  query: Query,
): Promise<ReplyOf<typeof listLetters>> {
  const binds = new Binds();
  const where = conditions(query, binds);
  const [numbers] = await tenant.rows<{
    queued: number;
    sent: number;
    dead: number;
    oldest: Date | null;
  }>(
    `SELECT count(*) FILTER (WHERE l.state = 'queued')::int AS queued,
       count(*) FILTER (WHERE l.state = 'sent')::int AS sent,
       count(*) FILTER (WHERE l.state = 'dead')::int AS dead,
       min(l.created_at) FILTER (WHERE l.state = 'queued') AS oldest
     ${from} WHERE ${where}`,
    binds.values,
  );
  const { oldest = null, ...counts } = numbers ?? { queued: 0, sent: 0, dead: 0 };
  const state = query.state ? `AND l.state = ${binds.add(query.state)}` : '';
  const { page, pageSize } = query;
  const rows = await tenant.rows<Row>(
    `SELECT ${columns} ${from} WHERE ${where} ${state} ORDER BY ${sorts[query.sort]}
     LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)}`,
    binds.values,
  );
  const total = query.state ? counts[query.state] : counts.queued + counts.sent + counts.dead;
  return {
    rows: rows.map(present),
    total,
    page,
    pageSize,
    counts,
    oldestQueuedAt: oldest?.toISOString() ?? null,
  };
}

function conditions(query: Query, binds: Binds): string {
  const all = ['true'];
  if (query.kind) all.push(`l.kind = ${binds.add(query.kind)}`);
  if (query.q) {
    const like = binds.add(`%${query.q.replace(/[\\%_]/g, '\\$&')}%`);
    all.push(`(l.to_address ILIKE ${like} OR l.subject ILIKE ${like} OR p.name ILIKE ${like})`);
  }
  return all.join(' AND ');
}

/** One letter with its text part. @throws Problem 404 */
export async function letterById(tenant: Tenant, id: string): Promise<ReplyOf<typeof readLetter>> {
  const { plain, html: _html, ...row } = await findLetter(tenant, id);
  const secretsHidden = carriesSecret(row.kind);
  return { ...present(row), plain: secretsHidden ? withoutSecrets(plain) : plain, secretsHidden };
}

/** The formatted part of a letter, its secrets blotted out. @throws Problem 404 */
export async function letterHtml(tenant: Tenant, id: string): Promise<string> {
  const { kind, html } = await findLetter(tenant, id);
  return carriesSecret(kind) ? withoutSecrets(html) : html;
}

async function findLetter(tenant: Tenant, id: string) {
  const row = await tenant.row<Row & { plain: string; html: string }>(
    `SELECT ${columns}, l.plain, l.html ${from} WHERE l.id = $1`,
    [id],
  );
  if (!row) throw notFound('letter');
  return row;
}

function present(row: Row): Listed {
  return {
    ...row,
    nextAttemptAt: row.nextAttemptAt.toISOString(),
    createdAt: row.createdAt.toISOString(),
    sentAt: row.sentAt?.toISOString() ?? null,
  };
}
