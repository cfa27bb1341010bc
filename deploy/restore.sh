#!/usr/bin/env bash
# Restores a dump made by backup.sh into an EMPTY database that vatwright_owner owns, in one
# transaction: either all of it is there afterwards or nothing. Set DATABASE_OWNER_URL. Stop server
# and worker first.
#   restore.sh FILE
set -euo pipefail
file=${1:?Say which dump}
: "${DATABASE_OWNER_URL:?Set DATABASE_OWNER_URL}"

count() { psql --no-psqlrc --quiet --tuples-only --no-align --command "$1" "$DATABASE_OWNER_URL"; }

tables=$(count "SELECT count(*) FROM pg_tables WHERE schemaname = 'public'")
if [ "$tables" != 0 ]; then
  echo "The database holds $tables tables: restore into an empty one." >&2
  exit 1
fi
pg_restore --no-owner --exit-on-error --single-transaction --dbname="$DATABASE_OWNER_URL" "$file"
# The owner may not analyse the system's own tables, which is no fault.
PGOPTIONS='-c client_min_messages=error' psql --no-psqlrc --quiet --command 'ANALYZE' "$DATABASE_OWNER_URL"
echo "Restored: $(count 'SELECT count(*) FROM organisations') organisations, $(count 'SELECT count(*) FROM migrations') migrations."
