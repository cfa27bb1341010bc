import { sqlMigration, tenantTable } from './migration';

/**
 * Idempotency keys make a repeated write answer as the first did; long jobs carry their lease and
 * progress in one row; the timetable remembers the last firing of each scheduled job.
 */
export const createWorkRecords = sqlMigration(
  '20261201091200-create-work-records',
  `
    CREATE TABLE idempotency_keys (
      organisation_id uuid NOT NULL REFERENCES organisations,
      person_id uuid NOT NULL REFERENCES people,
      key uuid NOT NULL,
      request_hash bytea NOT NULL,
      status integer NOT NULL,
      reply jsonb,
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (person_id, key)
    );
    CREATE INDEX ON idempotency_keys (created_at);
    CREATE TABLE long_jobs (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      kind text NOT NULL,
      input jsonb NOT NULL,
      state text NOT NULL DEFAULT 'waiting'
        CHECK (state IN ('waiting', 'running', 'finished', 'failed', 'cancelled')),
      done integer NOT NULL DEFAULT 0,
      total integer,
      result jsonb,
      error text,
      attempts integer NOT NULL DEFAULT 0,
      leased_until timestamptz,
      asked_by uuid NOT NULL REFERENCES people,
      created_at timestamptz NOT NULL DEFAULT now(),
      finished_at timestamptz
    );
    CREATE INDEX ON long_jobs (created_at) WHERE state IN ('waiting', 'running');
    ${['idempotency_keys', 'long_jobs'].map((table) => tenantTable(table)).join('\n')}
    CREATE TABLE timetable_firings (
      job text PRIMARY KEY,
      last_slot timestamptz NOT NULL
    );
    GRANT SELECT, INSERT, UPDATE ON timetable_firings TO vatwright_app;

    CREATE FUNCTION claim_long_job(lease interval) RETURNS SETOF long_jobs
      LANGUAGE sql SECURITY DEFINER SET search_path = public AS $$
        UPDATE long_jobs SET state = 'running', attempts = attempts + 1, leased_until = now() + lease
        WHERE id = (
          SELECT id FROM long_jobs
          WHERE state = 'waiting' OR (state = 'running' AND leased_until < now())
          ORDER BY created_at LIMIT 1 FOR UPDATE SKIP LOCKED)
        RETURNING *
      $$;
    REVOKE ALL ON FUNCTION claim_long_job FROM PUBLIC;
    GRANT EXECUTE ON FUNCTION claim_long_job TO vatwright_app;
  `,
  `
    DROP FUNCTION claim_long_job;
    DROP TABLE timetable_firings, long_jobs, idempotency_keys;
  `,
);
