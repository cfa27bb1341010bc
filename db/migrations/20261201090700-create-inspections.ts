import { sqlMigration, tenantTable } from './migration';

const tables = ['uploads', 'inspections', 'readings', 'findings', 'repairs'];

/** What was seen and done: inspections with their readings and photos, findings, repairs. */
export const createInspections = sqlMigration(
  '20261201090700-create-inspections',
  `
    CREATE TABLE uploads (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      purpose text NOT NULL CHECK (purpose IN ('photo', 'import')),
      -- A photo shows one store, and whoever sees that store sees it.
      store_id uuid REFERENCES stores,
      storage_key text NOT NULL UNIQUE,
      thumbnail_key text,
      content_type text NOT NULL,
      bytes integer NOT NULL,
      width integer,
      height integer,
      uploaded_by uuid NOT NULL REFERENCES people,
      uploaded_at timestamptz NOT NULL DEFAULT now(),
      CHECK (purpose <> 'photo'
        OR (store_id IS NOT NULL AND thumbnail_key IS NOT NULL AND width > 0 AND height > 0))
    );
    CREATE INDEX ON uploads (uploaded_by, uploaded_at);
    CREATE TABLE inspections (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      task_id uuid NOT NULL,
      procedure_version_id uuid NOT NULL REFERENCES procedure_versions,
      store_id uuid NOT NULL REFERENCES stores,
      unit_id uuid REFERENCES units,
      person_id uuid NOT NULL REFERENCES people,
      started_at timestamptz,
      finished_at timestamptz NOT NULL,
      note text NOT NULL DEFAULT '',
      -- Undone, not deleted: who did what when is kept for good.
      undone_at timestamptz,
      undone_by uuid REFERENCES people
    );
    CREATE UNIQUE INDEX one_standing_inspection ON inspections (task_id) WHERE undone_at IS NULL;
    CREATE INDEX ON inspections (unit_id, finished_at);
    CREATE TABLE readings (
      organisation_id uuid NOT NULL REFERENCES organisations,
      inspection_id uuid NOT NULL REFERENCES inspections,
      step text NOT NULL,
      kind text NOT NULL CHECK (kind IN ('check', 'number', 'choice', 'text', 'photo')),
      number_value double precision,
      text_value text,
      unit text,
      limit_low double precision,
      limit_high double precision,
      within_limits boolean,
      photo_ids uuid[] NOT NULL DEFAULT '{}',
      PRIMARY KEY (inspection_id, step)
    );
    CREATE TABLE findings (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      store_id uuid NOT NULL REFERENCES stores,
      unit_id uuid REFERENCES units,
      component_id uuid REFERENCES components,
      component_kind text CHECK (component_kind IN ('pump', 'motor', 'pan', 'hose')),
      inspection_id uuid REFERENCES inspections,
      cause text NOT NULL,
      severity text NOT NULL CHECK (severity IN ('watch', 'plan', 'stop')),
      note text NOT NULL DEFAULT '',
      photo_ids uuid[] NOT NULL DEFAULT '{}',
      found_at timestamptz NOT NULL,
      found_by uuid NOT NULL REFERENCES people,
      settled_at timestamptz,
      settled_by uuid REFERENCES people,
      settled_note text,
      version integer NOT NULL DEFAULT 0
    );
    CREATE INDEX ON findings (store_id, found_at);
    CREATE INDEX ON findings (unit_id, found_at);
    CREATE TABLE repairs (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      finding_id uuid REFERENCES findings,
      unit_id uuid NOT NULL REFERENCES units,
      cause text NOT NULL,
      -- Kinds of component replaced: a pair shows as two.
      replaced text[] NOT NULL DEFAULT '{}',
      minutes integer CHECK (minutes >= 0),
      parts_cents integer NOT NULL DEFAULT 0 CHECK (parts_cents >= 0),
      labour_cents integer NOT NULL DEFAULT 0 CHECK (labour_cents >= 0),
      note text NOT NULL DEFAULT '',
      done_at timestamptz NOT NULL,
      done_by uuid NOT NULL REFERENCES people
    );
    CREATE INDEX ON repairs (unit_id, done_at);
    ${tables.map((table) => tenantTable(table)).join('\n')}
  `,
  `DROP TABLE repairs, findings, readings, inspections, uploads;`,
);
