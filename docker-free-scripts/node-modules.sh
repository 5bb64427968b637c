# shellcheck shell=bash
# Node itself and the packages of package-lock.json. Sourced after lib.sh.

# Sets version_ok; the least version is the one that package.json names under engines.
node_is_new_enough() {
  node -e '
    const least = require("./package.json").engines.node.match(/\d+/g).map(Number);
    const have = process.versions.node.split(".").map(Number);
    process.exit(have[0] > least[0] || (have[0] === least[0] && have[1] >= (least[1] ?? 0)) ? 0 : 1)'
}

need_node() {
  command -v node >/dev/null || fail 'Node is missing.' 'Install Node 20.19 or newer (with npm), then start again.'
  (cd "$repo" && node_is_new_enough) ||
    fail "This is Node $(node -v), too old for Redshank." 'Install Node 20.19 or newer, then start again.'
}

# Names the packages that npm could not get, out of its own words.
packages_npm_wanted() {
  grep -oE '(request to|GET|No matching version found for) [^ ]+' -- "$1" |
    sed -E 's#^(request to|GET) https?://[^/]+/#/#; s#^No matching version found for ##; s#^/##; s#%2[fF]#/#g; s#/-/.*##; s#[.]$##' |
    sort -u | head -n 8 | paste -sd ' ' -
}

need_node_modules() {
  cd "$repo" || exit
  exec 8<"$scripts/node-modules.sh"
  # Two starts at once must not install over each other.
  flock 8
  if ! node "$scripts/lock-installed.mjs"; then
    # Development packages build the pages, so they come in under NODE_ENV=production too.
    if ! step 'Installing the packages of package-lock.json (one or two minutes the first time)' \
      npm ci --include=dev --no-audit --no-fund --loglevel=error; then
      local wanted
      wanted=$(packages_npm_wanted "$step_log" || true)
      fail "npm ci did not finish${wanted:+. Missing: $wanted}." \
        'If the npm registry cannot be reached from here, mend the network or the proxy (npm config list shows which are used), then start again.'
    fi
  fi
  exec 8<&-
}
