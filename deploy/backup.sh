#!/usr/bin/env bash
# Dumps the database to DIRECTORY/vatwright-<time>.dump, proves that the dump can be read, and keeps
# the newest KEEP (14). Set DATABASE_OWNER_URL. Photos are in the object store: back it up by its own
# means (versioning or replication); a dump never refers to photos younger than itself.
#   backup.sh DIRECTORY
set -euo pipefail
umask 077
directory=${1:?Say into which directory}
: "${DATABASE_OWNER_URL:?Set DATABASE_OWNER_URL}"
keep=${KEEP:-14}

mkdir -p "$directory"
file="$directory/vatwright-$(date -u +%Y%m%dT%H%M%SZ).dump"
trap 'rm -f "$file.part"' EXIT
pg_dump --format=custom --compress=6 --no-owner --file="$file.part" "$DATABASE_OWNER_URL"
pg_restore --list "$file.part" | grep 'TABLE DATA public organisations' >/dev/null
mv "$file.part" "$file"
sync "$file"

find "$directory" -maxdepth 1 -name 'vatwright-*.dump' | sort -r | tail -n "+$((keep + 1))" | xargs -r rm --
printf '%s\n' "$file"
