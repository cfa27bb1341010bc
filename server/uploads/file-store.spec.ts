import { randomUUID } from 'node:crypto';
import { S3Client } from '@aws-sdk/client-s3';
import { type TestObjectStore, testObjectStore } from '@test/support/object-store';
import type { Config } from '../config';
import { FileStore, newFileKey } from './file-store';

describe('the file store', () => {
  let objects: TestObjectStore;
  let files: S3Client;
  let store: FileStore;
  const clientOf = (endpoint: string) =>
    new S3Client({
      region: 'us-east-1',
      endpoint,
      forcePathStyle: true,
      maxAttempts: 1,
      requestChecksumCalculation: 'WHEN_REQUIRED',
      credentials: { accessKeyId: 'S3RVER', secretAccessKey: 'S3RVER' },
    });
  const config = { S3_BUCKET: 'vatwright-uploads' } as Config;

  beforeAll(async () => {
    objects = await testObjectStore();
    files = clientOf(objects.url);
    store = new FileStore({ files, config });
  });
  afterAll(async () => {
    files.destroy();
    await objects.close();
  });

  it('gives back what it was given, until that is removed', async () => {
    const organisationId = randomUUID();
    const key = newFileKey(organisationId, 'import');
    expect(key.startsWith(`${organisationId}/import/`)).toBe(true);
    const bytes = Buffer.from('chain,région\n');
    await store.put(key, bytes, 'text/csv');
    expect(await store.read(key)).toEqual(bytes);
    await store.remove(key);
    await store.remove(key);
    await expect(store.read(key)).rejects.toMatchObject({ status: 404 });
  });

  it('says so when it cannot be reached', async () => {
    const nowhere = clientOf('http://127.0.0.1:1');
    const lost = new FileStore({ files: nowhere, config });
    await expect(lost.read('x')).rejects.toMatchObject({ status: 503, code: 'files-unreachable' });
    nowhere.destroy();
  });
});
