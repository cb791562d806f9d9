#!/usr/bin/env bash
# Sets up what is missing, builds, and runs every check. Ends with one line: N passed, N failed, N skipped.
set -u
cd "$(dirname "$0")/.." || exit 1

usage() {
  cat <<'TEXT'
usage: bash tests/run.sh [--full] [--only NAME] [--no-setup]

  (nothing)     build, format check, every test project, NuGet package, native publish
  --full        long campaigns at their full figures; writes the logs that the docs cite to tests/.out/
  --only NAME   inner loop: build and run only tests whose project or full name contains NAME
  --no-setup    install nothing, even when it could

environment:
  PROBECAL_SEED   seed of the random campaigns (a number; printed by each campaign)

examples:
  bash tests/run.sh
  bash tests/run.sh --only Core
  bash tests/run.sh --only LineTemplate
TEXT
}

full=0 only='' setup=1
while [ $# -gt 0 ]; do
  case "$1" in
    --full) full=1 ;;
    --only) [ $# -ge 2 ] || { echo "tests/run.sh: --only wants a name, for example --only Core" >&2; exit 2; }; only=$2; shift ;;
    --no-setup) setup=0 ;;
    -h|--help) usage; exit 0 ;;
    *) echo "tests/run.sh: '$1' is not an option; --help lists them" >&2; exit 2 ;;
  esac
  shift
done

out=tests/.out
rm -rf "$out"; mkdir -p "$out/trx" "$out/log"
export DOTNET_CLI_TELEMETRY_OPTOUT=1 DOTNET_NOLOGO=1 DOTNET_SKIP_FIRST_TIME_EXPERIENCE=1 DOTNET_CLI_UI_LANGUAGE=en
export PROBECAL_LOG_DIR="$PWD/$out/log"
if [ "$full" = 1 ]; then export PROBECAL_FULL=1; echo "campaigns: full figures"; else echo "campaigns: a stated fraction (each prints its own); --full runs the figures"; fi

passed=0 failed=0 skipped=0
step() { # step NAME COMMAND...: one gate, counted as one check
  local name=$1; shift
  local t0=$SECONDS
  if "$@" >"$out/$name.log" 2>&1; then
    passed=$((passed + 1)); echo "ok      $name ($((SECONDS - t0)) s)"
  else
    failed=$((failed + 1)); echo "FAILED  $name ($((SECONDS - t0)) s): $out/$name.log"; tail -n 25 "$out/$name.log"
    return 1
  fi
}
native_run() { # the native program computes, and does the whole job: SQLite, broker, terminal
  "$1" equilibrium --gas O2 --temperature 20 --salinity 0 --pressure 760mmHg --format json | grep -F '"pressureHPa":1013.25,' \
    && "$1" demo --readings 3 | grep -F 'The demo has ended'
}
finish() { echo; echo "$passed passed, $failed failed, $skipped skipped"; [ "$failed" -eq 0 ]; exit $?; }

# 1. What the machine lacks. Tests whose peer is absent say so and count as skipped.
command -v dotnet >/dev/null 2>&1 || { echo "tests/run.sh: the .NET 10 SDK is not on PATH; install it from your system's packages or its maker" >&2; failed=1; finish; }
if [ "$setup" = 1 ] && [ "$(id -u)" = 0 ] && command -v apt-get >/dev/null 2>&1; then
  missing=''
  command -v mosquitto >/dev/null 2>&1 || missing="$missing mosquitto"
  command -v mosquitto_sub >/dev/null 2>&1 || missing="$missing mosquitto-clients"
  command -v socat >/dev/null 2>&1 || missing="$missing socat"
  command -v openssl >/dev/null 2>&1 || missing="$missing openssl"
  /usr/bin/python3 -c 'import gsw' >/dev/null 2>&1 || missing="$missing python3-gsw"
  /usr/bin/python3 -c 'import scipy.odr' >/dev/null 2>&1 || missing="$missing python3-scipy"
  command -v qemu-aarch64 >/dev/null 2>&1 && [ -e /usr/aarch64-linux-gnu/lib/libstdc++.so.6 ] || missing="$missing qemu-user libc6-arm64-cross libstdc++6-arm64-cross libgcc-s1-arm64-cross"
  command -v clang >/dev/null 2>&1 || command -v gcc >/dev/null 2>&1 || missing="$missing gcc libc6-dev"
  command -v arm-none-eabi-gcc >/dev/null 2>&1 || missing="$missing gcc-arm-none-eabi"
  # The browser prints the field card and certificates; without a font it would print nothing that can be measured.
  command -v chromium >/dev/null 2>&1 && [ -d /usr/share/fonts/truetype/liberation ] || missing="$missing chromium fonts-liberation"
  command -v pdftotext >/dev/null 2>&1 || missing="$missing poppler-utils"
  if [ -n "$missing" ]; then
    echo "installing:$missing"
    # shellcheck disable=SC2086
    { apt-get -o DPkg::Lock::Timeout=300 update -qq && DEBIAN_FRONTEND=noninteractive apt-get -o DPkg::Lock::Timeout=300 install -y -qq --no-install-recommends $missing; } >"$out/setup.log" 2>&1 \
      || { echo "could not install:$missing ($out/setup.log); the tests that need them are skipped"; tail -n 5 "$out/setup.log"; }
  fi
