#!/usr/bin/env bash
# npm run doctor: what this machine has and lacks, and what to do about it. Changes nothing.
# Exit status 1 if something is missing without which npm start cannot work.

source "$(dirname "${BASH_SOURCE[0]}")/lib.sh"
source "$scripts/postgres/server.sh"
source "$scripts/packages.sh"
source "$scripts/node-modules.sh"
source "$scripts/data-folder.sh"
source "$scripts/postgres/instance.sh"
source "$scripts/doctor/checks.sh"
source "$scripts/doctor/instance-checks.sh"

cd "$repo" || exit
heading 'Programs'
check_node
check_packages
check_ffmpeg
heading 'This checkout'
check_checkout
heading 'This instance'
check_data_folder
check_disk
check_database
check_port
heading 'How far ffmpeg is confined'
check_confinement
verdict
