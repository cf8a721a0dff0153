#!/bin/sh
# Submits one month of a clinic, from its own system, with curl alone.
#   REGISTRY        address of the registry, such as https://cairnstep.example
#   TOKEN_ENDPOINT  of the identity provider: "token_endpoint" in its /.well-known/openid-configuration
#   CLIENT_ID, CLIENT_SECRET  of the system; an administrator of the registry has registered the client id
#   MONTH           such as 2026-11
#   FOLDER          holds the month's files, one for each table: participants.csv, consents.csv, sessions.csv …
#   REASON_F33, …   why the warnings of one rule stand, by the rule that the check named; each rule needs its own
#   REMOVE          "yes" when rows that the registry holds of the month may go, because the files have them no longer
# The receipt goes to the standard output, all else to the standard error.
set -eu
json='Content-Type: application/json'

# A refusal is printed, and ends the script.
send() {
  body=$(curl --silent --show-error --fail-with-body "$@") || { printf '%s\n' "$body" >&2; return 1; }
  printf '%s\n' "$body"
}
# The first text of this name in an answer, and the first number. The objects of an answer, each on a line.
field() { printf '%s\n' "$2" | grep -o "\"$1\":\"[^\"]*\"" | head -n 1 | cut -d '"' -f 4; }
number() { printf '%s\n' "$2" | grep -o "\"$1\":[0-9]*" | head -n 1 | cut -d ':' -f 2; }
objects() { printf '%s\n' "$1" | tr '{' '\n'; }
tell() { printf '%s\n' "$*" >&2; }

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

# 3. The files, and no others: what an earlier run left in the submission and the folder does not have is taken out.
for table in $(objects "$answer" | grep '"sha256":' | grep -o '^"table":[^,]*' | cut -d ':' -f 2 | tr -d '"'); do
  if [ "$table" = null ]; then ask --request DELETE "$address/workbook" > /dev/null
  elif [ ! -e "$FOLDER/$table.csv" ]; then ask --request DELETE "$address/files/$table" > /dev/null
  fi
done
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
  tell 'The files hold errors. Nothing was committed.'
  exit 1
fi
stop=
removed=0
tell "What a commit would do to $MONTH in the registry, in rows:"
while read -r line && [ -n "$line" ]; do
  rows=$(number removed "$line")
  removed=$((removed + rows))
  tell "  $(field table "$line"): $(number added "$line") added, $(number changed "$line") changed," \
    "$(number unchanged "$line") unchanged, $rows removed"
done << END
$(objects "$answer" | grep '"removed":')
END
if [ "$removed" -gt 0 ] && [ "${REMOVE:-no}" != yes ]; then
  tell 'Rows would be removed. If that is meant, set REMOVE=yes.'
  stop=yes
fi
# A reason speaks for one rule: that a person is in the registry twice is another matter than an unusual heart rate.
while read -r line && [ -n "$line" ]; do
  rule=$(field rule "$line")
  reason=$(printenv "REASON_$rule" | sed 's/["\\]/\\&/g')
  if [ -n "$reason" ]; then
    ask --header "$json" --data "{\"rule\":\"$rule\",\"reason\":\"$reason\"}" "$address/acknowledgements" > /dev/null
  else
    tell "$rule, found $(number count "$line"): $(field statement "$line") Look at these rows; where they are right, say why in REASON_$rule."
    stop=yes
  fi
done << END
$(objects "$answer" | grep '"severity":"warning"')
END
if [ -n "$stop" ]; then
  tell 'Nothing was committed.'
  exit 1
fi

# 6. The commit of just what was previewed. The answer is the receipt; it can be fetched again.
ask --header "$json" --data "{\"previewDigest\":\"$digest\"}" "$address/commit" > /dev/null
ask "$address/receipt"
