/**
 * The two roles and the database, made where missing. The owner migrates; the application's role
 * owns nothing and is subject to row-level security.
 */
export async function prepareDatabase(adminUrl) {
  const { default: pg } = await import('pg');
  const admin = new pg.Client({ connectionString: adminUrl });
  await admin.connect();
  try {
    for (const role of ['vatwright_owner', 'vatwright_app']) {
      const made = await admin.query('SELECT FROM pg_roles WHERE rolname = $1', [role]);
      const plain = 'LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOREPLICATION NOBYPASSRLS';
      if (!made.rowCount) await admin.query(`CREATE ROLE ${role} ${plain}`);
    }
    const made = await admin.query(`SELECT FROM pg_database WHERE datname = 'vatwright'`);
    if (!made.rowCount) await admin.query('CREATE DATABASE vatwright OWNER vatwright_owner');
  } finally {
    await admin.end();
  }
}
