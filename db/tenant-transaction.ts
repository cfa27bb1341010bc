import type { Sequelize, Transaction } from 'sequelize';
import { QueryTypes } from 'sequelize';

/** A transaction that sees one organisation's rows only; everything about a tenant runs in one. */
export interface Tenant {
  readonly organisationId: string;
  readonly sequelize: Sequelize;
  readonly transaction: Transaction;
  /** Rows of a statement with `$1…` placeholders. */
  rows<T extends object>(sql: string, values?: unknown[]): Promise<T[]>;
  /** The first row, or undefined. */
  row<T extends object>(sql: string, values?: unknown[]): Promise<T | undefined>;
}

/**
 * Runs work in a transaction bound to one organisation by row-level security. The setting is local
 * to the transaction, so a pooled connection carries nothing over to the next one.
 */
export function inTenant<T>(
  sequelize: Sequelize,
  organisationId: string,
  work: (tenant: Tenant) => Promise<T>,
): Promise<T> {
  return sequelize.transaction(async (transaction) => {
    const rows: Tenant['rows'] = <R extends object>(sql: string, values: unknown[] = []) =>
      sequelize.query<R>(sql, { bind: values, transaction, type: QueryTypes.SELECT });
    // Compiling a statement costs seconds where it spans the months of tasks, and running it does not.
    await rows(
      `SELECT set_config('app.organisation_id', $1, true), set_config('jit', 'off', true)`,
      [organisationId],
    );
    return work({
      organisationId,
      sequelize,
      transaction,
      rows,
      row: (async (sql, values = []) => (await rows(sql, values))[0]) as Tenant['row'],
    });
  });
}
