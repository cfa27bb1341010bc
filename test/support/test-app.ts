import { S3Client } from '@aws-sdk/client-s3';
import type { Express } from 'express';
import { Pool } from 'pg';
import { pino } from 'pino';
import supertest from 'supertest';
import { readConfig } from '@server/config';
import { createApp } from '@server/create-app';
import type { Services } from '@server/http/services';
import { type TestDatabase, testDatabase } from './test-database';

export interface TestApp {
  readonly app: Express;
  readonly db: TestDatabase;
  readonly services: Services;
  /** Sets the clock that the application reads. */
  setNow(instant: string): void;
  /** A browser of its own: keeps cookies and sends the cross-site token with every write. */
  browser(): Browser;
  close(): Promise<void>;
}

export class Browser {
  private readonly agent;

  constructor(app: Express) {
    this.agent = supertest.agent(app);
  }

  private token = '';

  private async refreshToken(): Promise<void> {
    const reply = await this.agent.get('/api/v1/session');
    const cookies = reply.headers['set-cookie'] as unknown as string[] | undefined;
    const cookie = cookies?.find((it) => it.startsWith('XSRF-TOKEN='));
    if (cookie) this.token = decodeURIComponent(cookie.split(';')[0]?.slice(11) ?? '');
  }

  async signIn(email: string, password = demoPassword): Promise<this> {
    await this.refreshToken();
    const reply = await this.post('/session', { email, password });
    if (reply.status !== 200) throw new Error(`Sign-in failed: ${JSON.stringify(reply.body)}`);
    await this.refreshToken();
    return this;
  }

  get = (path: string) => this.agent.get(`/api/v1${path}`);
  post = (path: string, body?: object) => this.write('post', path, body);
  put = (path: string, body?: object) => this.write('put', path, body);
  patch = (path: string, body?: object) => this.write('patch', path, body);
  delete = (path: string, body?: object) => this.write('delete', path, body);

  private write(method: 'post' | 'put' | 'patch' | 'delete', path: string, body?: object) {
    const request = this.agent[method](`/api/v1${path}`).set('X-XSRF-TOKEN', this.token);
    return body === undefined ? request : request.send(body);
  }
}

/** The password of every person that the factories make. */
export const demoPassword = 'kelp amber steel 42';

/** The real application on a database of its own, with a clock that tests set. */
export async function testApp(): Promise<TestApp> {
  const db = await testDatabase();
  const config = readConfig({
    NODE_ENV: 'test',
    DATABASE_URL: db.appUrl,
    SESSION_SECRET: 'a secret for tests alone, 32 chars and more',
    SMTP_URL: 'smtp://127.0.0.1:1',
    S3_BUCKET: 'vatwright-uploads',
    S3_ACCESS_KEY_ID: 'S3RVER',
    S3_SECRET_ACCESS_KEY: 'S3RVER',
    S3_ENDPOINT: process.env['VATWRIGHT_TEST_S3'] ?? 'http://127.0.0.1:1',
  });
  let now: Date | undefined;
  const sessionPool = new Pool({ connectionString: db.appUrl, max: 2 });
  const services: Services = {
    config,
    sequelize: db.app,
    sessionPool,
    log: pino({ level: process.env['TEST_LOG_LEVEL'] ?? 'silent' }),
    files: new S3Client({
      region: config.S3_REGION,
      endpoint: config.S3_ENDPOINT,
      forcePathStyle: true,
      requestChecksumCalculation: 'WHEN_REQUIRED',
      credentials: { accessKeyId: 'S3RVER', secretAccessKey: 'S3RVER' },
    }),
    now: () => now ?? new Date(),
  };
  const app = createApp(services);
  return {
    app,
    db,
    services,
    setNow: (instant) => {
      now = new Date(instant);
    },
    browser: () => new Browser(app),
    close: async () => {
      services.files.destroy();
      await sessionPool.end();
      await db.close();
    },
  };
}
