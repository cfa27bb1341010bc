import { sqlMigration, tenantTable } from './migration';

/** People, the roles they hold and where, and the one-time links mailed to them. */
export const createPeople = sqlMigration(
  '20261201090200-create-people',
  `
    CREATE TABLE people (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      name text NOT NULL CHECK (name <> ''),
      email text CHECK (email = lower(email)),
      locale text NOT NULL DEFAULT 'en' CHECK (locale IN ('en', 'es')),
      time_zone text NOT NULL,
      -- What a technician's days begin at is kept as coarse as it was said: a ZIP code's middle.
      home_postal_code text,
      home_latitude double precision CHECK (home_latitude BETWEEN -90 AND 90),
      home_longitude double precision CHECK (home_longitude BETWEEN -180 AND 180),
      password_hash text,
      disabled_at timestamptz,
      version integer NOT NULL DEFAULT 0,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE UNIQUE INDEX people_email ON people (email);
    CREATE TABLE role_grants (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      person_id uuid NOT NULL REFERENCES people,
      role text NOT NULL CHECK (role IN ('regional-facility-manager', 'technician', 'store-manager',
        'shift-lead', 'account-owner', 'trainer', 'administrator')),
      scope_kind text NOT NULL CHECK (scope_kind IN ('organisation', 'chain', 'region', 'store')),
      scope_id uuid NOT NULL,
      UNIQUE (person_id, role, scope_kind, scope_id)
    );
    CREATE TABLE one_time_links (
      token_hash bytea PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      person_id uuid NOT NULL REFERENCES people,
      purpose text NOT NULL CHECK (purpose IN ('invitation', 'password-reset')),
      made_by uuid REFERENCES people,
      made_at timestamptz NOT NULL DEFAULT now(),
      expires_at timestamptz NOT NULL,
      used_at timestamptz
    );
    CREATE INDEX ON one_time_links (person_id, purpose);
    ${['people', 'role_grants', 'one_time_links'].map((table) => tenantTable(table)).join('\n')}

    -- Before sign-in no organisation is known, so these two look past row-level security, and give
    -- nothing but what the one question needs.
    CREATE FUNCTION find_sign_in(wanted text)
      RETURNS TABLE (person_id uuid, organisation_id uuid, password_hash text)
      LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public AS $$
        SELECT id, organisation_id, password_hash FROM people
        WHERE email = lower(wanted) AND disabled_at IS NULL
      $$;
    CREATE FUNCTION find_one_time_link(wanted bytea)
      RETURNS TABLE (person_id uuid, organisation_id uuid, purpose text, expires_at timestamptz,
        used_at timestamptz)
      LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public AS $$
        SELECT person_id, organisation_id, purpose, expires_at, used_at FROM one_time_links
        WHERE token_hash = wanted
      $$;
    REVOKE ALL ON FUNCTION find_sign_in, find_one_time_link FROM PUBLIC;
    GRANT EXECUTE ON FUNCTION find_sign_in, find_one_time_link TO vatwright_app;
  `,
  `
    DROP FUNCTION find_sign_in, find_one_time_link;
    DROP TABLE one_time_links, role_grants, people;
  `,
);
