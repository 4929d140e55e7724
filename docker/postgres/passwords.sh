#!/bin/sh
# Run once, after roles.sql, by the image of PostgreSQL: the roles may sign in over the network with these passwords.
set -eu
psql -X -q -v ON_ERROR_STOP=1 -U "${POSTGRES_USER:-postgres}" -d fourfold \
  -v owner="$OWNER_PASSWORD" -v app="$APP_PASSWORD" -v maintenance="$MAINTENANCE_PASSWORD" <<'SQL'
ALTER ROLE fourfold_owner PASSWORD :'owner';
ALTER ROLE fourfold_app PASSWORD :'app';
ALTER ROLE fourfold_maintenance PASSWORD :'maintenance';
SQL
