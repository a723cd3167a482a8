# Sourced by start.sh and test.sh: everything that must hold before TypeScript can be run.
set -euo pipefail
cd "$(dirname "${BASH_SOURCE[0]}")/.."
export STEADMAIN_BEGAN="${STEADMAIN_BEGAN:-$(date +%s)}"

say() { printf '%4d s  %s\n' "$(($(date +%s) - STEADMAIN_BEGAN))" "$*"; }
stop_with() {
  printf '\n%s\n' "$*" >&2
  exit 1
}

command -v node >/dev/null || stop_with 'Steadmain needs Node 20 or later, and no "node" is on the PATH. Install Node.js, then run this again.'
node_version="$(node -p process.versions.node)"
[ "${node_version%%.*}" -ge 20 ] || stop_with "Steadmain needs Node 20 or later; this is Node $node_version. Install a newer Node.js, then run this again."

mkdir -p .steadmain 2>/dev/null || true
[ -w . ] && [ -w .steadmain ] ||
  stop_with "This folder ($PWD) can't be written by $(id -un). Run as the user who owns it ($(stat -c %U .)), or clone it afresh."

if missing="$(node scripts/installed.mjs)"; then
  say 'Packages are installed'
else
  say "Installing the packages named in package-lock.json, a minute or two ($missing)"
  npm ci --no-audit --no-fund --prefer-offline --progress=false --loglevel=error </dev/null ||
    stop_with 'The packages could not be installed. npm says why above; a machine without a network is the usual cause.'
fi
