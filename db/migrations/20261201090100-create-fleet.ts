import { sqlMigration, tenantTable } from './migration';

const tables = ['regions', 'chains', 'stores', 'units', 'components'];

/** Chains and regions, their stores, the units in them and the components of those over time. */
export const createFleet = sqlMigration(
  '20261201090100-create-fleet',
  `
    CREATE TABLE regions (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      name text NOT NULL CHECK (name <> ''),
      retired_at timestamptz,
      version integer NOT NULL DEFAULT 0,
      UNIQUE (organisation_id, name)
    );
    CREATE TABLE chains (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      name text NOT NULL CHECK (name <> ''),
      retired_at timestamptz,
      version integer NOT NULL DEFAULT 0,
      UNIQUE (organisation_id, name)
    );
    CREATE TABLE stores (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      chain_id uuid NOT NULL REFERENCES chains,
      region_id uuid NOT NULL REFERENCES regions,
      number text NOT NULL CHECK (number <> ''),
      name text NOT NULL CHECK (name <> ''),
      address_line text NOT NULL DEFAULT '',
      city text NOT NULL DEFAULT '',
      state text NOT NULL DEFAULT '',
      postal_code text NOT NULL DEFAULT '',
      latitude double precision NOT NULL CHECK (latitude BETWEEN -90 AND 90),
      longitude double precision NOT NULL CHECK (longitude BETWEEN -180 AND 180),
      position_from text NOT NULL CHECK (position_from IN ('coordinates', 'postal-code')),
      time_zone text NOT NULL,
      phone text NOT NULL DEFAULT '',
      access_note text NOT NULL DEFAULT '',
      hours jsonb NOT NULL DEFAULT '{}',
      retired_at timestamptz,
      version integer NOT NULL DEFAULT 0,
      created_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (chain_id, number)
    );
    CREATE INDEX ON stores (region_id);
    CREATE TABLE units (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      store_id uuid NOT NULL REFERENCES stores,
      tag text NOT NULL CHECK (tag <> ''),
      kind text NOT NULL CHECK (kind IN ('built-in', 'portable')),
      vats integer NOT NULL CHECK (vats BETWEEN 1 AND 12),
      oil_pounds numeric(6, 1) CHECK (oil_pounds > 0),
      model text NOT NULL DEFAULT '',
      installed_on date,
      out_of_service_since date,
      retired_at timestamptz,
      version integer NOT NULL DEFAULT 0,
      created_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (store_id, tag)
    );
    CREATE TABLE components (
      id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL REFERENCES organisations,
      unit_id uuid NOT NULL REFERENCES units,
      kind text NOT NULL CHECK (kind IN ('pump', 'motor', 'pan', 'hose')),
      serial_number text NOT NULL DEFAULT '',
      model text NOT NULL DEFAULT '',
      nameplate jsonb NOT NULL DEFAULT '{}',
      pump_face text CHECK (pump_face IN ('drain-slot', 'gasket')),
      installed_on date NOT NULL,
      removed_on date,
      removal_cause text,
      version integer NOT NULL DEFAULT 0,
      CHECK (removed_on >= installed_on),
      CHECK (pump_face IS NULL OR kind = 'pump')
    );
    CREATE INDEX ON components (unit_id, kind, installed_on);
    -- Of hoses a unit may have several.
    CREATE UNIQUE INDEX one_fitted_component ON components (unit_id, kind)
      WHERE removed_on IS NULL AND kind <> 'hose';
    ${tables.map((table) => tenantTable(table)).join('\n')}
  `,
  `DROP TABLE components, units, stores, chains, regions;`,
);
