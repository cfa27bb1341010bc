import { existsSync, mkdirSync, readdirSync, renameSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { Failure } from '../../db/cluster-failure.mjs';
import { local } from './ground.mjs';
import { runLogged } from './run-logged.mjs';

export const isRoot = process.getuid?.() === 0;
const quiet = { ...process.env, DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C.UTF-8' };

function needApt(what) {
  if (existsSync('/usr/bin/apt-get')) return;
  throw new Failure(`${what} is missing and this is not a Debian machine: please install it.`);
}

/** Installs Debian packages for the whole machine. Root only. */
export function installPackages(what, names, log) {
  needApt(what);
  const task = `Installing ${what} from Debian's packages`;
  runLogged(task, 'apt-get', ['-q', 'update'], { log, env: quiet });
  const args = ['-q', '-y', '--no-install-recommends', '-o', 'DPkg::Lock::Timeout=120', 'install'];
  runLogged(task, 'apt-get', [...args, ...names], { log, env: quiet });
}

/**
 * Unpacks Debian packages, and those they need that the machine lacks, into a folder: all that a
 * user without root's rights can do. The lists are private ones, as the machine's may be missing or
 * old.
 */
export function unpackPackages(what, names, into, log) {
  needApt(what);
  const task = `Unpacking ${what} from Debian's packages`;
  const apt = join(local, 'apt');
  const files = join(apt, 'archives');
  // Unpacked aside and renamed, so that an interrupted start leaves nothing that looks complete.
  const aside = `${into}.new`;
  rmSync(aside, { recursive: true, force: true });
  for (const folder of [join(apt, 'lists/partial'), join(files, 'partial'), aside]) {
    mkdirSync(folder, { recursive: true });
  }
  const options = {
    'Dir::State::Lists': join(apt, 'lists'),
    'Dir::Cache': apt,
    'Dir::Cache::Archives': files,
    'Debug::NoLocking': '1',
    'APT::Sandbox::User': '',
    'APT::Install-Recommends': '0',
  };
  const settings = Object.entries(options).flatMap(([name, value]) => ['-o', `${name}=${value}`]);
  const run = (args, cwd) =>
    runLogged(task, 'apt-get', [...settings, ...args], { log, env: quiet, cwd });
  run(['-q', 'update']);
  const plan = run(['-s', '-y', 'install', ...names]);
  const wanted = [...plan.matchAll(/^Inst (\S+) /gm)].map(([, name]) => name);
  run(['-q', 'download', ...wanted], files);
  for (const file of readdirSync(files).filter((it) => it.endsWith('.deb'))) {
    runLogged(task, 'dpkg', ['-x', join(files, file), aside], { log, env: quiet });
  }
  rmSync(into, { recursive: true, force: true });
  renameSync(aside, into);
  rmSync(apt, { recursive: true, force: true });
}
