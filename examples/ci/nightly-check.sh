#!/bin/sh
# No CI: checks the limits every night from cron and says something only when there is something to say, so that
# cron mails it. It needs git and an installed steelyard, and a clone that nobody works in.
#
# usage: nightly-check.sh CLONE REPORTS MACHINE...
#   nightly-check.sh /srv/mass/clone /srv/mass/reports machines/drone.yaml machines/arm.yaml
#
# crontab line, 02:30 on every day:
#   MAILTO=mass-properties@example.org
#   30 2 * * *  /srv/mass/nightly-check.sh /srv/mass/clone /srv/mass/reports machines/drone.yaml
#
# exit status: 0 fine, 1 a limit is broken or the mass of a machine moved by more than 5 g, 2 something is wrong
set -eu

[ $# -ge 3 ] || { echo "usage: nightly-check.sh CLONE REPORTS MACHINE..." >&2; exit 2; }
clone=$1
reports=$2
shift 2

day=$(date +%Y-%m-%d)
mkdir -p "$reports/$day"
reports=$(cd "$reports" && pwd)
cd "$clone"
git pull --quiet --ff-only || exit 2

log=$reports/$day/check.txt
status=0
steelyard check "$@" \
  --out "$reports/$day/junit.xml" --out "$reports/$day/summary.md" --out "$reports/$day/records.json" \
  > "$log" 2>&1 || status=$?

# What moved since the last night that was compared.
last=$(cat "$reports/last-commit" 2> /dev/null || true)
if [ -n "$last" ] && [ "$status" -le 1 ]; then
  for machine in "$@"; do
    git cat-file -e "$last:$machine" 2> /dev/null || continue # new since then
    moved=0
    steelyard diff "$last:$machine" "$machine" --fail-over mass=5g >> "$log" 2>&1 || moved=$?
    [ "$moved" -le "$status" ] || status=$moved
  done
fi
[ "$status" -gt 1 ] || git rev-parse HEAD > "$reports/last-commit"

if [ "$status" -ne 0 ]; then
  echo "steelyard: exit status $status on $day; reports in $reports/$day"
  cat "$log"
  [ ! -f "$reports/$day/summary.md" ] || cat "$reports/$day/summary.md"
fi
exit "$status"
