import { sqlMigration, tenantTable } from './migration';

/** Procedures and their versions. What is published stays as it was: a trigger sees to it. */
export const createProcedures = sqlMigration(
  '20261201090400-create-procedures',
  `
    CREATE TABLE procedures (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      code text NOT NULL CHECK (code <> ''),
      retired_at timestamptz,
      version integer NOT NULL DEFAULT 0,
      UNIQUE (organisation_id, code)
    );
    CREATE TABLE procedure_versions (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      procedure_id uuid NOT NULL REFERENCES procedures,
      number integer NOT NULL CHECK (number > 0),
      content jsonb NOT NULL,
      published_at timestamptz,
      published_by uuid REFERENCES people,
      version integer NOT NULL DEFAULT 0,
      UNIQUE (procedure_id, number)
    );
    -- At most one draft at a time.
    CREATE UNIQUE INDEX procedure_draft ON procedure_versions (procedure_id) WHERE published_at IS NULL;

    CREATE FUNCTION refuse_change_of_published() RETURNS trigger LANGUAGE plpgsql AS $$
      BEGIN
        IF OLD.published_at IS NOT NULL THEN
          RAISE EXCEPTION 'A published procedure version never changes' USING ERRCODE = 'VW001';
        END IF;
        RETURN coalesce(NEW, OLD);
      END
    $$;
    CREATE TRIGGER published_stays BEFORE UPDATE OR DELETE ON procedure_versions
      FOR EACH ROW EXECUTE FUNCTION refuse_change_of_published();
    ${['procedures', 'procedure_versions'].map((table) => tenantTable(table)).join('\n')}
  `,
  `
    DROP TABLE procedure_versions, procedures;
    DROP FUNCTION refuse_change_of_published;
  `,
);
