declare module '@20minutes/s3rver' {
  /** Only what this project uses: the package ships no types. */
  export default class S3rver {
    constructor(options: {
      address: string;
      port: number;
      silent: boolean;
      directory: string;
      vhostBuckets: boolean;
      configureBuckets: readonly { name: string }[];
    });
    run(): Promise<unknown>;
    close(): Promise<void>;
  }
}
