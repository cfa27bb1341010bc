import { sqlMigration, tenantTable } from './migration';

const tables = ['programmes', 'rules', 'rule_revisions', 'enrolments', 'schedules'];

/**
 * Programmes group rules; enrolment puts places under a programme; a schedule is one rule applied to
 * one unit, or to one store where the rule applies to stores.
 */
export const createProgrammes = sqlMigration(
  '20261201090500-create-programmes',
  `
    CREATE TABLE programmes (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      name text NOT NULL CHECK (name <> ''),
      description text NOT NULL DEFAULT '',
      retired_at timestamptz,
      version integer NOT NULL DEFAULT 0,
      UNIQUE (organisation_id, name)
    );
    CREATE TABLE rules (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      programme_id uuid NOT NULL REFERENCES programmes,
      procedure_id uuid NOT NULL REFERENCES procedures,
      name text NOT NULL CHECK (name <> ''),
      audience text NOT NULL CHECK (audience IN ('technician', 'store')),
      applies_to text NOT NULL CHECK (applies_to IN ('unit', 'store')),
      unit_kind text CHECK (unit_kind IN ('built-in', 'portable')),
      pump_face text CHECK (pump_face IN ('drain-slot', 'gasket')),
      -- {startsLocal, rrules[], rdates[], exdates[]}: wall-clock times in the store's own zone.
      recurrence jsonb NOT NULL,
      -- {kind: 'days' | 'hours', before, after, late, dueSoon}
      time_window jsonb NOT NULL,
      horizon_days integer NOT NULL DEFAULT 60 CHECK (horizon_days BETWEEN 1 AND 400),
      rank integer NOT NULL DEFAULT 0,
      revision integer NOT NULL DEFAULT 1,
      retired_at timestamptz,
      version integer NOT NULL DEFAULT 0,
      UNIQUE (programme_id, name)
    );
    -- History keeps the revision a task was done under.
    CREATE TABLE rule_revisions (
      organisation_id uuid NOT NULL REFERENCES organisations,
      rule_id uuid NOT NULL REFERENCES rules,
      revision integer NOT NULL,
      definition jsonb NOT NULL,
      made_by uuid REFERENCES people,
      made_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (rule_id, revision)
    );
    CREATE TABLE enrolments (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      programme_id uuid NOT NULL REFERENCES programmes,
      scope_kind text NOT NULL CHECK (scope_kind IN ('chain', 'region', 'store', 'unit')),
      scope_id uuid NOT NULL,
      -- An exception takes its place out of what a wider enrolment put in.
      exception boolean NOT NULL DEFAULT false,
      from_on date NOT NULL,
      until_on date CHECK (until_on >= from_on),
      version integer NOT NULL DEFAULT 0,
      UNIQUE (programme_id, scope_kind, scope_id, exception)
    );
    CREATE TABLE schedules (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      organisation_id uuid NOT NULL REFERENCES organisations,
      rule_id uuid NOT NULL REFERENCES rules,
      store_id uuid NOT NULL REFERENCES stores,
      unit_id uuid REFERENCES units,
      from_on date NOT NULL,
      -- The last day for which its enrolment stands, where that is known; null: until further notice.
      until_on date,
      ended_at timestamptz,
      -- Occurrences before this wall-clock moment, under this revision, are written.
      generated_to timestamp,
      generated_revision integer
    );
    CREATE UNIQUE INDEX schedule_of_unit ON schedules (rule_id, unit_id) WHERE unit_id IS NOT NULL;
    CREATE UNIQUE INDEX schedule_of_store ON schedules (rule_id, store_id) WHERE unit_id IS NULL;
    CREATE INDEX ON schedules (store_id);
    ${tables.map((table) => tenantTable(table)).join('\n')}
    REVOKE UPDATE, DELETE ON rule_revisions FROM vatwright_app;
  `,
  `DROP TABLE schedules, enrolments, rule_revisions, rules, programmes;`,
);
