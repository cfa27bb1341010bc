import { sqlMigration, tenantTable } from './migration';

/**
 * The outbox, the only way out: a letter is a row written in the business transaction, and its key
 * makes the same letter impossible to queue twice. A notice is what a person has been told about one
 * task; it is written with the letter that tells it.
 */
export const createMail = sqlMigration(
  '20261201090900-create-mail',
  `
    CREATE TABLE letters (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      organisation_id uuid NOT NULL REFERENCES organisations,
      person_id uuid REFERENCES people,
      kind text NOT NULL,
      dedupe_key text NOT NULL UNIQUE,
      to_address text NOT NULL,
      locale text NOT NULL DEFAULT 'en' CHECK (locale IN ('en', 'es')),
      subject text NOT NULL,
      html text NOT NULL,
      plain text NOT NULL,
      state text NOT NULL DEFAULT 'queued' CHECK (state IN ('queued', 'sent', 'dead')),
      attempts integer NOT NULL DEFAULT 0,
      next_attempt_at timestamptz NOT NULL DEFAULT now(),
      leased_until timestamptz,
      last_error text,
      created_at timestamptz NOT NULL DEFAULT now(),
      sent_at timestamptz
    );
    CREATE INDEX ON letters (next_attempt_at) WHERE state = 'queued';
    CREATE INDEX ON letters (organisation_id, created_at DESC);
    CREATE INDEX ON letters (person_id, kind, created_at DESC);
    CREATE TABLE task_notices (
      organisation_id uuid NOT NULL REFERENCES organisations,
      person_id uuid NOT NULL REFERENCES people,
      task_id uuid NOT NULL,
      kind text NOT NULL CHECK (kind IN ('due-soon', 'overdue')),
      letter_id uuid NOT NULL REFERENCES letters,
      PRIMARY KEY (person_id, task_id, kind)
    );
    ${['letters', 'task_notices'].map((table) => tenantTable(table)).join('\n')}

    -- The sender serves every organisation, so it claims letters past row-level security.
    CREATE FUNCTION claim_letters(how_many integer, lease interval) RETURNS SETOF letters
      LANGUAGE sql SECURITY DEFINER SET search_path = public AS $$
        UPDATE letters SET attempts = attempts + 1, leased_until = now() + lease
        WHERE id IN (
          SELECT id FROM letters
          WHERE state = 'queued' AND next_attempt_at <= now()
            AND (leased_until IS NULL OR leased_until < now())
          ORDER BY next_attempt_at LIMIT how_many FOR UPDATE SKIP LOCKED)
        RETURNING *
      $$;
    CREATE FUNCTION all_organisations() RETURNS TABLE (id uuid, time_zone text)
      LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public AS $$
        SELECT id, time_zone FROM organisations ORDER BY id
      $$;
    REVOKE ALL ON FUNCTION claim_letters, all_organisations FROM PUBLIC;
    GRANT EXECUTE ON FUNCTION claim_letters, all_organisations TO vatwright_app;
  `,
  `
    DROP FUNCTION claim_letters, all_organisations;
    DROP TABLE task_notices, letters;
  `,
);
