import { S3Client } from '@aws-sdk/client-s3';
import { pino } from 'pino';
import { connect } from '@db/connect';
import { longJobHandlers } from '@jobs/long-jobs/long-job-handlers';
import { workLongJobs } from '@jobs/long-jobs/work-long-jobs';
import type { LongJobServices } from '@server/long-jobs/long-job';

/** A worker process of its own that works the long jobs there are, for specs that kill it. */
async function main(): Promise<void> {
  const sequelize = connect(process.env['DATABASE_URL'] as string, { poolSize: 4 });
  const files = new S3Client({
    region: 'us-east-1',
    endpoint: process.env['VATWRIGHT_TEST_S3'],
    forcePathStyle: true,
    requestChecksumCalculation: 'WHEN_REQUIRED',
    credentials: { accessKeyId: 'S3RVER', secretAccessKey: 'S3RVER' },
  });
  const services = {
    config: { S3_BUCKET: 'vatwright-uploads' },
    sequelize,
    files,
    log: pino({ level: 'silent' }),
    now: () => new Date(),
  } as unknown as LongJobServices;
  await workLongJobs(services, { handlers: longJobHandlers, leaseSeconds: 2, tries: 5 });
  await sequelize.close();
}

void main();
