import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { failureOf } from '../../db/cluster-failure.mjs';
import { findServer, unpacked } from '../../db/cluster-programs.mjs';
import { installPackages, isRoot, unpackPackages } from './debian.mjs';
import { say } from './ground.mjs';

const clusterSettings = '/etc/postgresql-common/createcluster.conf';

/** The PostgreSQL server from Debian's packages, where the machine has none. */
export function preparePostgres() {
  if (findServer()) return;
  say("Installing the PostgreSQL server from Debian's packages …");
  if (isRoot) {
    forbidMainCluster();
    installPackages('PostgreSQL', ['postgresql'], 'postgresql.log');
  } else {
    unpackPackages('PostgreSQL', ['postgresql'], unpacked, 'postgresql.log');
  }
}

/** Debian's package would make, and may start, a second cluster on port 5432. */
function forbidMainCluster() {
  const line = 'create_main_cluster = false';
  try {
    const text = existsSync(clusterSettings) ? readFileSync(clusterSettings, 'utf8') : '';
    if (/^\s*create_main_cluster\s*=/m.test(text)) return;
    mkdirSync('/etc/postgresql-common', { recursive: true });
    writeFileSync(clusterSettings, `${text}${text && !text.endsWith('\n') ? '\n' : ''}${line}\n`);
  } catch (error) {
    throw failureOf(`${clusterSettings} cannot be written`, error);
  }
}
