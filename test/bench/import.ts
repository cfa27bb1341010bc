import { randomUUID } from 'node:crypto';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { S3Client } from '@aws-sdk/client-s3';
import { pino } from 'pino';
import { QueryTypes } from 'sequelize';
import { guessFields } from '@shared/imports/guess-fields';
import { connect } from '@db/connect';
import { inTenant } from '@db/tenant-transaction';
import { longJobHandlers } from '@jobs/long-jobs/long-job-handlers';
import { workLongJobs } from '@jobs/long-jobs/work-long-jobs';
import { text } from '@server/exports/export-column';
import { oneBatch } from '@server/exports/read-batches';
import { writeXlsx } from '@server/exports/write-xlsx';
import { askLongJob } from '@server/long-jobs/ask-long-job';
import type { LongJobServices } from '@server/long-jobs/long-job';
import { FileStore, newFileKey } from '@server/uploads/file-store';
import { testObjectStore } from '@test/support/object-store';
import { benchDatabase } from './bench-database';
import { wholeNumber } from './bench-options';
import type { BenchReport } from './bench-report';

const headings = [
  'Chain',
  'Region',
  'Store number',
  'Store name',
  'Address',
  'ZIP code',
  'Unit',
  'Kind of unit',
  'Vats',
  'Oil (lb)',
  'Model',
  'Installed on',
  'Pump serial number',
  'Pump face',
  'Motor serial number',
  'Volts',
  'Amps',
];
const zips = ['60601', '85004', '33101', '98101', '10001', '80202'];
/** Seconds for each of check and import, and megabytes of the process above what it had before. */
const BAR = { seconds: 60, megabytes: 400 };

const rowOf = (at: number): string[] => {
  const store = Math.floor(at / 5);
  return [
    `Chain ${store % 4}`,
    `Region ${store % 12}`,
    String(store + 1).padStart(5, '0'),
    `Store ${store}`,
    `${store} Mill St`,
    zips[store % zips.length] ?? '',
    `F-${(at % 5) + 1}`,
    'Built-in filter',
    String((at % 4) + 1),
    '50',
    'Line 50',
    '2024-05-01',
    `P-${at}`,
    at % 2 ? 'Gasket' : 'Drain slot',
    `M-${at}`,
    '115',
    '6.8',
  ];
};

/**
 * Brings a file of units with stores and parts in, through the worker's own code, the object store and
 * PostgreSQL: check, import, and the same file again, as CSV and as XLSX.
 */
export async function benchImport(args: readonly string[]): Promise<BenchReport> {
  const count = wholeNumber(args, 'units', 30_000);
  const rows = Array.from({ length: count }, (_, at) => rowOf(at));
  const csv = Buffer.from([headings, ...rows].map((row) => row.join(',')).join('\r\n'));
  const xlsx = await asXlsx(rows);
  rows.length = 0;
  const objects = await testObjectStore();
  const database = await benchDatabase('bench_import', true);
  const sequelize = connect(database.appUrl, { poolSize: 4, statementTimeout: 120_000 });
  const owner = connect(database.ownerUrl, { poolSize: 1 });
  const files = filesAt(objects.url);
  const services = {
    config: { S3_BUCKET: 'vatwright-uploads' },
    sequelize,
    files,
    log: pino({ level: 'silent' }),
    now: () => new Date(),
  } as unknown as LongJobServices;
  try {
    const figures: { name: string; value: number; unit?: string }[] = [];
    let slowest = 0;
    let most = 0;
    for (const [format, bytes] of [
      ['csv', csv],
      ['xlsx', xlsx],
    ] as const) {
      const who = await organisationOf(owner, format);
      const rounds = [
        await round(services, who, format, bytes, `${format}: first`),
        await round(services, who, format, bytes, `${format}: repeated`),
      ];
      for (const it of rounds) {
        slowest = Math.max(slowest, it.check, it.take);
        most = Math.max(most, it.megabytes);
        if (it.rows !== count) throw new Error(`${it.rows} of ${count} rows came through.`);
        figures.push({ name: `${it.name}, check`, value: it.check, unit: 's' });
        figures.push({ name: `${it.name}, import`, value: it.take, unit: 's' });
        figures.push({ name: `${it.name}, units made`, value: it.made });
        figures.push({ name: `${it.name}, peak memory`, value: it.peak, unit: 'MB' });
      }
    }
    return {
      bench: 'import',
      bar: `each step within ${BAR.seconds} s, at most ${BAR.megabytes} MB above the start`,
      met: slowest <= BAR.seconds && most <= BAR.megabytes,
      figures: [
        { name: 'units in the file', value: count },
        { name: 'CSV file', value: Math.round(csv.length / 1e5) / 10, unit: 'MB' },
        { name: 'XLSX file', value: Math.round(xlsx.length / 1e5) / 10, unit: 'MB' },
        ...figures,
        { name: 'most memory above the start', value: most, unit: 'MB' },
      ],
    };
  } finally {
    await Promise.all([sequelize.close(), owner.close()]);
    files.destroy();
    await objects.close();
    await database.close();
  }
}

