import { sqlMigration, tenantTable } from './migration';

/**
 * Counts of closed windows by store, rule and the local day the window closed: what compliance reads
 * instead of tasks. A day in stale_days waits to be counted again. Digests are kept as sent.
 */
export const createCompliance = sqlMigration(
  '20261201091000-create-compliance',
  `
    CREATE TABLE compliance_days (
      organisation_id uuid NOT NULL REFERENCES organisations,
      store_id uuid NOT NULL REFERENCES stores,
      rule_id uuid NOT NULL REFERENCES rules,
      day date NOT NULL,
      on_time integer NOT NULL,
      late integer NOT NULL,
      not_done integer NOT NULL,
      excused integer NOT NULL,
      covered integer NOT NULL,
      PRIMARY KEY (store_id, day, rule_id)
    );
    CREATE INDEX ON compliance_days (organisation_id, day);
    CREATE TABLE stale_days (
      organisation_id uuid NOT NULL REFERENCES organisations,
      store_id uuid NOT NULL REFERENCES stores,
      day date NOT NULL,
      PRIMARY KEY (store_id, day)
    );
    CREATE TABLE digests (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      organisation_id uuid NOT NULL REFERENCES organisations,
      chain_id uuid NOT NULL REFERENCES chains,
      month date NOT NULL CHECK (extract(day FROM month) = 1),
      content jsonb NOT NULL,
      made_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (chain_id, month)
    );
    ${['compliance_days', 'stale_days', 'digests'].map((table) => tenantTable(table)).join('\n')}
    REVOKE UPDATE, DELETE ON digests FROM vatwright_app;
  `,
  `DROP TABLE digests, stale_days, compliance_days;`,
);
