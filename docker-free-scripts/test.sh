#!/usr/bin/env bash
# npm test: everything that can be checked, from a fresh clone; ends with the line 'N passed, N failed'.
# npm test -- --only unit|api|e2e|static: one part, for daily use; may be given more than once.

source "$(dirname "${BASH_SOURCE[0]}")/lib.sh"
source "$scripts/postgres/server.sh"
source "$scripts/packages.sh"
source "$scripts/node-modules.sh"

usage() { fail "npm test does not know '$1'." 'npm test -- --only unit|api|e2e|static'; }

only=()
while (($#)); do
  case $1,${2:-} in
    --only,unit | --only,api | --only,e2e | --only,static) only+=("$2") ;;
    *) usage "$*" ;;
  esac
  shift 2
done

wanted() { ((${#only[@]} == 0)) || [[ " ${only[*]} " == *" $1 "* ]]; }

cd "$repo" || exit
report=$repo/tests/.out/report
summed=''
REDSHANK_TEST_PG=''
beside=''

finish() {
  stop_step
  [[ -z $beside ]] || kill -TERM "$beside" 2>/dev/null || true
  [[ -z $REDSHANK_TEST_PG ]] || "$BASH" "$scripts/postgres/throwaway.sh" stop "$REDSHANK_TEST_PG"
  # The set-up failed or was stopped: that is a failed run too.
  [[ -n $summed ]] || printf '\n0 passed, 1 failed\n'
}
trap finish EXIT
trap 'exit 130' INT TERM HUP

# The person's own settings must not decide what the tests see.
unset NODE_ENV PORT HOST PUBLIC_URL TRUST_PROXY DATABASE_URL DATABASE_OWNER_URL DATABASE_JOBS_URL
for stray in "${!REDSHANK_@}"; do [[ $stray == REDSHANK_TEST_PG ]] || unset "$stray"; done
[[ -t 2 ]] || export NO_COLOR=1

need_node
need_packages postgresql ffmpeg chromium-headless-shell
need_node_modules

rm -rf -- "$report"
mkdir -p -- "$report"
: >"$report/steps.tsv"
REDSHANK_TEST_PG=$("$BASH" "$scripts/postgres/throwaway.sh" start $$)
export REDSHANK_TEST_PG

# run ID LABEL KIND MINUTES COMMAND…: a step of the run; a failed one does not keep the next from running.
run() {
  local id=$1 label=$2 kind=$3 minutes=$4 status=0 started=$SECONDS
  shift 4
  step_every=120 step_lines=300 step "$label" timeout --kill-after=20 "${minutes}m" "$@" || status=$?
  printf '%s\t%s\t%s\t%s\t%s\n' "$id" "$label" "$kind" "$status" $((SECONDS - started)) >>"$report/steps.tsv"
}

vitest() {
  local id=$1 label=$2 minutes=$3
  shift 3
  run "$id" "$label" vitest "$minutes" node_modules/.bin/vitest run --reporter=dot --reporter=json \
    --outputFile.json="$report/$id.json" "${@/#/--project=}"
}

# What needs no browser.
without_browser() {
  if wanted static; then
    # each keeps one processor busy: lint beside the rest
    (
      trap stop_step EXIT
      trap 'exit 130' INT TERM HUP
      run lint 'lint' check 20 npm run --silent lint
    ) &
    beside=$!
    run types 'type check' check 20 npm run --silent typecheck
    run format 'format' check 10 npm run --silent format:check
    run rules 'dependency rules' check 10 npm run --silent depcruise
    run drift 'migration drift' check 10 node --import tsx docker-free-scripts/drift.ts
    # ended before its time: what it had still to do has not been seen to work
    wait "$beside" || printf 'beside\tlint, cut short\tcheck\t1\t0\n' >>"$report/steps.tsv"
    beside=''
  fi
  if wanted api; then
    vitest api 'API tests' 30 api
  fi
  if wanted unit; then
    vitest unit 'unit and component tests' 30 unit web
  fi
}

with_browser() {
  run build 'build' check 10 npm run --silent build
  PLAYWRIGHT_JSON_OUTPUT_FILE=$report/e2e.json run e2e 'browser tests' playwright 60 \
    node_modules/.bin/playwright test --reporter=line,json
}

without_browser
if wanted e2e; then with_browser; fi

summed=yes
node "$scripts/sum-reports.mjs" "$report"
