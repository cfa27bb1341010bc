import { grantsWith } from '@shared/access/ability';
import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { listDigests, readDigest } from '@shared/digests/digests-contract';
import { notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';

type List = ReplyOf<typeof listDigests>;
type Row = List['rows'][number];
type Digest = ReplyOf<typeof readDigest>;

/**
 * SQL true for the digests that the actor may read: those of chains held as a whole. Who holds only
 * regions or stores of a chain has no claim to the figures of its other stores.
 */
function visibleDigests(actor: Actor, binds: Binds): string {
  const grants = grantsWith('digests.read', actor.grants);
  if (grants.some(({ scopeKind }) => scopeKind === 'organisation')) return 'true';
  const chains = grants.filter(({ scopeKind }) => scopeKind === 'chain');
  return `d.chain_id = ANY(${binds.add(chains.map(({ scopeId }) => scopeId))}::uuid[])`;
}

/** Digests in the actor's sight, the newest month first. */
export async function digestRows(
  tenant: Tenant,
  actor: Actor,
  query: QueryOf<typeof listDigests>,
): Promise<List> {
  const { page, pageSize } = query;
  const binds = new Binds();
  const visible = visibleDigests(actor, binds);
  const chains = await tenant.rows<List['chains'][number]>(
    `SELECT c.id, c.name FROM chains c
     WHERE EXISTS (SELECT FROM digests d WHERE d.chain_id = c.id AND ${visible}) ORDER BY c.name`,
    binds.values,
  );
  const all = [visible];
  if (query.chain) all.push(`d.chain_id = ${binds.add(query.chain)}`);
  if (query.month) all.push(`d.month = ${binds.add(`${query.month}-01`)}`);
  const where = all.join(' AND ');
  const [count] = await tenant.rows<{ total: number }>(
    `SELECT count(*)::int AS total FROM digests d WHERE ${where}`,
    binds.values,
  );
  const rows = await tenant.rows<Omit<Row, 'madeAt'> & { madeAt: Date }>(
    `SELECT d.id, d.chain_id AS "chainId", d.content ->> 'chainName' AS "chainName",
       to_char(d.month, 'YYYY-MM') AS month, (d.content ->> 'rate')::float AS rate,
       (d.content ->> 'change')::float AS change,
       (d.content #>> '{overdue,count}')::int AS overdue,
       (d.content #>> '{findings,count}')::int AS findings, d.made_at AS "madeAt"
     FROM digests d WHERE ${where}
     ORDER BY d.month DESC, d.content ->> 'chainName', d.id
     LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)}`,
    binds.values,
  );
  return {
    rows: rows.map((row) => ({ ...row, madeAt: row.madeAt.toISOString() })),
    total: count?.total ?? 0,
    page,
    pageSize,
    chains,
  };
}

/** One digest as stored. @throws Problem 404 when it does not exist or lies out of sight */
export async function digestById(tenant: Tenant, actor: Actor, id: string): Promise<Digest> {
  const binds = new Binds();
  const row = await tenant.row<Omit<Digest, 'madeAt'> & { madeAt: Date }>(
    `SELECT d.id, d.chain_id AS "chainId", d.made_at AS "madeAt", d.content,
       (SELECT o.id FROM digests o WHERE o.chain_id = d.chain_id AND o.month < d.month
        ORDER BY o.month DESC LIMIT 1) AS "earlierId",
       (SELECT o.id FROM digests o WHERE o.chain_id = d.chain_id AND o.month > d.month
        ORDER BY o.month LIMIT 1) AS "laterId"
     FROM digests d WHERE ${visibleDigests(actor, binds)} AND d.id = ${binds.add(id)}`,
    binds.values,
  );
  if (!row) throw notFound('digest');
  return { ...row, madeAt: row.madeAt.toISOString() };
}
