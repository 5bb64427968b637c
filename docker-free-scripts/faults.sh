#!/usr/bin/env bash
# npm run faults: kills parts of an instance of its own at seeded moments. Options: see tests/faults/cli.ts.

source "$(dirname "${BASH_SOURCE[0]}")/lib.sh"
source "$scripts/postgres/server.sh"
source "$scripts/packages.sh"
source "$scripts/node-modules.sh"

cd "$repo" || exit
need_node
need_packages postgresql ffmpeg
need_node_modules
exec node --import tsx tests/faults/cli.ts "$@"
