import { sqlMigration, tenantTable } from './migration';

const tables = [
  'compliance_days',
  'compliance_weeks',
  'compliance_months',
  'stale_days',
  'digests',
];

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
    -- The same counts by week (its Monday) and by month (its first day), for what spans more than days.
    CREATE TABLE compliance_weeks (LIKE compliance_days);
    ALTER TABLE compliance_weeks RENAME day TO week;
    ALTER TABLE compliance_weeks ADD PRIMARY KEY (store_id, week, rule_id);
    CREATE INDEX ON compliance_weeks (organisation_id, week);
    CREATE TABLE compliance_months (LIKE compliance_days);
    ALTER TABLE compliance_months RENAME day TO month;
    ALTER TABLE compliance_months ADD PRIMARY KEY (store_id, month, rule_id);
    CREATE INDEX ON compliance_months (organisation_id, month);
    -- Whoever writes days, weeks and months follow in the same statement: days put in are added, days
    -- taken out are taken off, and weeks and months that come to nothing go.
    CREATE FUNCTION follow_compliance_days() RETURNS trigger LANGUAGE plpgsql AS $$
      DECLARE sign integer := CASE TG_OP WHEN 'DELETE' THEN -1 ELSE 1 END;
      BEGIN
        INSERT INTO compliance_weeks AS w
          SELECT organisation_id, store_id, rule_id, date_trunc('week', day)::date, sign * sum(on_time),
            sign * sum(late), sign * sum(not_done), sign * sum(excused), sign * sum(covered)
          FROM changed GROUP BY 1, 2, 3, 4
          ON CONFLICT (store_id, week, rule_id) DO UPDATE SET on_time = w.on_time + excluded.on_time,
            late = w.late + excluded.late, not_done = w.not_done + excluded.not_done,
            excused = w.excused + excluded.excused, covered = w.covered + excluded.covered;
        INSERT INTO compliance_months AS m
          SELECT organisation_id, store_id, rule_id, date_trunc('month', day)::date, sign * sum(on_time),
            sign * sum(late), sign * sum(not_done), sign * sum(excused), sign * sum(covered)
          FROM changed GROUP BY 1, 2, 3, 4
          ON CONFLICT (store_id, month, rule_id) DO UPDATE SET on_time = m.on_time + excluded.on_time,
            late = m.late + excluded.late, not_done = m.not_done + excluded.not_done,
            excused = m.excused + excluded.excused, covered = m.covered + excluded.covered;
        IF TG_OP = 'DELETE' THEN
          DELETE FROM compliance_weeks w USING changed c
            WHERE w.store_id = c.store_id AND w.rule_id = c.rule_id
              AND w.week = date_trunc('week', c.day)::date
              AND w.on_time + w.late + w.not_done + w.excused + w.covered = 0;
          DELETE FROM compliance_months m USING changed c
            WHERE m.store_id = c.store_id AND m.rule_id = c.rule_id
              AND m.month = date_trunc('month', c.day)::date
              AND m.on_time + m.late + m.not_done + m.excused + m.covered = 0;
        END IF;
        RETURN NULL;
      END
    $$;
    CREATE TRIGGER days_put_in AFTER INSERT ON compliance_days REFERENCING NEW TABLE AS changed
      FOR EACH STATEMENT EXECUTE FUNCTION follow_compliance_days();
    CREATE TRIGGER days_taken_out AFTER DELETE ON compliance_days REFERENCING OLD TABLE AS changed
      FOR EACH STATEMENT EXECUTE FUNCTION follow_compliance_days();
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
    ${tables.map((table) => tenantTable(table)).join('\n')}
    -- A day counted anew is taken out and put in; a change in place would pass weeks and months by.
    REVOKE UPDATE ON compliance_days FROM vatwright_app;
    REVOKE UPDATE, DELETE ON digests FROM vatwright_app;
  `,
  `
    DROP TABLE digests, stale_days, compliance_months, compliance_weeks, compliance_days;
    DROP FUNCTION hold_stale_day, follow_compliance_days;
  `,
);
