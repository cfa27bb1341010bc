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
    -- Who finds a day already marked holds on to the mark until commit, so that the roll-up, which
    -- passes over marks that are held, never counts a day just before a change to it is committed.
    CREATE FUNCTION hold_stale_day() RETURNS trigger LANGUAGE plpgsql AS $$
      BEGIN
        PERFORM FROM stale_days WHERE store_id = NEW.store_id AND day = NEW.day FOR KEY SHARE;
        RETURN NEW;
      END
    $$;
    CREATE TRIGGER hold_stale_day BEFORE INSERT ON stale_days
      FOR EACH ROW EXECUTE FUNCTION hold_stale_day();
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
  `
    DROP TABLE digests, stale_days, compliance_days;
    DROP FUNCTION hold_stale_day;
  `,
);
