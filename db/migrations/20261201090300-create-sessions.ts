import { sqlMigration } from './migration';

/**
 * Sessions belong to no organisation, as they are read before one is known. The column `person_id`
 * is derived from what passport keeps, so that all of a person's sessions can be ended at once.
 */
export const createSessions = sqlMigration(
  '20261201090300-create-sessions',
  `
    CREATE TABLE sessions (
      sid text PRIMARY KEY,
      sess json NOT NULL,
      expire timestamptz NOT NULL,
      person_id uuid GENERATED ALWAYS AS ((sess -> 'passport' -> 'user' ->> 'personId')::uuid) STORED
    );
    CREATE INDEX ON sessions (expire);
    CREATE INDEX ON sessions (person_id);
    GRANT SELECT, INSERT, UPDATE, DELETE ON sessions TO vatwright_app;
  `,
  `DROP TABLE sessions;`,
);
