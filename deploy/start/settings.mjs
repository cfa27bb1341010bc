import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { Failure } from '../../db/cluster-failure.mjs';
import { local } from '../prepare/ground.mjs';

/**
 * What to run and with which settings: the environment's where it says something, a local stand-by
 * where it says nothing.
 */
export function readSettings(env = process.env) {
  const port = Number(env.PORT ?? 4310);
  if (!Number.isInteger(port) || port < 1 || port > 65531) {
    throw new Failure(`PORT must be a whole number from 1 to 65531, and it is ${env.PORT}.`);
  }
  if (env.DATABASE_URL && !env.DATABASE_OWNER_URL) {
    throw new Failure('DATABASE_URL is set: set DATABASE_OWNER_URL too, for the migrations.');
  }
  const own = {
    cluster: !env.DATABASE_URL,
    mail: !env.SMTP_URL,
    files: !env.S3_BUCKET,
  };
  const ports = { application: port };
  if (own.cluster) ports.database = port + 1;
  if (own.mail) Object.assign(ports, { smtp: port + 2, inbox: port + 3 });
  if (own.files) ports.files = port + 4;
  return { port, own, ports, env: environment(env, port, own) };
}

function environment(env, port, own) {
  return {
    ...env,
    NODE_ENV: env.NODE_ENV ?? 'development',
    PORT: String(port),
    // Node 20 is what the product is made for; the reminder would fill the logs.
    AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true',
    SESSION_SECRET: env.SESSION_SECRET ?? sessionSecret(),
    ...(own.mail && { SMTP_URL: `smtp://127.0.0.1:${port + 2}` }),
    ...(own.files && {
      S3_ENDPOINT: `http://127.0.0.1:${port + 4}`,
      S3_BUCKET: 'vatwright-uploads',
      S3_ACCESS_KEY_ID: 'S3RVER',
      S3_SECRET_ACCESS_KEY: 'S3RVER',
    }),
  };
}

/** Kept, so that a restart signs nobody out. */
function sessionSecret() {
  const file = join(local, 'session-secret');
  if (!existsSync(file)) writeFileSync(file, randomBytes(32).toString('hex'), { mode: 0o600 });
  return readFileSync(file, 'utf8');
}

/** Fails with one line that names every port that cannot be had. */
export async function checkPorts(ports) {
  const faults = [];
  for (const [use, port] of Object.entries(ports)) {
    // The application listens on every address, the rest on loopback.
    const code = await probe(port, use === 'application' ? undefined : '127.0.0.1');
    if (code === 'EACCES') faults.push(`${port} (${use}) is not open to this user`);
    else if (code) faults.push(`${port} (${use}) is taken by another program`);
  }
  if (faults.length === 0) return;
  throw new Failure(`Port ${faults.join(', port ')}. Choose others: PORT=4400 npm start`);
}

function probe(port, host) {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', (error) => resolve(error.code ?? 'unknown'));
    server.listen(port, host, () => server.close(() => resolve(undefined)));
  });
}
