#!/usr/bin/env bash
# npm start: from a fresh clone to a running Redshank. Needs only Node and git; everything else is fetched, made
# and kept. Settings: PORT (4600), HOST (127.0.0.1), REDSHANK_DATA (redshank-data in this folder), PUBLIC_URL.
#
# The server gets: PORT, HOST, PUBLIC_URL, REDSHANK_DATA, REDSHANK_SECRETS_DIR, NODE_ENV as given, and
# DATABASE_URL (role redshank_app), DATABASE_OWNER_URL (redshank_owner), DATABASE_JOBS_URL (redshank_jobs).

source "$(dirname "${BASH_SOURCE[0]}")/lib.sh"
source "$scripts/postgres/server.sh"
source "$scripts/packages.sh"
source "$scripts/node-modules.sh"
source "$scripts/build.sh"
source "$scripts/data-folder.sh"
source "$scripts/address.sh"
source "$scripts/postgres/instance.sh"
source "$scripts/serve.sh"

cd "$repo"
need_node
use_data_folder
lock_instance
use_address
stop_cleanly_when_asked

need_packages postgresql ffmpeg
need_node_modules
need_build
instance_up redshank
need_free_port

describe_instance "$PUBLIC_URL"
launch node --enable-source-maps dist/server/main.js
serve
