#!/usr/bin/env bash
# Oxygen side by side with gsw's compiled code (Debian's python3-gsw), for each vector width that this machine has, on one pinned core.
set -u
cd "$(dirname "$0")" || exit 1

usage() {
  cat <<'TEXT'
usage: bash tests/ProbeCal.Benchmarks/side-by-side.sh [--core N] [--dry]

  --core N   the core that everything is pinned to (default: the last one)
  --dry      few values and one run: shows that it works, measures nothing

Take other work off the machine first: the times are the fastest of 25 runs in turn.
TEXT
}

core=$(($(nproc --all) - 1)) runs=25 count=1000000
while [ $# -gt 0 ]; do
  case "$1" in
    --core) [ $# -ge 2 ] || { echo "side-by-side.sh: --core wants a number, for example --core 1" >&2; exit 2; }; core=$2; shift ;;
    --dry) runs=1 count=1000 ;;
    -h|--help) usage; exit 0 ;;
    *) echo "side-by-side.sh: '$1' is not an option; --help lists them" >&2; exit 2 ;;
  esac
  shift
done

program=bin/Release/net10.0/ProbeCal.Benchmarks.dll
dotnet build -c Release -v q --nologo || exit 1
echo "$(sed -n 's/^model name[^:]*: //p' /proc/cpuinfo | head -n 1), $(. /etc/os-release; echo "$PRETTY_NAME"), load $(cut -d' ' -f1 /proc/loadavg), core $core"
last=''
for taken in DOTNET_None DOTNET_EnableAVX512 DOTNET_EnableAVX2 DOTNET_EnableHWIntrinsic; do
  result=$(env "$taken=0" taskset -c "$core" dotnet "$program" side-by-side "$runs" "$count") || exit 1
  width=$(sed -n 's/.*width \([0-9]*\):.*/\1/p' <<<"$result")
  [ "$width" = "$last" ] || printf '%s\n' "$result"
  last=$width
done
