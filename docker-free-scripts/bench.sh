#!/usr/bin/env bash
# npm run bench: sets up what the measurements need and runs them. Only their own words go to standard output, so
# that `npm run --silent bench -- --json` is one JSON document.
#
# The measurements get REDSHANK_TEST_PG, a throwaway cluster's address as redshank_admin.

source "$(dirname "${BASH_SOURCE[0]}")/lib.sh"
source "$scripts/postgres/server.sh"
source "$scripts/packages.sh"
source "$scripts/node-modules.sh"
source "$scripts/build.sh"

cd "$repo" || exit
need_node

# Told to stop, it ends what runs; the browser and the servers of a measurement end with their parent.
running=''
trap 'stop_step; [[ -z $running ]] || kill -TERM "$running" 2>/dev/null; exit 130' INT TERM HUP

need_packages postgresql ffmpeg chromium-headless-shell
need_node_modules
need_build

REDSHANK_TEST_PG=$("$BASH" "$scripts/postgres/throwaway.sh" start $$)
export REDSHANK_TEST_PG
trap '"$BASH" "$scripts/postgres/throwaway.sh" stop "$REDSHANK_TEST_PG"' EXIT
node --import tsx tests/bench/run.ts "$@" &
running=$!
wait "$running"
