import { randomUUID } from 'node:crypto';
import type { Readable } from 'node:stream';
import {
  DeleteObjectCommand,
  GetObjectCommand,
  NoSuchKey,
  PutObjectCommand,
} from '@aws-sdk/client-s3';
import { Problem, notFound } from '@shared/problem';
import type { Services } from '../http/services';

/** The object store cannot be reached just now. */
const unreachable = () =>
  new Problem(503, 'files-unreachable', 'Files cannot be reached just now. Try again shortly.');

/**
 * Files kept in the S3-compatible store of the settings.
 *
 * Keys are made by {@link newFileKey} alone, never from what a person sent, and start with the
 * organisation, so that a key from elsewhere is seen at once.
 */
export class FileStore {
  constructor(private readonly services: Pick<Services, 'files' | 'config'>) {}

  /** Keeps bytes under a new key. @throws Problem 503 when the store cannot be reached. */
  async put(key: string, bytes: Buffer, contentType: string): Promise<void> {
    await this.asked(
      this.services.files.send(
        new PutObjectCommand({
          Bucket: this.bucket,
          Key: key,
          Body: bytes,
          ContentType: contentType,
          ContentLength: bytes.length,
        }),
      ),
    );
  }

  /** A file as a stream. @throws Problem 404 when it is gone, 503 when the store is out of reach. */
  async open(key: string): Promise<Readable> {
    const got = await this.asked(
      this.services.files.send(new GetObjectCommand({ Bucket: this.bucket, Key: key })),
    );
    return got.Body as Readable;
  }

  /** A whole file, for those whose size was bounded when they were taken in. */
  async read(key: string): Promise<Buffer> {
    const chunks: Buffer[] = [];
    for await (const chunk of await this.open(key)) chunks.push(chunk as Buffer);
    return Buffer.concat(chunks);
  }

  /** Removes a file; one that is gone already is no fault. */
  async remove(key: string): Promise<void> {
    await this.asked(
      this.services.files.send(new DeleteObjectCommand({ Bucket: this.bucket, Key: key })),
    );
  }

  private get bucket(): string {
    return this.services.config.S3_BUCKET;
  }

  private async asked<T>(answer: Promise<T>): Promise<T> {
    try {
      return await answer;
    } catch (error) {
      if (error instanceof NoSuchKey) throw notFound('file');
      throw Object.assign(unreachable(), { cause: error });
    }
  }
}

/** A key that nobody can guess: `<organisation>/<purpose>/<random>`. */
export const newFileKey = (organisationId: string, purpose: 'photo' | 'import') =>
  `${organisationId}/${purpose}/${randomUUID()}`;
