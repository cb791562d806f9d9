#!/usr/bin/env bash
# How fast recorded readings are corrected, in memory and from file to file, on one pinned core.
set -u
cd "$(dirname "$0")" || exit 1

usage() {
  cat <<'TEXT'
usage: bash tests/ProbeCal.Benchmarks/correct.sh [--core N] [--dry]

  --core N   the core that everything is pinned to (default: the last one)
  --dry      few rows and one run: shows that it works, measures nothing

Take other work off the machine first: the figures are the fastest of 7 runs.
TEXT
}

core=$(($(nproc --all) - 1)) runs=7 rows=1000000
while [ $# -gt 0 ]; do
  case "$1" in
    --core) [ $# -ge 2 ] || { echo "correct.sh: --core wants a number, for example --core 1" >&2; exit 2; }; core=$2; shift ;;
    --dry) runs=1 rows=2000 ;;
    -h|--help) usage; exit 0 ;;
    *) echo "correct.sh: '$1' is not an option; --help lists them" >&2; exit 2 ;;
  esac
  shift
done

dotnet build -c Release -v q --nologo || exit 1
echo "$(sed -n 's/^model name[^:]*: //p' /proc/cpuinfo | head -n 1), $(. /etc/os-release; echo "$PRETTY_NAME"), load $(cut -d' ' -f1 /proc/loadavg), core $core"
taskset -c "$core" dotnet bin/Release/net10.0/ProbeCal.Benchmarks.dll correct "$runs" "$rows"
