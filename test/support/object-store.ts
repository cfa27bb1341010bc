import { mkdtemp, rm } from 'node:fs/promises';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { s3Fake } from '../../deploy/local/s3-fake';

/** A spec's own object store on a free port. */
export interface TestObjectStore {
  readonly url: string;
  close(): Promise<void>;
}

/**
 * Starts the local object store and names it to the application: call it before `testApp`, and close
 * it after the application.
 */
export async function testObjectStore(): Promise<TestObjectStore> {
  const directory = await mkdtemp(join(tmpdir(), 'vatwright-files-'));
  const port = await freePort();
  const store = s3Fake(port, directory);
  await store.run();
  const url = `http://127.0.0.1:${port}`;
  process.env['VATWRIGHT_TEST_S3'] = url;
  return {
    url,
    close: async () => {
      delete process.env['VATWRIGHT_TEST_S3'];
      await store.close();
      await rm(directory, { recursive: true, force: true });
    },
  };
}

function freePort(): Promise<number> {
  return new Promise((done, fail) => {
    const probe = createServer();
    probe.on('error', fail);
    probe.listen(0, '127.0.0.1', () => {
      const { port } = probe.address() as { port: number };
      probe.close(() => done(port));
    });
  });
}
