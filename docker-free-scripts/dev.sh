#!/usr/bin/env bash
# npm run dev: the pages with hot reload on PORT (4600), the server restarted at each change behind them. It shares
# the instance's PostgreSQL with npm start, in a database of its own (redshank_dev) whose files are in uploads-dev.

source "$(dirname "${BASH_SOURCE[0]}")/lib.sh"
source "$scripts/postgres/server.sh"
source "$scripts/packages.sh"
source "$scripts/node-modules.sh"
source "$scripts/data-folder.sh"
source "$scripts/address.sh"
source "$scripts/postgres/instance.sh"
source "$scripts/serve.sh"

cd "$repo" || exit
need_node
use_data_folder
lock_instance
use_address
stop_cleanly_when_asked

need_packages postgresql ffmpeg
need_node_modules
instance_up redshank_dev

web_port=$PORT
api_port=$(node "$scripts/port.mjs" free)
export NODE_ENV=development REDSHANK_UPLOADS=$repo/uploads-dev

describe_instance "$PUBLIC_URL (npm run dev)"
PORT=$api_port HOST=127.0.0.1 launch node_modules/.bin/tsx watch --clear-screen=false server/main/start.ts
WEB_PORT=$web_port API_URL=http://127.0.0.1:$api_port launch node_modules/.bin/vite --clearScreen false
serve
