# shellcheck shell=bash
# Shared by the scripts of this folder: where things are, how to speak, how to fail, how to run a step.
# Sourced, never run. Works before node_modules exists.

set -euo pipefail

repo=$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd -P)
# shellcheck disable=SC2034 # read by the scripts that source this file
scripts=$repo/docker-free-scripts

# PGHOST, PGPASSWORD, PGOPTIONS … of the person's own set-up must not reach the project's cluster.
for stray in "${!PG@}"; do unset "$stray"; done
unset stray

say() { printf '%s\n' "$*" >&2; }

# Says what went wrong and what to do about it, then ends the script.
fail() {
  printf '\n✗ %s\n' "$1" >&2
  shift
  local line
  for line in "$@"; do printf '  %s\n' "$line" >&2; done
  exit 1
}

is_root() { [[ $EUID -eq 0 ]]; }

random_password() { node -e 'process.stdout.write(require("node:crypto").randomBytes(24).toString("hex") + "\n")'; }

# Writes standard input to a file that only its owner can read; the file appears whole or not at all.
write_secret() {
  local file=$1
  (umask 077 && cat >"$file.new")
  mv -f -- "$file.new" "$file"
}

step_pid=''
step_log=''

# step LABEL COMMAND…: runs the command with its output in $step_log, shows that time passes, and shows
# the end of the output if the command fails. Returns the command's status. The command gets a process
# group of its own, so that a stop reaches everything it started, and never the instance's lock (fd 9).
step() {
  local label=$1 status=0 started=$SECONDS ticker
  shift
  [[ -t 2 ]] || say "… $label"
  step_log=$(mktemp "${TMPDIR:-/tmp}/redshank-step.XXXXXX")
  set -m
  "$@" </dev/null >"$step_log" 2>&1 9>&- &
  step_pid=$!
  set +m
  tick "$label" "$step_pid" &
  ticker=$!
  wait "$step_pid" || status=$?
  step_pid=''
  kill "$ticker" 2>/dev/null || true
  wait "$ticker" 2>/dev/null || true
  [[ -t 2 ]] && printf '\r\033[K' >&2
  if ((status == 0)); then
    say "✓ $label ($((SECONDS - started)) s)"
    rm -f -- "$step_log"
  else
    say "✗ $label ($((SECONDS - started)) s). The end of $step_log:"
    tail -n "${step_lines:-40}" -- "$step_log" | sed 's/^/    /' >&2
  fi
  return "$status"
}

# On a terminal a running count of seconds; in a log a line every half minute (or $step_every seconds).
tick() {
  local label=$1 pid=$2 started=$SECONDS every=${step_every:-30}
  local next=$every
  exec 9>&-
  while sleep 1 >/dev/null 2>&1 && kill -0 "$pid" 2>/dev/null; do
    if [[ -t 2 ]]; then
      printf '\r\033[K… %s (%d s)' "$label" $((SECONDS - started)) >&2
    elif ((SECONDS - started >= next)); then
      say "… $label ($((SECONDS - started)) s)"
      next=$((next + every))
    fi
  done
}

# Ends the step that is running, if any: called when the script is told to stop.
stop_step() {
  if [[ -n $step_pid ]]; then
    kill -TERM -- "-$step_pid" 2>/dev/null || true
    step_pid=''
  fi
}
