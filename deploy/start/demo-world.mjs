import pg from 'pg';

const begun = 'demo world begun';
const made = 'demo world made';

async function withDatabase(url, work) {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

const inVatwright = (adminUrl) => Object.assign(new URL(adminUrl), { pathname: '/vatwright' }).href;
const stamp = (client, text) => client.query(`COMMENT ON DATABASE vatwright IS '${text}'`);

/**
 * A first start that was interrupted leaves half a demo world, which nobody wants to keep: the
 * database is made anew. The stamp is the database's own comment.
 */
export function clearHalfMade(adminUrl) {
  return withDatabase(adminUrl, async (client) => {
    const { rows } = await client.query(
      `SELECT shobj_description(oid, 'pg_database') AS stamp FROM pg_database WHERE datname = 'vatwright'`,
    );
    if (rows[0]?.stamp !== begun) return;
    await client.query('DROP DATABASE vatwright WITH (FORCE)');
    await client.query('CREATE DATABASE vatwright OWNER vatwright_owner');
  });
}

/**
 * Fills an empty database once: one that holds an organisation is left alone.
 * @returns whether it was filled
 */
export function makeDemoWorldOnce(adminUrl, make) {
  return withDatabase(inVatwright(adminUrl), async (client) => {
    const { rowCount } = await client.query('SELECT FROM organisations LIMIT 1');
    if (rowCount) return false;
    await stamp(client, begun);
    await make();
    await stamp(client, made);
    return true;
  });
}
