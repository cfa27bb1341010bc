import { sqlMigration, tenantTable } from './migration';

/**
 * Tasks, one row per occurrence of a schedule, partitioned by month of the occurrence's nominal local
 * time. That time never changes, so a deferral moves no row between partitions, and uniqueness on
 * (schedule, occurrence) lets any number of workers write the same occurrence once.
 */
export const createTasks = sqlMigration(
  '20261201090600-create-tasks',
  `
    CREATE TABLE tasks (
      id uuid NOT NULL DEFAULT gen_random_uuid(),
      organisation_id uuid NOT NULL,
      schedule_id uuid NOT NULL,
      rule_id uuid NOT NULL,
      rule_revision integer NOT NULL,
      procedure_id uuid NOT NULL,
      store_id uuid NOT NULL,
      unit_id uuid,
      audience text NOT NULL CHECK (audience IN ('technician', 'store')),
      occurs_local timestamp NOT NULL,
      time_zone text NOT NULL,
      due_on date NOT NULL,
      opens_at timestamptz NOT NULL,
      due_soon_at timestamptz NOT NULL,
      due_at timestamptz NOT NULL,
      closes_at timestamptz NOT NULL,
      lapses_at timestamptz NOT NULL,
      -- The local day on which the window closes: the day it counts for in compliance.
      closes_on date NOT NULL,
      outcome text NOT NULL DEFAULT 'none' CHECK (outcome IN ('none', 'done', 'excused', 'covered')),
      outcome_at timestamptz,
      outcome_by uuid,
      outcome_reason text,
      covered_by uuid,
      assigned_to uuid,
      visit_id uuid,
      deferred_from date,
      version integer NOT NULL DEFAULT 0,
      PRIMARY KEY (id, occurs_local),
      UNIQUE (schedule_id, occurs_local),
      CHECK (opens_at <= due_soon_at AND due_soon_at <= closes_at AND due_at <= closes_at
        AND closes_at <= lapses_at),
      CHECK ((outcome = 'none') = (outcome_at IS NULL))
    ) PARTITION BY RANGE (occurs_local);
    CREATE INDEX ON tasks (store_id, due_on);
    CREATE INDEX ON tasks (organisation_id, due_on, due_at, id);
    CREATE INDEX ON tasks (unit_id, due_on) WHERE unit_id IS NOT NULL;
    CREATE INDEX ON tasks (assigned_to, due_on) WHERE assigned_to IS NOT NULL;
    CREATE INDEX ON tasks (visit_id) WHERE visit_id IS NOT NULL;
    CREATE INDEX ON tasks (closes_at) WHERE outcome = 'none';
    -- What can still be done: in months gone by almost nothing, which one look at their index shows.
    CREATE INDEX ON tasks (lapses_at, opens_at) WHERE outcome = 'none';
    CREATE INDEX ON tasks (store_id, closes_on);
    CREATE TABLE tasks_beyond PARTITION OF tasks DEFAULT;
    ${tenantTable('tasks')}

    -- The application may not create tables, but the worker must have next year's months in time.
    -- What came before its month had a table waits in tasks_beyond and moves over.
    CREATE FUNCTION ensure_task_months(from_on date, to_on date) RETURNS void
      LANGUAGE plpgsql SECURITY DEFINER SET search_path = public AS $$
      DECLARE
        month date := date_trunc('month', from_on);
        following date;
        name text;
      BEGIN
        PERFORM pg_advisory_xact_lock(hashtext('ensure_task_months'));
        WHILE month <= to_on LOOP
          name := 'tasks_' || to_char(month, 'YYYY_MM');
          following := month + interval '1 month';
          IF to_regclass(name) IS NULL THEN
            LOCK TABLE tasks_beyond IN ACCESS EXCLUSIVE MODE;
            EXECUTE format('CREATE TABLE %I (LIKE tasks INCLUDING DEFAULTS INCLUDING CONSTRAINTS)', name);
            EXECUTE format('WITH moved AS (DELETE FROM tasks_beyond
              WHERE occurs_local >= %L AND occurs_local < %L RETURNING *)
              INSERT INTO %I SELECT * FROM moved', month, following, name);
            EXECUTE format('ALTER TABLE tasks ATTACH PARTITION %I FOR VALUES FROM (%L) TO (%L)',
              name, month, following);
          END IF;
          month := following;
        END LOOP;
      END
    $$;
    REVOKE ALL ON FUNCTION ensure_task_months FROM PUBLIC;
    GRANT EXECUTE ON FUNCTION ensure_task_months TO vatwright_app;

    -- The same rule as shared/tasks/task-state.ts; a test holds the two together.
    CREATE FUNCTION task_state(outcome text, outcome_at timestamptz, opens_at timestamptz,
      due_soon_at timestamptz, closes_at timestamptz, lapses_at timestamptz, at timestamptz)
      RETURNS text LANGUAGE sql IMMUTABLE PARALLEL SAFE AS $$
        SELECT CASE
          WHEN outcome IN ('excused', 'covered') THEN outcome
          WHEN outcome = 'done' THEN CASE WHEN outcome_at < closes_at THEN 'done' ELSE 'done-late' END
          WHEN at < opens_at THEN 'planned'
          WHEN at < due_soon_at THEN 'open'
          WHEN at < closes_at THEN 'due-soon'
          WHEN at < lapses_at THEN 'overdue'
          ELSE 'missed'
        END
      $$;
    CREATE TABLE saved_views (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      person_id uuid NOT NULL REFERENCES people,
      page text NOT NULL,
      name text NOT NULL CHECK (name <> ''),
      query text NOT NULL,
      shared boolean NOT NULL DEFAULT false,
      version integer NOT NULL DEFAULT 0,
      UNIQUE (person_id, page, name)
    );
    -- Many tasks changed at once: what was said of each, and how those changed stood before.
    CREATE TABLE task_changes (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      person_id uuid NOT NULL REFERENCES people,
      kind text NOT NULL CHECK (kind IN ('assign', 'excuse', 'defer')),
      made_at timestamptz NOT NULL,
      results jsonb NOT NULL,
      before jsonb NOT NULL,
      undone_at timestamptz
    );
    ${tenantTable('saved_views')}
    ${tenantTable('task_changes', 'SELECT, INSERT, UPDATE')}
  `,
  `
    DROP TABLE task_changes, saved_views;
    DROP FUNCTION task_state, ensure_task_months;
    DROP TABLE tasks;
  `,
);
