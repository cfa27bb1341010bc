import type { RoleGrant } from '@shared/access/role';
import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { exportPeople, listPeople, readPerson } from '@shared/people/people-contract';
import { notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import { mayEverywhere } from '@shared/access/ability';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { placeOfZip } from '../fleet/locate-store';
import { searchText } from '../fleet/search-text';
import { IDLE } from '../sign-in/sessions';
import { otherAdministrators } from './keep-administrator';
import { mayEditPerson, scopesOf } from './people-policy';

export type Person = ReplyOf<typeof readPerson>;
export type PersonRow = ReplyOf<typeof listPeople>['rows'][number];
type Filters = Omit<QueryOf<typeof exportPeople>, 'format'>;

interface Row extends Omit<PersonRow, 'lastSeenAt'> {
  lastSeenAt: Date | null;
}

interface FullRow extends Row {
  version: number;
  createdAt: Date;
  invitedUntil: Date | null;
  latitude: number | null;
  longitude: number | null;
}

/** The end of a session lies so long after its last use. */
const lastSeen = `(SELECT max(e.expire) - ${IDLE} * interval '1 millisecond' FROM sessions e
  WHERE e.person_id = p.id AND e.expire > now())`;

const standing = `CASE WHEN p.disabled_at IS NOT NULL THEN 'deactivated'
  WHEN p.password_hash IS NULL THEN 'invited' ELSE 'active' END`;

const columns = `
  p.id, p.name, p.email, p.locale, p.time_zone AS "timeZone", ${standing} AS standing,
  p.home_postal_code AS "homePostalCode", p.home_latitude IS NOT NULL AS "homeKnown",
  ${lastSeen} AS "lastSeenAt",
  coalesce((SELECT jsonb_agg(jsonb_build_object('role', g.role, 'scopeKind', g.scope_kind,
      'scopeId', g.scope_id, 'scopeName', coalesce(o.name, c.name, r.name, s.number || ' ' || s.name,
        '')) ORDER BY g.role, coalesce(o.name, c.name, r.name, s.number))
    FROM role_grants g
    LEFT JOIN organisations o ON o.id = g.scope_id LEFT JOIN chains c ON c.id = g.scope_id
    LEFT JOIN regions r ON r.id = g.scope_id LEFT JOIN stores s ON s.id = g.scope_id
    WHERE g.person_id = p.id), '[]') AS roles`;

const more = `
  p.version, p.created_at AS "createdAt", p.home_latitude AS latitude,
  p.home_longitude AS longitude,
  (SELECT max(l.expires_at) FROM one_time_links l WHERE l.person_id = p.id
     AND l.purpose = 'invitation' AND l.used_at IS NULL) AS "invitedUntil"`;

const byName = 'lower(p.name), p.id';
const sorts: Readonly<Record<Filters['sort'], string>> = {
  name: byName,
  '-name': 'lower(p.name) DESC, p.id',
  email: `p.email, ${byName}`,
  '-email': `p.email DESC NULLS LAST, ${byName}`,
  lastSeenAt: `"lastSeenAt" NULLS FIRST, ${byName}`,
  '-lastSeenAt': `"lastSeenAt" DESC NULLS LAST, ${byName}`,
};

/** SQL true for `people p` who hold something in a store that the actor reads people of. */
function inSight(actor: Actor, binds: Binds): string {
  if (mayEverywhere('people.read', actor.grants)) return 'true';
  const seen = visibleStores(actor, 'people.read', binds);
  return `(p.id = ${binds.add(actor.personId)} OR EXISTS (
    SELECT 1 FROM role_grants g, stores s WHERE g.person_id = p.id AND ${seen}
      AND (g.scope_kind = 'organisation' OR g.scope_id IN (s.chain_id, s.region_id, s.id))))`;
}

function conditions(actor: Actor, filters: Filters, binds: Binds): string {
  const all = [
    inSight(actor, binds),
    searchText(filters.q, ['p.name', 'p.email', 'p.home_postal_code'], binds),
  ];
  if (filters.standing === 'present') all.push('p.disabled_at IS NULL');
  else if (filters.standing !== 'all') all.push(`${standing} = ${binds.add(filters.standing)}`);
  const holds = [];
  if (filters.role) holds.push(`g.role = ${binds.add(filters.role)}`);
  // Whoever holds a role for a store of the region, or for the region itself.
  for (const [column, id] of [
    ['region_id', filters.region],
    ['chain_id', filters.chain],
  ] as const) {
    if (id === undefined) continue;
    const bound = binds.add(id);
    holds.push(`(g.scope_id = ${bound} OR EXISTS (
      SELECT 1 FROM stores s WHERE s.id = g.scope_id AND s.${column} = ${bound}))`);
  }
  if (holds.length > 0) {
    all.push(`EXISTS (SELECT 1 FROM role_grants g
      WHERE g.person_id = p.id AND ${holds.join(' AND ')})`);
  }
  return all.join(' AND ');
}

/** The people in the actor's sight; the page asked for, and how many there are in all. */
export async function pageOfPeople(
  tenant: Tenant,
  actor: Actor,
  query: QueryOf<typeof listPeople>,
): Promise<ReplyOf<typeof listPeople>> {
  const binds = new Binds();
  const where = conditions(actor, query, binds);
  const [count] = await tenant.rows<{ total: number }>(
    `SELECT count(*)::int AS total FROM people p WHERE ${where}`,
    binds.values,
  );
  const { page, pageSize } = query;
  const rows = await tenant.rows<Row>(
    `SELECT ${columns} FROM people p WHERE ${where} ORDER BY ${sorts[query.sort]}
     LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)}`,
    binds.values,
  );
  return { rows: rows.map(presentRow), total: count?.total ?? 0, page, pageSize };
}

/** One person. @throws Problem 404 when there is none, or out of the actor's sight */
export async function personById(tenant: Tenant, actor: Actor, id: string): Promise<Person> {
  const binds = new Binds();
  const row = await tenant.row<FullRow>(
    `SELECT ${columns}, ${more} FROM people p
     WHERE ${inSight(actor, binds)} AND p.id = ${binds.add(id)}`,
    binds.values,
  );
  if (!row) throw notFound('person');
  const { latitude, longitude, createdAt, invitedUntil, ...rest } = row;
  const held: readonly RoleGrant[] = row.roles;
  const mayEdit = mayEditPerson(actor, held, await scopesOf(tenant, held));
  const administers = held.some(
    ({ role, scopeKind }) => role === 'administrator' && scopeKind === 'organisation',
  );
  const needed = administers && !(await tenant.row(`${otherAdministrators} LIMIT 1`, [id]));
  return {
    ...presentRow(rest),
    version: row.version,
    createdAt: createdAt.toISOString(),
    invitedUntil: invitedUntil?.toISOString() ?? null,
    home:
      latitude === null || longitude === null
        ? null
        : { latitude, longitude, city: placeOfZip(row.homePostalCode ?? '')?.city ?? '' },
    mayEdit,
    mayDeactivate: mayEdit && !needed && id !== actor.personId,
  };
}

function presentRow<T extends Row>({ lastSeenAt, ...row }: T) {
  return { ...row, lastSeenAt: lastSeenAt?.toISOString() ?? null };
}
