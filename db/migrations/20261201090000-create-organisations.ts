import { sqlMigration } from './migration';

/** An installation serves several organisations; every other tenant table points here. */
export const createOrganisations = sqlMigration(
  '20261201090000-create-organisations',
  `
    CREATE TABLE organisations (
      id uuid PRIMARY KEY,
      name text NOT NULL CHECK (name <> ''),
      time_zone text NOT NULL,
      settings jsonb NOT NULL DEFAULT '{}',
      created_at timestamptz NOT NULL DEFAULT now()
    );
    ALTER TABLE organisations ENABLE ROW LEVEL SECURITY;
    CREATE POLICY own_organisation ON organisations
      USING (id = (SELECT nullif(current_setting('app.organisation_id', true), '')::uuid));
    GRANT SELECT, UPDATE ON organisations TO vatwright_app;
  `,
  `DROP TABLE organisations;`,
);
