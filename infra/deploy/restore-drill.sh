#!/usr/bin/env bash
# Proves that a dump can be restored: into a database of its own beside the real one, where the audit log's chain must
# hold and rows are counted. The drill's database is dropped at the end; the real one is not touched.
#
# usage: restore-drill.sh DUMP
set -euo pipefail
dump=${1:?usage: restore-drill.sh DUMP}
: "${DRILL_ADMIN_URL:?administrator address of a server that database:prepare has prepared, naming the database postgres}"
: "${DATABASE_LOGIN_PASSWORD:?password of cairnstep_login on that server}"
project=$(cd "$(dirname "$0")/../.." && pwd)
database="cairnstep_drill_$(date -u +%Y%m%d%H%M%S)"

if [ -f "$dump.sha256" ]; then sha256sum --check --quiet "$dump.sha256"; fi

at() { node -e 'const url = new URL(process.argv[1]); url.pathname = process.argv[2]; if (process.argv[3]) { url.username = process.argv[3]; url.password = process.env.DATABASE_LOGIN_PASSWORD; } process.stdout.write(url.href)' "$DRILL_ADMIN_URL" "$database" "${1:-}"; }
admin() { psql --no-psqlrc --quiet --set=ON_ERROR_STOP=1 --dbname="$DRILL_ADMIN_URL" --command="$1"; }

admin "create database $database owner cairnstep_owner template template0 encoding 'UTF8'"
trap 'admin "drop database if exists $database with (force)"' EXIT
admin "revoke all on database $database from public"
admin "grant connect on database $database to cairnstep_login"
admin "grant temporary on database $database to cairnstep_app"
pg_restore --exit-on-error --dbname="$(at)" "$dump"

psql --no-psqlrc --quiet --dbname="$(at)" --command="select (select count(*) from sites) as sites, (select count(*) from participants) as participants, (select count(*) from sessions) as sessions, (select count(*) from audit_entries) as audit_entries, (select max(at) from audit_entries) as last_entry"
DATABASE_APP_URL=$(at cairnstep_login) node "$project/services/api/dist/audit/verify-command.js"
echo "The dump $dump can be restored."
