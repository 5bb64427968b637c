# shellcheck shell=bash
# Pages and server, built only when what they are made of has changed. Sourced after lib.sh.

need_build() {
  cd "$repo" || exit
  exec 8<"$scripts/build.sh"
  # Two starts at once must not build over each other.
  flock 8
  if ! node "$scripts/build-stamp.mjs" check; then
    # Vite makes slow development pages if NODE_ENV says anything else.
    step 'Building pages and server' env NODE_ENV=production npm run --silent build ||
      fail 'The build did not finish.' 'The lines above say where. npm run typecheck shows all faults of the code at once.'
  fi
  exec 8<&-
}
