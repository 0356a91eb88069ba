#!/usr/bin/env bash
# Audits a declared regression model: ./run-audit.sh demo, ./run-audit.sh DECLARATION.yaml, ./run-audit.sh --help
# Builds the program once into .build/; a later start goes straight to it, unless a source file is newer.
set -euo pipefail

here=$(cd -- "$(dirname -- "$(readlink -f -- "${BASH_SOURCE[0]}")")" && pwd)
build="$here/.build"
stamp="$build/stamp" # its time is that of the build, its text the folder of the built program
export DOTNET_CLI_TELEMETRY_OPTOUT=1 DOTNET_NOLOGO=1

if ! command -v dotnet >/dev/null 2>&1; then
    echo "error: the .NET 10 SDK is needed (command 'dotnet'); it was not found on this machine" >&2
    exit 2
fi

is_current() {
    [ -f "$stamp" ] && [ -f "$build/$(cat "$stamp")/Auditor.Cli.dll" ] &&
        [ -z "$(find "$here/src" "$here/rules" "$here/templates" "$here/tests/reference" "$here/tests/Auditor.Numerics.Tests/Distributions/values" \
            "$here"/Directory.*.props "$here/global.json" \
            \( -name bin -o -name obj \) -prune -o -newer "$stamp" -type f -print -quit)" ]
}

publish() { # FOLDER [options]
    local name=$1
    shift
    (cd "$here" && dotnet publish src/Auditor.Cli/Auditor.Cli.csproj -c Release -o "$build/$name" -v quiet "$@")
}

build_once() {
    if ! (cd "$here" && dotnet --version >/dev/null 2>&1); then
        echo "error: the .NET 10 SDK is needed; found: $(cd / && dotnet --list-sdks 2>/dev/null | tr '\n' ';' || true)" >&2
        exit 2
    fi
    echo "Building once; later starts are immediate." >&2
    local name built=yes started="$build/started" log="$build/build.log"
    name="app-$(date +%s)-$$"
    echo "$name" >"$started"
    # Compiled ahead of time it starts sooner; the compiler is a package, which a machine without a network may not have.
    if ! publish "$name" --use-current-runtime --self-contained false -p:PublishReadyToRun=true >"$log" 2>&1; then
        rm -rf "${build:?}/$name"
        if publish "$name" >"$log.plain" 2>&1; then
            echo "Built without compiling ahead of time, so starts take longer: $(grep -m 1 -o 'error [A-Z0-9]*: .*' "$log" || echo "see $log")" >&2
        else
            built=no
        fi
    fi
    if [ "$built" = no ]; then
        cat "$log.plain" >&2
        rm -rf "${build:?}/$name"
        echo "error: the program could not be built; the messages above say why" >&2
        exit 3
    fi
    # A run that started before keeps its own folder; only folders older than the last build go.
    local last=""
    [ ! -f "$stamp" ] || last=$(cat "$stamp")
    mv "$started" "$stamp"
    find "$build" -maxdepth 1 -name 'app-*' ! -name "$name" ! -name "${last:-none}" -exec rm -rf {} +
}

if ! is_current; then
    mkdir -p "$build"
    # Two runs at once: the second waits for the first one's build.
    exec 9>"$build/lock"
    if command -v flock >/dev/null 2>&1; then
        flock 9
    fi
    is_current || build_once
    exec 9>&-
fi

exec dotnet "$build/$(cat "$stamp")/Auditor.Cli.dll" "$@"
