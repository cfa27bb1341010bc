import { sqlMigration, tenantTable } from './migration';

/** Who did what when, kept for good: the application may add and read, never change or remove. */
export const createAudit = sqlMigration(
  '20261201091100-create-audit',
  `
    CREATE TABLE audit_events (
      id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      at timestamptz NOT NULL DEFAULT now(),
      actor_id uuid REFERENCES people,
      subject_kind text NOT NULL,
      subject_id uuid NOT NULL,
      action text NOT NULL,
      detail jsonb NOT NULL DEFAULT '{}'
    );
    CREATE INDEX ON audit_events (subject_kind, subject_id, id);
    CREATE INDEX ON audit_events (organisation_id, id DESC);
    ${tenantTable('audit_events', 'SELECT, INSERT')}
  `,
  `DROP TABLE audit_events;`,
);
