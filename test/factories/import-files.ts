import { randomUUID } from 'node:crypto';
import { workLongJobs } from '@jobs/long-jobs/work-long-jobs';
import { longJobHandlers } from '@jobs/long-jobs/long-job-handlers';
import type { Browser, TestApp } from '@test/support/test-app';

/** A CSV file of these rows. */
export const csv = (...rows: readonly (readonly (string | number)[])[]) =>
  Buffer.from(rows.map((row) => row.join(',')).join('\r\n'));

/** Sends a file to be imported. */
export function upload(browser: Browser, kind: string, file: Buffer, name = 'fleet.csv') {
  return browser.post(`/imports?id=${randomUUID()}&kind=${kind}`).attach('file', file, name);
}

/** Works all the long jobs that wait, as a worker would. */
export const work = (it_: TestApp, leaseSeconds = 60) =>
  workLongJobs(it_.services, { handlers: longJobHandlers, leaseSeconds, tries: 5 });

interface View {
  readonly id: string;
  readonly version: number;
  readonly dateOrder: string;
  readonly columns: readonly { readonly field: string | null }[];
}

/** Confirms what the columns are taken for and has the rows looked at. */
export async function check(it_: TestApp, browser: Browser, view: View) {
  const fields = view.columns.map(({ field }) => field);
  const { version, dateOrder } = view;
  await browser.post(`/imports/${view.id}/check`, { version, fields, dateOrder }).expect(200);
  await work(it_);
  return (await browser.get(`/imports/${view.id}`).expect(200)).body;
}

/** Uploads and checks a file. */
export async function uploadAndCheck(it_: TestApp, browser: Browser, kind: string, file: Buffer) {
  const { body } = await upload(browser, kind, file).expect(200);
  return check(it_, browser, body);
}

/** Uploads, checks and takes in a file. */
export async function takeIn(
  it_: TestApp,
  browser: Browser,
  kind: string,
  file: Buffer,
  mode = 'all-or-nothing',
) {
  const { id, version } = await uploadAndCheck(it_, browser, kind, file);
  await browser.post(`/imports/${id}/start`, { version, mode }).expect(200);
  await work(it_);
  return (await browser.get(`/imports/${id}`).expect(200)).body;
}
