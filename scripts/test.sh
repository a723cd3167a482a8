#!/usr/bin/env bash
# npm test: the checks, then every kind of test, against a PostgreSQL and a Chromium of its own.
. "$(dirname "${BASH_SOURCE[0]}")/prepare.sh"
exec node --import tsx scripts/test.ts
