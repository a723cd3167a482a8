#!/usr/bin/env bash
# npm start: installs, starts PostgreSQL, migrates, seeds, builds and serves. Ctrl-C stops all of it.
. "$(dirname "${BASH_SOURCE[0]}")/prepare.sh"
exec node --import tsx scripts/start.ts