interface Who {
  readonly organisationId: string;
  readonly personId: string;
}

/** Checks and takes in a file once, and tells times and the most memory that was in use. */
async function round(
  services: LongJobServices,
  { organisationId, personId }: Who,
  format: 'csv' | 'xlsx',
  bytes: Buffer,
  name: string,
) {
  const id = randomUUID();
  const key = newFileKey(organisationId, 'import');
  await new FileStore(services).put(key, bytes, 'application/octet-stream');
  const fields = guessFields('units', headings);
  const columns = headings.map((heading, at) => ({ heading, samples: [], field: fields[at] }));
  await inTenant(services.sequelize, organisationId, (tenant) =>
    tenant.rows(
      `INSERT INTO imports (id, organisation_id, kind, storage_key, file_name, file_bytes, format,
         columns, date_order, mode, created_by)
       VALUES ($1, $2, 'units', $3, 'bench', $4, $5, $6, 'mdy', 'all-or-nothing', $7)`,
      [id, organisationId, key, bytes.length, format, JSON.stringify(columns), personId],
    ),
  );
  globalThis.gc?.();
  const before = process.memoryUsage().rss;
  let peak = before;
  const watching = setInterval(() => {
    peak = Math.max(peak, process.memoryUsage().rss);
  }, 20);
  const step = async (kind: string) => {
    const jobId = randomUUID();
    await inTenant(services.sequelize, organisationId, async (tenant) => {
      await askLongJob(tenant, { id: jobId, kind, input: { importId: id }, askedBy: personId });
    });
    const begun = performance.now();
    await workLongJobs(services, { handlers: longJobHandlers, leaseSeconds: 60, tries: 1 });
    const seconds = Math.round((performance.now() - begun) / 10) / 100;
    const result = await resultOf(services, organisationId, jobId);
    return { seconds, result };
  };
  const check = await step('import-check');
  const take = await step('import-rows');
  clearInterval(watching);
  const megabytes = (it: number) => Math.round(it / 1e6);
  return {
    name,
    check: check.seconds,
    take: take.seconds,
    rows: take.result.goodRows,
    made: take.result.units.made,
    peak: megabytes(peak),
    megabytes: megabytes(peak - before),
  };
}

async function resultOf(services: LongJobServices, organisationId: string, jobId: string) {
  const job = await inTenant(services.sequelize, organisationId, (tenant) =>
    tenant.row<{
      state: string;
      error: string | null;
      result: { goodRows: number; units: { made: number } };
    }>('SELECT state, error, result FROM long_jobs WHERE id = $1', [jobId]),
  );
  if (job?.state !== 'finished') throw new Error(job?.error ?? `The job is ${job?.state}.`);
  return job.result;
}

async function organisationOf(owner: ReturnType<typeof connect>, name: string): Promise<Who> {
  const [who] = await owner.query<Who>(
    `WITH o AS (INSERT INTO organisations (id, name, time_zone)
         VALUES (gen_random_uuid(), $1, 'America/Chicago') RETURNING id),
       p AS (INSERT INTO people (id, organisation_id, name, email, time_zone)
         SELECT gen_random_uuid(), id, 'Bench', $1 || '@bench.example', 'America/Chicago' FROM o
         RETURNING id, organisation_id)
     INSERT INTO role_grants (id, organisation_id, person_id, role, scope_kind, scope_id)
     SELECT gen_random_uuid(), organisation_id, id, 'administrator', 'organisation', organisation_id
     FROM p RETURNING organisation_id AS "organisationId", person_id AS "personId"`,
    { bind: [name], type: QueryTypes.SELECT },
  );
  return who as Who;
}

async function asXlsx(rows: readonly string[][]): Promise<Buffer> {
  const folder = await mkdtemp(join(tmpdir(), 'bench-import-'));
  const path = join(folder, 'units.xlsx');
  const columns = headings.map((heading, at) =>
    text<string[]>({ en: heading, es: heading }, (row) => row[at]),
  );
  await writeXlsx(path, columns, oneBatch(rows), { locale: 'en', timeZone: 'Etc/UTC' });
  const bytes = await readFile(path);
  await rm(folder, { recursive: true });
  return bytes;
}

const filesAt = (endpoint: string) =>
  new S3Client({
    region: 'us-east-1',
    endpoint,
    forcePathStyle: true,
    requestChecksumCalculation: 'WHEN_REQUIRED',
    credentials: { accessKeyId: 'S3RVER', secretAccessKey: 'S3RVER' },
  });
