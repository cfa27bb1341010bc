import { createHash } from 'node:crypto';
import { Problem } from '@shared/problem';
import type { Endpoint } from '@shared/contract/endpoint';
import type { Call } from './routes';

const uuid = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

/**
 * Runs a write once per idempotency key: the same key with the same request answers as the first
 * did, even when both arrive together. The key is kept in the transaction that does the work.
 * @throws Problem 422 when the key comes again with another request.
 */
export async function once<T>(call: Call<Endpoint>, work: () => Promise<T>): Promise<T> {
  const key = call.req.get('Idempotency-Key');
  if (call.req.method === 'GET' || key === undefined) return work();
  if (!uuid.test(key)) {
    throw new Problem(422, 'idempotency-key', 'The Idempotency-Key header must be a UUID.');
  }
  const { tenant, actor, req } = call;
  const hash = createHash('sha256')
    .update(`${req.method} ${req.originalUrl}\n${JSON.stringify(req.body ?? null)}`)
    .digest();
  await tenant.rows('SELECT pg_advisory_xact_lock(hashtextextended($1, 0))', [
    `${actor.personId} ${key.toLowerCase()}`,
  ]);
  const before = await tenant.row<{ request_hash: Buffer; reply: { value?: T } }>(
    'SELECT request_hash, reply FROM idempotency_keys WHERE person_id = $1 AND key = $2',
    [actor.personId, key],
  );
  if (before) {
    if (!before.request_hash.equals(hash)) {
      throw new Problem(422, 'idempotency-key-reused', 'This key was used for another request.');
    }
    return before.reply.value as T;
  }
  const value = await work();
  await tenant.rows(
    `INSERT INTO idempotency_keys (organisation_id, person_id, key, request_hash, status, reply)
     VALUES ($1, $2, $3, $4, 200, $5)`,
    [tenant.organisationId, actor.personId, key, hash, JSON.stringify({ value })],
  );
  return value;
}
