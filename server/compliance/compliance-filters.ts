import type { ReplyOf } from '@shared/contract/endpoint';
import type { readComplianceFilters } from '@shared/compliance/compliance-contract';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';

type Reply = ReplyOf<typeof readComplianceFilters>;
type Named = Reply['rules'][number];

/** What the actor's stores can be filtered by, each by name. */
export async function complianceFilters(
  tenant: Tenant,
  actor: Actor,
  store: string | undefined,
): Promise<Reply> {
  const named = (sql: (visible: string) => string) => {
    const binds = new Binds();
    return tenant.rows<Named>(sql(visibleStores(actor, 'compliance.read', binds)), binds.values);
  };
  return {
    chains: await named(
      (visible) => `SELECT c.id, c.name FROM chains c
        WHERE EXISTS (SELECT FROM stores s WHERE s.chain_id = c.id AND ${visible}) ORDER BY c.name`,
    ),
    regions: await named(
      (visible) => `SELECT g.id, g.name FROM regions g
        WHERE EXISTS (SELECT FROM stores s WHERE s.region_id = g.id AND ${visible}) ORDER BY g.name`,
    ),
    // Retired rules stay: their months can still be asked for.
    rules: await named(
      (visible) => `SELECT r.id, r.name FROM rules r
        WHERE EXISTS (SELECT FROM schedules k JOIN stores s ON s.id = k.store_id
          WHERE k.rule_id = r.id AND ${visible}) ORDER BY r.name, r.id`,
    ),
    store: store === undefined ? null : await visibleStore(tenant, actor, store),
  };
}

async function visibleStore(tenant: Tenant, actor: Actor, id: string): Promise<Reply['store']> {
  const binds = new Binds();
  const row = await tenant.row<NonNullable<Reply['store']>>(
    `SELECT s.id, s.number, s.name FROM stores s
     WHERE ${visibleStores(actor, 'compliance.read', binds)} AND s.id = ${binds.add(id)}`,
    binds.values,
  );
  return row ?? null;
}