fi

# 2. Build.
step restore dotnet restore ProbeCal.sln || finish
step build dotnet build ProbeCal.sln -c Release --no-restore || finish
[ -n "$only" ] || step format dotnet format ProbeCal.sln --verify-no-changes --no-restore

# Core's bits on another processor: the same program for arm64, run by an emulator.
if command -v qemu-aarch64 >/dev/null 2>&1; then case "SameBits Peers" in *"$only"*)
  step arm64-publish dotnet publish tests/ProbeCal.SameBits/ProbeCal.SameBits.csproj -c Release -r linux-arm64 --self-contained -o "$out/arm64" \
    && export PROBECAL_ARM64="$PWD/$out/arm64" ;;
esac; fi

# 3. Tests. A project name picks projects; any other name filters tests by their full name.
projects=(tests/*.Tests/*.csproj) filter=()
if [ -n "$only" ]; then
  matching=()
  for p in "${projects[@]}"; do case "$(basename "$p" .csproj)" in *"$only"*) matching+=("$p") ;; esac; done
  if [ ${#matching[@]} -gt 0 ]; then projects=("${matching[@]}"); else filter=(--filter "FullyQualifiedName~$only"); fi
fi
counter() { sed -n "s/.*<Counters\b[^>]*[^a-zA-Z]$1=\"\([0-9]*\)\".*/\1/p" "$2" | head -n 1; }
for p in "${projects[@]}"; do
  name=$(basename "$p" .csproj); t0=$SECONDS
  dotnet test "$p" -c Release --no-build "${filter[@]}" --logger "trx;LogFileName=$name.trx" --logger "console;verbosity=detailed" --results-directory "$out/trx" >"$out/$name.log" 2>&1
  code=$?
  trx="$out/trx/$name.trx"
  if [ -f "$trx" ]; then
    total=$(counter total "$trx"); ran=$(counter executed "$trx"); ok=$(counter passed "$trx"); bad=$((ran - ok)); skip=$((total - ran))
    passed=$((passed + ok)); failed=$((failed + bad)); skipped=$((skipped + skip))
    echo "tests   $name: $ok passed, $bad failed, $skip skipped ($((SECONDS - t0)) s)"
    if [ "$bad" -gt 0 ]; then grep -E '^ +(Failed|Error Message:|Assert)|\[FAIL\]' -A 12 "$out/$name.log" | head -n 120; fi
    if [ "$skip" -gt 0 ]; then grep -E '\[SKIP\]' -A 2 "$out/$name.log" | head -n 40; fi
    if [ "$code" -ne 0 ] && [ "$bad" -eq 0 ]; then failed=$((failed + 1)); echo "FAILED  $name: the test host ended with $code"; tail -n 25 "$out/$name.log"; fi
    grep -hE '^ *campaign:|seed [0-9]' "$out/$name.log" | sed 's/^ */        /' | sort -u | head -n 40
  elif [ "$code" -ne 0 ]; then
    failed=$((failed + 1)); echo "FAILED  $name: no results (exit $code)"; tail -n 25 "$out/$name.log"
  fi
done

# 4. What ships: the package, and the native program.
reproducible() { # Core built again gives the same bytes, and no path of this machine is in them
  local before after
  before=$(sha256sum src/ProbeCal.Core/bin/Release/*/ProbeCal.Core.dll) || return 1
  dotnet build src/ProbeCal.Core/ProbeCal.Core.csproj -c Release --no-restore --no-incremental || return 1
  after=$(sha256sum src/ProbeCal.Core/bin/Release/*/ProbeCal.Core.dll)
  printf '%s\n%s\n' "$before" "$after"
  [ "$before" = "$after" ] && ! grep -aqF "$PWD" src/ProbeCal.Core/bin/Release/*/ProbeCal.Core.dll
}
if [ -z "$only" ]; then
  step reproducible reproducible
  step pack dotnet pack src/ProbeCal.Core/ProbeCal.Core.csproj -c Release --no-build -o "$out/package"
  if command -v clang >/dev/null 2>&1 || command -v gcc >/dev/null 2>&1; then
    step native-publish dotnet publish src/ProbeCal.Host/ProbeCal.Host.csproj -c Release -r linux-x64 -o "$out/native" \
      && step native-run native_run "$out/native/probecal"
  else
    skipped=$((skipped + 2)); echo "skipped native-publish, native-run: no C compiler to link with (clang or gcc)"
  fi
fi
finish
