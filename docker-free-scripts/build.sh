# shellcheck shell=bash
# Pages and server, built only when what they are made of has changed. Sourced after lib.sh.

need_build() {
  local stamp=$repo/dist/.built-from now
  cd "$repo" || exit
  exec 8<"$scripts/build.sh"
  # Two starts at once must not build over each other.
  flock 8
  now=$(node "$scripts/build-stamp.mjs")
  if [[ ! -f dist/server/main.js || ! -f $stamp || $(<"$stamp") != "$now" ]]; then
    rm -f -- "$stamp"
    # Vite makes slow development pages if NODE_ENV says anything else.
    step 'Building pages and server' env NODE_ENV=production npm run --silent build ||
      fail 'The build did not finish.' 'The lines above say where. npm run typecheck shows all faults of the code at once.'
    printf '%s\n' "$now" >"$stamp"
  fi
  exec 8<&-
}
