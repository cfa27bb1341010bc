import type { QueryInterface } from 'sequelize';

/** One dated, reversible step with one intent. Each runs in a transaction of its own. */
export interface Migration {
  readonly name: string;
  up(on: QueryInterface): Promise<void>;
  down(on: QueryInterface): Promise<void>;
}

/** A migration written as the two pieces of SQL it consists of. */
export function sqlMigration(name: string, up: string, down: string): Migration {
  return {
    name,
    up: async ({ sequelize }) => {
      await sequelize.transaction((transaction) => sequelize.query(up, { transaction }));
    },
    down: async ({ sequelize }) => {
      await sequelize.transaction((transaction) => sequelize.query(down, { transaction }));
    },
  };
}

/**
 * Row-level security for a tenant table: the application's role sees and writes only rows of the
 * organisation that the transaction named by `set_config('app.organisation_id', …, true)`; without
 * one it sees nothing. The setting stands in a subquery, which is worked out once for a statement and
 * not for every row.
 */
export function tenantTable(table: string, grants = 'SELECT, INSERT, UPDATE, DELETE'): string {
  return `
    ALTER TABLE ${table} ENABLE ROW LEVEL SECURITY;
    CREATE POLICY own_organisation ON ${table}
      USING (organisation_id
        = (SELECT nullif(current_setting('app.organisation_id', true), '')::uuid));
    GRANT ${grants} ON ${table} TO vatwright_app;
  `;
}
