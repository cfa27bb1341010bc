import { type ChildProcess, spawn } from 'node:child_process';
import { createServer } from 'node:net';

export interface BenchServer {
  readonly url: string;
  /** Signs in and gives back the cookies to send along. */
  signIn(email: string, password: string): Promise<string>;
  close(): Promise<void>;
}

/** The real server in a process of its own on a free port of loopback. */
export async function benchServer(databaseUrl: string): Promise<BenchServer> {
  const port = await freePort();
  const server = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
    stdio: ['ignore', 'ignore', 'inherit'],
    env: {
      ...process.env,
      NODE_ENV: 'development',
      LOG_LEVEL: 'fatal',
      PORT: String(port),
      DATABASE_URL: databaseUrl,
      SESSION_SECRET: 'a secret for benches alone, 32 chars and more',
      SMTP_URL: 'smtp://127.0.0.1:1',
      S3_BUCKET: 'vatwright-uploads',
      S3_ENDPOINT: 'http://127.0.0.1:1',
      S3_ACCESS_KEY_ID: 'S3RVER',
      S3_SECRET_ACCESS_KEY: 'S3RVER',
    },
  });
  const url = `http://127.0.0.1:${port}`;
  await untilReady(`${url}/health/live`, server);
  return {
    url: `${url}/api/v1`,
    signIn: (email, password) => signIn(`${url}/api/v1/session`, email, password),
    close: () =>
      new Promise((done) => {
        server.once('exit', () => done());
        server.kill('SIGTERM');
      }),
  };
}

async function untilReady(url: string, server: ChildProcess): Promise<void> {
  for (let tries = 0; tries < 300; tries += 1) {
    if (server.exitCode !== null) throw new Error('The server ended before it was ready.');
    const ready = await fetch(url).then(
      ({ ok }) => ok,
      () => false,
    );
    if (ready) return;
    await new Promise((done) => setTimeout(done, 200));
  }
  server.kill('SIGTERM');
  throw new Error('The server did not become ready within a minute.');
}

async function signIn(url: string, email: string, password: string): Promise<string> {
  const jar = new Map<string, string>();
  const keep = (reply: Response) => {
    for (const line of reply.headers.getSetCookie()) {
      const [pair = ''] = line.split(';');
      jar.set(pair.slice(0, pair.indexOf('=')), pair.slice(pair.indexOf('=') + 1));
    }
  };
  const cookie = () => [...jar].map(([name, value]) => `${name}=${value}`).join('; ');
  keep(await fetch(url));
  const reply = await fetch(url, {
    method: 'POST',
    headers: {
      'content-type': 'application/json',
      'x-xsrf-token': decodeURIComponent(jar.get('XSRF-TOKEN') ?? ''),
      cookie: cookie(),
    },
    body: JSON.stringify({ email, password }),
  });
  if (!reply.ok) throw new Error(`Nobody could sign in as ${email}: ${reply.status}`);
  keep(reply);
  return cookie();
}

function freePort(): Promise<number> {
  return new Promise((done, fail) => {
    const probe = createServer().once('error', fail);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() => done(typeof address === 'object' && address ? address.port : 0));
    });
  });
}
