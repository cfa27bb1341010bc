import { sqlMigration, tenantTable } from './migration';

/** A route is one technician's day; its visits are stores in order; tasks point to their visit. */
export const createVisits = sqlMigration(
  '20261201090800-create-visits',
  `
    CREATE TABLE routes (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      technician_id uuid NOT NULL REFERENCES people,
      on_date date NOT NULL,
      published_at timestamptz,
      published_by uuid REFERENCES people,
      -- The version that the technician was told about; a later one has changed since.
      published_version integer,
      version integer NOT NULL DEFAULT 0,
      UNIQUE (technician_id, on_date)
    );
    CREATE TABLE visits (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      route_id uuid NOT NULL REFERENCES routes,
      store_id uuid NOT NULL REFERENCES stores,
      position integer NOT NULL CHECK (position >= 0),
      note text NOT NULL DEFAULT '',
      version integer NOT NULL DEFAULT 0,
      UNIQUE (route_id, store_id),
      CONSTRAINT visit_order UNIQUE (route_id, position) DEFERRABLE INITIALLY DEFERRED
    );
    CREATE INDEX ON visits (store_id);
    ${['routes', 'visits'].map((table) => tenantTable(table)).join('\n')}
  `,
  `DROP TABLE visits, routes;`,
);
