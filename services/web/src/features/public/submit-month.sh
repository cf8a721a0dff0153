#!/bin/sh
# Submits one month of a clinic, from its own system, with curl alone.
#   REGISTRY        address of the registry, such as https://registry.example
#   TOKEN_ENDPOINT  of the identity provider: "token_endpoint" in its /.well-known/openid-configuration
#   CLIENT_ID, CLIENT_SECRET  of the system; an administrator of the registry has registered the client id
#   MONTH           such as 2026-11
#   FOLDER          holds the month's files, one for each table: participants.csv, consents.csv, sessions.csv …
#   REASON          why warnings stand, should there be any; without it such a month is not committed
set -eu
json='Content-Type: application/json'

# A refusal is printed, and ends the script.
send() {
  body=$(curl --silent --show-error --fail-with-body "$@") || { printf '%s\n' "$body" >&2; return 1; }
  printf '%s\n' "$body"
}
# The first text of this name in an answer.
field() { printf '%s\n' "$2" | grep -o "\"$1\":\"[^\"]*\"" | head -n 1 | cut -d '"' -f 4; }

# 1. A token of the system's own, for this registry. Every request carries it.
answer=$(send --user "$CLIENT_ID:$CLIENT_SECRET" --data grant_type=client_credentials --data scope=submissions \
  --data-urlencode "resource=$REGISTRY/api" "$TOKEN_ENDPOINT")
token=$(field access_token "$answer")
ask() { send --header "Authorization: Bearer $token" "$@"; }

# 2. The site that the system belongs to, and its submission of the month: opened, or the one that is open already.
answer=$(ask "$REGISTRY/api/sites")
site=$(field id "$answer")
answer=$(ask --header "$json" --data "{\"siteId\":\"$site\",\"month\":\"$MONTH\"}" "$REGISTRY/api/submissions")
address="$REGISTRY/api/submissions/$(field id "$answer")"

# 3. The files. The same table again replaces what was sent before.
for file in "$FOLDER"/*.csv; do
  table=$(basename "$file" .csv)
  ask --request PUT --header 'Content-Type: text/csv' --data-binary "@$file" "$address/files/$table?fileName=$table.csv" > /dev/null
done

# 4. The check, in the background.
ask --header "$json" --data '{}' "$address/check" > /dev/null
answer=$(ask "$address")
while [ "$(field status "$answer")" = checking ]; do
  sleep 2
  answer=$(ask "$address")
done

# 5. What was found, and the preview. Errors leave no preview to commit: mend the files, and begin again.
digest=$(printf '%s\n' "$answer" | grep -o '"preview":{"digest":"[^"]*"' | cut -d '"' -f 6)
if [ -z "$digest" ]; then
  ask "$address/findings?severity=error" >&2
  echo 'The files hold errors. Nothing was committed.' >&2
  exit 1
fi
for rule in $(printf '%s\n' "$answer" | grep -o '"rule":"[^"]*"' | cut -d '"' -f 4); do
  : "${REASON:?Some rows call for a reason. Nothing was committed.}"
  ask --header "$json" --data "{\"rule\":\"$rule\",\"reason\":\"$REASON\"}" "$address/acknowledgements" > /dev/null
done

# 6. The commit of just what was previewed. The answer is the receipt; it can be fetched again.
ask --header "$json" --data "{\"previewDigest\":\"$digest\"}" "$address/commit" > /dev/null
ask "$address/receipt"
