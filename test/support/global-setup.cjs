const { spawnSync } = require('node:child_process');

/**
 * Before the server specs: a PostgreSQL of the tests' own (started here unless one was handed over)
 * and in it a migrated template that each spec file clones.
 */
module.exports = async () => {
  if (!process.env.VATWRIGHT_TEST_PG) {
    const { startTestCluster } = await import('../../db/cluster.mjs');
    const cluster = await startTestCluster();
    process.env.VATWRIGHT_TEST_PG = cluster.adminUrl;
    globalThis.vatwrightTestCluster = cluster;
  }
  const { status, stderr } = spawnSync('npx', ['tsx', 'test/support/make-template.ts'], {
    encoding: 'utf8',
  });
  if (status !== 0) throw new Error(`The template database could not be made:\n${stderr}`);
};
