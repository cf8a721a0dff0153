#!/usr/bin/env bash
# Dumps the registry into a file of the day, checks that the file can be read, and removes files past their time.
set -euo pipefail
umask 077
: "${BACKUP_DATABASE_URL:?the address of an account that may read everything}"
: "${BACKUP_FOLDER:?where dumps are kept}"
keep_days=${KEEP_DAYS:-35}

dump="$BACKUP_FOLDER/cairnstep-$(date -u +%Y-%m-%dT%H%M%SZ).dump"
# Written aside first: a file with its final name is whole.
pg_dump --format=custom --file="$dump.part" --dbname="$BACKUP_DATABASE_URL"
pg_restore --list "$dump.part" >/dev/null
mv "$dump.part" "$dump"
sha256sum "$dump" >"$dump.sha256"
find "$BACKUP_FOLDER" -maxdepth 1 -name 'cairnstep-*.dump*' -mtime "+$keep_days" -delete
echo "$dump"
