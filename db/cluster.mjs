// PostgreSQL on loopback for this clone alone: one cluster that lasts, and throw-away ones for tests.
// `node db/cluster.mjs start|stop|status` handles the lasting one by itself.
import { spawnSync } from 'node:child_process';
import { closeSync, existsSync, openSync, readFileSync, readdirSync, renameSync } from 'node:fs';
import { rmSync, statSync } from 'node:fs';
import { createServer } from 'node:net';
import { dirname, join } from 'node:path';
import { Failure, failureOf } from './cluster-failure.mjs';
import { clearStalePid, clusterHome, running } from './cluster-home.mjs';
import { findServer, program, serverUser } from './cluster-programs.mjs';
import { prepareDatabase } from './cluster-roles.mjs';

export { Failure, program };

// Our statements are short: compiling them costs more than it saves.
const lasting = { listen_addresses: '127.0.0.1', unix_socket_directories: '', jit: 'off' };
// A test's data need not outlive a crash: 2,000 commits took 3.8 s with these on and 0.25 s off.
const throwAway = {
  ...lasting,
  max_connections: 200,
  fsync: 'off',
  synchronous_commit: 'off',
  full_page_writes: 'off',
};

/** The port of the lasting cluster: one above the application's. */
export function clusterPort(env = process.env) {
  return Number(env.PORT ?? 4310) + 1;
}

/** Runs one of PostgreSQL's programs with its output in a file of the cluster's folder. */
function run(server, user, home, name, args) {
  // No pipe may be handed down: the server would keep it open and the caller would wait for ever.
  const log = join(home, 'programs.log');
  const out = openSync(log, 'w');
  const served = sizeOf(serverLog(home));
  const { status, error } = spawnSync(join(server.bin, name), args, {
    ...user,
    cwd: '/',
    env: { ...process.env, ...server.env },
    stdio: ['ignore', out, out],
  });
  closeSync(out);
  if (status === 0) return;
  const why = existsSync(serverLog(home)) ? readFileSync(serverLog(home)).subarray(served) : '';
  const told = error ?? `${readFileSync(log, 'utf8')}\n${why}`;
  throw failureOf(`PostgreSQL's ${name} failed`, told, home);
}

const serverLog = (home) => join(home, 'server.log');
const sizeOf = (file) => (existsSync(file) ? statSync(file).size : 0);

/** The server that fits the data: PostgreSQL reads only data of its own major version. */
function serverFor(data) {
  const made = existsSync(join(data, 'PG_VERSION'))
    ? Number(readFileSync(join(data, 'PG_VERSION'), 'utf8'))
    : undefined;
  const server = findServer(made);
  if (server) return server;
  const other = findServer()?.version;
  throw new Failure(
    made && other
      ? `${data} was made by PostgreSQL ${made} and this machine has ${other}: install postgresql-${made}, or move the folder away to begin anew.`
      : 'The PostgreSQL server is not installed. Run node deploy/prepare.mjs start.',
  );
}

function initialise(server, user, home) {
  const data = join(home, 'data');
  if (existsSync(join(data, 'PG_VERSION'))) return;
  // Made aside and renamed, so that an interrupted start leaves nothing that looks complete.
  const aside = join(home, 'data.new');
  rmSync(aside, { recursive: true, force: true });
  const args = '-A trust -U postgres -E UTF8 --locale=C.UTF-8 --no-instructions --no-sync';
  run(server, user, home, 'initdb', ['-D', aside, ...args.split(' ')]);
  renameSync(aside, data);
}

async function start(home, user, port, settings) {
  const data = join(home, 'data');
  const server = serverFor(data);
  const live = running(data);
  if (live && live.port !== port) stopServer(server, user, home);
  if (!live || live.port !== port) {
    if (!(await isFree(port))) {
      throw new Failure(
        `Port ${port}, wanted for PostgreSQL, is taken. Choose others with PORT=….`,
      );
    }
    initialise(server, user, home);
    clearStalePid(data);
    const options = Object.entries({ ...settings, port }).map(([name, to]) => `-c ${name}=${to}`);
    const at = ['-D', data, '-l', serverLog(home), '-o', options.join(' ')];
    run(server, user, home, 'pg_ctl', ['-w', '-t', '60', '-s', ...at, 'start']);
  }
  const url = (role, database) => `postgres://${role}@127.0.0.1:${port}/${database}`;
  const adminUrl = url('postgres', 'postgres');
  await prepareDatabase(adminUrl);
  return {
    port,
    adminUrl,
    ownerUrl: url('vatwright_owner', 'vatwright'),
    appUrl: url('vatwright_app', 'vatwright'),
  };
}

function stopServer(server, user, home, mode = 'fast') {
  const data = join(home, 'data');
  if (!running(data)) return;
  run(server, user, home, 'pg_ctl', ['-w', '-t', '30', '-s', '-m', mode, '-D', data, 'stop']);
}

/**
 * Makes this clone's lasting cluster where it is missing and starts it where it is down.
 * @throws Failure with one line for a person
 */
export async function startCluster(port = clusterPort()) {
  const user = serverUser();
  const home = clusterHome('pg', user);
  const cluster = await start(home, user, port, lasting);
  return { ...cluster, stop: async () => stopCluster() };
}

/** Stops the lasting cluster, when it runs. */
export function stopCluster() {
  const user = serverUser();
  const home = clusterHome('pg', user);
  const data = join(home, 'data');
  if (running(data)) stopServer(serverFor(data), user, home);
}

/** The port on which the lasting cluster answers now, if it does. */
export function clusterRunning() {
  return running(join(clusterHome('pg', serverUser()), 'data'))?.port;
}

/**
 * Starts a cluster of its own for one run of tests, on a free port; `stop()` removes it.
 * Leftovers of runs that were killed are removed too.
 */
export async function startTestCluster() {
  const user = serverUser();
  const home = clusterHome(join('pg-test', String(process.pid)), user);
  sweep(dirname(home), user);
  const cluster = await start(home, user, await freePort(), throwAway);
  return { ...cluster, stop: async () => remove(home, user) };
}

function sweep(folder, user) {
  for (const name of readdirSync(folder)) {
    if (!existsSync(join('/proc', name))) remove(join(folder, name), user);
  }
}

function remove(home, user) {
  const data = join(home, 'data');
  if (running(data)) stopServer(serverFor(data), user, home, 'immediate');
  rmSync(home, { recursive: true, force: true });
}

function isFree(port) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen(port, '127.0.0.1', () => probe.close(() => resolve(true)));
  });
}

function freePort() {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const { port } = /** @type {import('node:net').AddressInfo} */ (probe.address());
      probe.close(() => resolve(port));
    });
  });
}

if (process.argv[1] === import.meta.filename) {
  const acts = {
    start: async () => (await startCluster()).ownerUrl,
    stop: () => stopCluster() ?? 'stopped',
    status: () => `${clusterRunning() ?? 'down'}`,
  };
  try {
    const act = acts[process.argv[2] ?? ''];
    if (!act) throw new Failure('Say start, stop or status.');
    process.stdout.write(`${await act()}\n`);
  } catch (error) {
    process.stderr.write(`${error instanceof Failure ? error.message : error.stack}\n`);
    process.exit(1);
  }
}
