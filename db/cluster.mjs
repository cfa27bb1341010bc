// PostgreSQL on loopback for this clone alone. Plain Node: it runs before any package is built.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { chownSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

const isRoot = process.getuid?.() === 0;

function programs() {
  const versions = existsSync('/usr/lib/postgresql') ? readdirSync('/usr/lib/postgresql') : [];
  const newest = versions.sort((a, b) => Number(b) - Number(a))[0];
  if (!newest) throw new Error('The PostgreSQL server is not installed.');
  return `/usr/lib/postgresql/${newest}/bin`;
}

/** PostgreSQL refuses to run as root, so as root its programs run as the user `postgres`. */
function run(program, args) {
  const line = [join(programs(), program), ...args];
  const [command, ...rest] = isRoot ? ['runuser', '-u', 'postgres', '--', ...line] : line;
  // No pipe may be handed down: the server would keep it open and the caller would wait for ever.
  const { status } = spawnSync(command, rest, { stdio: 'ignore', cwd: '/' });
  if (status !== 0) throw new Error(`${program} ended with status ${status}.`);
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

/**
 * A throw-away cluster for tests: quick, as it need not survive a crash.
 * @returns {Promise<{adminUrl: string, stop: () => Promise<void>}>}
 */
export async function startTestCluster() {
  const home = mkdtempSync(join(tmpdir(), 'vatwright-pg-'));
  const data = join(home, 'data');
  if (isRoot) {
    const id = (flag) => Number(spawnSync('id', [flag, 'postgres'], { encoding: 'utf8' }).stdout);
    chownSync(home, id('-u'), id('-g'));
  }
  run('initdb', [
    '-D',
    data,
    '-A',
    'trust',
    '-U',
    'postgres',
    '-E',
    'UTF8',
    '--locale=C.UTF-8',
    '--no-instructions',
    '--no-sync',
  ]);
  const port = await freePort();
  const settings = {
    listen_addresses: '127.0.0.1',
    unix_socket_directories: '',
    port,
    max_connections: 200,
    fsync: 'off',
    synchronous_commit: 'off',
    full_page_writes: 'off',
  };
  const options = Object.entries(settings).map(([name, value]) => `-c ${name}=${value}`);
  run('pg_ctl', ['-w', '-D', data, '-l', join(home, 'log'), '-o', options.join(' '), 'start']);
  return {
    adminUrl: `postgres://postgres@127.0.0.1:${port}/postgres`,
    stop: async () => {
      run('pg_ctl', ['-w', '-m', 'immediate', '-D', data, 'stop']);
      rmSync(home, { recursive: true, force: true });
    },
  };
}
