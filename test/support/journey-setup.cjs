const { spawn, spawnSync } = require('node:child_process');
const { mkdtempSync } = require('node:fs');
const { createServer } = require('node:net');
const { tmpdir } = require('node:os');
const { join } = require('node:path');

const root = join(__dirname, '../..');

/**
 * Before the browser journeys: the built product on a database of its own with the demo world, its
 * worker, its mail and file stand-ins, each on a free port. Everything is a child and ends with us.
 */
module.exports = async () => {
  if (!process.env.VATWRIGHT_TEST_PG) {
    const { startTestCluster } = await import('../../db/cluster.mjs');
    const cluster = await startTestCluster();
    process.env.VATWRIGHT_TEST_PG = cluster.adminUrl;
    globalThis.vatwrightTestCluster = cluster;
  }
  const [web, smtp, inbox, files] = await Promise.all([0, 0, 0, 0].map(freePort));
  const database = `journeys_${process.pid}`;
  const env = {
    ...process.env,
    NODE_ENV: 'development',
    LOG_LEVEL: 'error',
    PORT: String(web),
    SESSION_SECRET: 'a secret for journeys alone, 32 chars and more',
    DATABASE_URL: urlOf('vatwright_app', database),
    DATABASE_OWNER_URL: urlOf('vatwright_owner', database),
    SMTP_URL: `smtp://127.0.0.1:${smtp}`,
    LOCAL_DATA: mkdtempSync(join(tmpdir(), 'vatwright-journeys-')),
    LOCAL_SMTP_PORT: String(smtp),
    LOCAL_INBOX_PORT: String(inbox),
    LOCAL_S3_PORT: String(files),
    S3_ENDPOINT: `http://127.0.0.1:${files}`,
    S3_BUCKET: 'vatwright-uploads',
    S3_ACCESS_KEY_ID: 'S3RVER',
    S3_SECRET_ACCESS_KEY: 'S3RVER',
  };
  await createDatabase(database);
  run('migrate', ['up'], env);
  run('demo', [], env);
  globalThis.vatwrightJourney = ['services', 'server', 'worker'].map((name) =>
    spawn(process.execPath, ['--enable-source-maps', bundle(name)], {
      cwd: root,
      env,
      stdio: ['ignore', 'ignore', 'inherit'],
    }),
  );
  process.env.JOURNEY_URL = `http://localhost:${web}`;
  process.env.JOURNEY_DATABASE = env.DATABASE_OWNER_URL;
  process.env.JOURNEY_INBOX = `http://127.0.0.1:${inbox}`;
  await untilReady(`${process.env.JOURNEY_URL}/health/ready`);
};

const bundle = (name) => join(root, 'dist/server', `${name}.cjs`);

function urlOf(role, database) {
  const url = new URL(process.env.VATWRIGHT_TEST_PG);
  url.username = role;
  url.pathname = `/${database}`;
  return url.href;
}

async function createDatabase(name) {
  const { Client } = require('pg');
  const admin = new Client({ connectionString: process.env.VATWRIGHT_TEST_PG });
  await admin.connect();
  for (const role of ['vatwright_owner', 'vatwright_app']) {
    const { rowCount } = await admin.query('SELECT 1 FROM pg_roles WHERE rolname = $1', [role]);
    if (!rowCount) await admin.query(`CREATE ROLE ${role} LOGIN`);
  }
  await admin.query(`CREATE DATABASE ${name} OWNER vatwright_owner`);
  await admin.end();
}

function run(name, args, env) {
  const { status, stderr } = spawnSync(process.execPath, [bundle(name), ...args], {
    cwd: root,
    env,
    encoding: 'utf8',
  });
  if (status !== 0) throw new Error(`${name} failed:\n${stderr}`);
}

async function untilReady(url) {
  for (let tries = 0; tries < 240; tries += 1) {
    const reply = await fetch(url).catch(() => undefined);
    if (reply?.ok) return;
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
  throw new Error(`${url} never became ready.`);
}

function freePort() {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.on('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address();
      server.close(() => resolve(port));
    });
  });
}
