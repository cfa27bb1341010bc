import { exportRowLimit } from '@shared/exports/export-format';
import { Problem } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';

const BATCH = 2_000;

const tooLong = () =>
  new Problem(422, 'too-many-rows', 'This list is too long for one file.', {
    detail: `A file can hold ${exportRowLimit} rows. Narrow the list by its filters.`,
  });

/**
 * The rows of a statement, a batch at a time, through a cursor of the transaction: a long list needs
 * no more memory than a short one.
 * @param present turns a row as read into the row as shown
 * @throws Problem 422 past the limit of a file.
 */
export async function* cursorBatches<Read extends object, Row>(
  tenant: Tenant,
  sql: string,
  values: unknown[],
  present: (row: Read) => Row,
): AsyncGenerator<Row[]> {
  await tenant.rows(`DECLARE of_file NO SCROLL CURSOR FOR ${sql}`, values);
  for (let count = 0; ;) {
    const rows = await tenant.rows<Read>(`FETCH ${BATCH} FROM of_file`);
    count += rows.length;
    if (count > exportRowLimit) throw tooLong();
    if (rows.length > 0) yield rows.map(present);
    if (rows.length < BATCH) break;
  }
  await tenant.rows('CLOSE of_file');
}

/**
 * The rows of a list that is read by pages: for lists that have a page query already.
 *
 * @example
 * pageBatches((page, pageSize) => pageOfTasks(tenant, actor, { ...filters, page, pageSize }))
 * @throws Problem 422 past the limit of a file.
 */
export async function* pageBatches<Row>(
  read: (page: number, pageSize: number) => Promise<{ rows: readonly Row[]; total: number }>,
): AsyncGenerator<readonly Row[]> {
  for (let page = 1; ; page += 1) {
    const { rows, total } = await read(page, BATCH);
    if (total > exportRowLimit) throw tooLong();
    if (rows.length > 0) yield rows;
    if (rows.length < BATCH) return;
  }
}

/** Rows that are in memory already. */
export async function* oneBatch<Row>(rows: readonly Row[]): AsyncGenerator<readonly Row[]> {
  yield rows;
}
