import { sqlMigration, tenantTable } from './migration';

/**
 * Files brought in, with what their columns hold, and what is wrong with their rows. How far one has
 * come is told by its long job.
 */
export const createImports = sqlMigration(
  '20261201091400-create-imports',
  `
    CREATE TABLE imports (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      kind text NOT NULL CHECK (kind IN ('chains', 'regions', 'stores', 'units', 'components')),
      storage_key text NOT NULL UNIQUE,
      file_name text NOT NULL,
      file_bytes integer NOT NULL,
      format text NOT NULL CHECK (format IN ('csv', 'xlsx')),
      columns jsonb NOT NULL,
      date_order text NOT NULL CHECK (date_order IN ('mdy', 'dmy')),
      job_id uuid REFERENCES long_jobs,
      checked jsonb,
      mode text CHECK (mode IN ('all-or-nothing', 'good-rows')),
      version integer NOT NULL DEFAULT 0,
      created_by uuid NOT NULL REFERENCES people,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX ON imports (organisation_id, created_at DESC);
    CREATE TABLE import_problems (
      id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      import_id uuid NOT NULL REFERENCES imports ON DELETE CASCADE,
      row_number integer NOT NULL,
      field text,
      reason text NOT NULL,
      value text NOT NULL,
      params jsonb NOT NULL DEFAULT '{}'
    );
    CREATE INDEX ON import_problems (import_id, row_number, id);
    ${['imports', 'import_problems'].map((table) => tenantTable(table)).join('\n')}
  `,
  `DROP TABLE import_problems, imports;`,
);
