// `npm start`: the whole product on this machine, and its end at Ctrl-C.
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { clusterRunning, startCluster, stopCluster } from '../db/cluster.mjs';
import { Failure, failureOf } from '../db/cluster-failure.mjs';
import { buildClient } from './build-client.mjs';
import { buildServer, bundle } from './build-server.mjs';
import { checkGround, local, say } from './prepare/ground.mjs';
import { announce } from './start/announce.mjs';
import { Children, Stopped } from './start/children.mjs';
import { clearHalfMade, makeDemoWorldOnce } from './start/demo-world.mjs';
import { claimRun, noteRun, releaseRun } from './start/run-file.mjs';
import { checkPorts, readSettings } from './start/settings.mjs';

const began = Date.now();
const seconds = (since = began) => Math.round((Date.now() - since) / 1000);
const children = new Children();
let cluster;

async function bringUp(settings) {
  const { own, port, ports } = settings;
  const env = { ...settings.env };
  const stay = async (name, more, options) => {
    await children.stay(name, bundle(name), { ...env, ...more }, options);
    noteRun(children.pids);
  };

  const client = timed('client built', () =>
    buildClient((command, args, log) => children.step('client build', command, args, { log, env })),
  );
  // Its failure is reported where it is awaited, below; until then it must not count as unhandled.
  client.catch(() => undefined);
  await buildServer();
  if (own.mail || own.files) {
    const where = {
      LOCAL_DATA: local,
      LOCAL_SMTP_PORT: ports.smtp ?? 0,
      LOCAL_INBOX_PORT: ports.inbox ?? 0,
      LOCAL_S3_PORT: ports.files ?? 0,
    };
    await stay('services', where, { saysReady: true });
  }
  if (own.cluster) {
    cluster = startCluster(ports.database);
    const { appUrl, ownerUrl, adminUrl } = await cluster;
    env.DATABASE_URL = appUrl;
    env.DATABASE_OWNER_URL = ownerUrl;
    await clearHalfMade(adminUrl);
    await runBundle('migrate', ['up'], env, 'The database cannot be migrated');
    await timed('demo world made', () =>
      makeDemoWorldOnce(adminUrl, () =>
        runBundle('demo', [], env, 'The demo world cannot be made'),
      ),
    );
  } else {
    await runBundle('migrate', ['up'], env, 'The database cannot be migrated');
  }
  await client;
  // The running product has no business with the owner's rights.
  delete env.DATABASE_OWNER_URL;
  await stay('server');
  await stay('worker');
  await untilReady(port);
  await announce(settings, seconds());
}

async function timed(what, work) {
  const since = Date.now();
  if (await work()) say(`  ${what} (${seconds(since)} s)`);
}

async function runBundle(name, args, env, failure) {
  const log = join(local, 'logs', `${name}.log`);
  const code = await children.step(name, process.execPath, [bundle(name), ...args], { log, env });
  if (code !== 0) throw failureOf(failure, readFileSync(log, 'utf8'), log);
}

async function untilReady(port) {
  const patience = 60_000;
  const since = Date.now();
  for (;;) {
    const reply = await fetch(`http://127.0.0.1:${port}/health/ready`, {
      signal: AbortSignal.timeout(2_000),
    }).catch(() => undefined);
    await reply?.arrayBuffer();
    if (reply?.ok) return;
    if (Date.now() - since > patience) {
      throw new Failure(`The server does not get ready; see ${join(local, 'logs/server.log')}.`);
    }
    await wait(100);
  }
}

async function takeDown() {
  await children.stop(['server', 'worker', 'services']);
  if (!cluster) return;
  await cluster.catch(() => undefined);
  stopCluster();
}

// A terminal that was closed cannot be written to; that is no reason to leave things running.
process.stdout.on('error', () => undefined);
const asked = new Promise((resolve) => {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => resolve(signal));
});

let claimed = false;
let code = 0;
try {
  checkGround();
  const settings = readSettings();
  await claimRun();
  claimed = true;
  const { database, ...others } = settings.ports;
  // A cluster that a killed start left running is taken over, whatever its port is.
  const adopted = settings.own.cluster && clusterRunning() === database;
  await checkPorts(adopted ? others : settings.ports);
  say('Vatwright is starting …');
  const up = bringUp(settings);
  up.catch(() => undefined);
  const failed = children.crashed.then((failure) => Promise.reject(failure));
  await Promise.race([up.then(() => Promise.race([asked, failed])), asked, failed]);
  say('\nStopping …');
} catch (error) {
  if (!(error instanceof Stopped)) {
    process.stderr.write(`${error instanceof Failure ? error.message : error.stack}\n`);
    code = 1;
  }
}
try {
  await takeDown();
} catch (error) {
  process.stderr.write(`${error.message}\n`);
  code = 1;
}
if (claimed) releaseRun();
process.exit(code);
