import S3rver from '@20minutes/s3rver';

export const localBucket = 'vatwright-uploads';

/** An S3-compatible store on loopback that keeps its objects in a folder; signs in as S3RVER. */
export function s3Fake(port: number, directory: string): S3rver {
  return new S3rver({
    address: '127.0.0.1',
    port,
    silent: true,
    directory,
    // Buckets as host names would need a name server; the path says which one it is.
    vhostBuckets: false,
    configureBuckets: [{ name: localBucket }],
  });
}
