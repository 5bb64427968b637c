# shellcheck shell=bash
# Runs servers in the foreground and stops everything in the right order. Sourced after postgres/instance.sh.

servers=()
stop_asked=''

# From now on Ctrl-C, a closed terminal and SIGTERM end in a clean stop, also in the middle of the set-up.
stop_cleanly_when_asked() {
  trap 'asked_to_stop' INT TERM HUP
  trap 'on_exit' EXIT
}

asked_to_stop() {
  [[ -z $stop_asked ]] || return 0
  stop_asked=yes
  say ''
  if ((${#servers[@]} == 0)); then
    say 'Stopped before the server was started.'
    stop_step
    exit 130
  fi
}

on_exit() {
  local status=$?
  trap '' INT TERM HUP
  stop_step
  instance_down || status=1
  exit "$status"
}

# launch COMMAND…: in a session of its own, so that the terminal's Ctrl-C reaches this script alone and the server
# is told once. What it writes into the data folder is for its owner only. It shares the instance's lock (fd 9).
launch() {
  (
    umask 077
    exec setsid "$@" </dev/null
  ) &
  servers+=($!)
}

# Waits until a stop is asked for or one server ends by itself, stops the rest, and returns 0 only if all went well.
serve() {
  local status=0 pid
  # A stop asked for between the launch and this line must not be missed.
  [[ -n $stop_asked ]] || wait -n "${servers[@]}" || status=$?
  if [[ -n $stop_asked ]]; then
    status=0
    say 'Stopping: no new requests, then the worker, then the database …'
  else
    say "✗ The server ended by itself (status $status). The lines above say why."
    ((status != 0)) || status=1
  fi
  for pid in "${servers[@]}"; do kill -TERM "$pid" 2>/dev/null || true; done
  end_within 20 || status=1
  instance_down || status=1
  ((status != 0)) || say '✓ Stopped: server, worker and database'
  return "$status"
}

# end_within SECONDS: waits for the servers, then ends what is left of their sessions by force.
end_within() {
  local deadline=$((SECONDS + $1)) pid forced=0
  for pid in "${servers[@]}"; do
    while kill -0 "$pid" 2>/dev/null && ((SECONDS < deadline)); do sleep 0.1; done
    if kill -0 "$pid" 2>/dev/null; then
      say "  process $pid did not stop within $1 s and was ended by force"
      forced=1
    fi
    kill -KILL -- "-$pid" 2>/dev/null || true
  done
  return "$forced"
}
