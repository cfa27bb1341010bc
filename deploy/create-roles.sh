#!/usr/bin/env bash
# Makes the two roles and the database on a PostgreSQL server where they are missing. Run it as
# PostgreSQL's superuser with OWNER_PASSWORD and APP_PASSWORD set; psql's own variables (PGHOST,
# PGUSER …) say where. Setting other passwords and running it again changes them.
set -euo pipefail
: "${OWNER_PASSWORD:?Set OWNER_PASSWORD}" "${APP_PASSWORD:?Set APP_PASSWORD}"

# Passwords reach psql by its environment (\getenv), never by its command line, which everybody sees.
export OWNER_PASSWORD APP_PASSWORD
psql --no-psqlrc --quiet --set ON_ERROR_STOP=1 --username "${POSTGRES_USER:-${PGUSER:-postgres}}" --dbname postgres <<'SQL'
\getenv owner_password OWNER_PASSWORD
\getenv app_password APP_PASSWORD
SELECT format('CREATE ROLE %I LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOREPLICATION NOBYPASSRLS', wanted)
FROM unnest(ARRAY['vatwright_owner', 'vatwright_app']) AS wanted
WHERE NOT EXISTS (SELECT FROM pg_roles WHERE rolname = wanted)
\gexec
-- The statement logged holds the password's hash at most.
SET password_encryption = 'scram-sha-256';
SET log_statement = 'none';
ALTER ROLE vatwright_owner PASSWORD :'owner_password';
ALTER ROLE vatwright_app PASSWORD :'app_password';
SELECT 'CREATE DATABASE vatwright OWNER vatwright_owner'
WHERE NOT EXISTS (SELECT FROM pg_database WHERE datname = 'vatwright')
\gexec
SQL
