#!/usr/bin/env bash
# Audits a declared regression model: ./run-audit.sh demo, ./run-audit.sh DECLARATION.yaml, ./run-audit.sh --help
# Builds the program once into .build/; a later start goes straight to it, unless a source file is newer.
set -euo pipefail

# What every start runs through uses the shell's own words: each further process costs as much as a part of the audit.
script=${BASH_SOURCE[0]}
[ ! -L "$script" ] || script=$(readlink -f -- "$script")
[[ $script == */* ]] || script=./$script
here=$(cd -- "${script%/*}" && pwd)
build="$here/.build"
stamp="$build/stamp" # its time is that of the build, its text the folder of the built program
export DOTNET_CLI_TELEMETRY_OPTOUT=1 DOTNET_NOLOGO=1

if ! command -v dotnet >/dev/null 2>&1; then
    echo "error: the .NET 10 SDK is needed (command 'dotnet'); it was not found on this machine" >&2
    exit 2
fi

# Machine code is made for the processor at hand; a folder that was carried to another one is built again.
processor() { # sets $processor
    processor=$HOSTTYPE
    local line
    if [ -r /proc/cpuinfo ]; then
        while read -r line; do
            case $line in flags* | Features*) processor+=" $line"; break ;; esac
        done </proc/cpuinfo
    else
        processor+=" $(sysctl -n machdep.cpu.brand_string 2>/dev/null || true)"
    fi
}

is_current() { # sets $app
    local name="" made_for=""
    { read -r name <"$stamp"; } 2>/dev/null || return 1
    app="$build/$name"
    if [ ! -f "$app/Auditor.Cli.dll" ]; then
        processor
        { read -r made_for <"$app/processor"; } 2>/dev/null && [ "$made_for" = "$processor" ] || return 1
    fi
    [ -z "$(find "$here/src" "$here/rules" "$here/templates" "$here/tests/reference" "$here/tests/Auditor.Numerics.Tests/Distributions/values" \
        "$here"/Directory.*.props "$here/global.json" \
        \( -name bin -o -name obj \) -prune -o -newer "$stamp" -type f -print -quit)" ]
}

publish() { # FOLDER LOG [options]: a folder that could not be made whole is taken away again
    local folder=$build/$1 log=$2
    shift 2
    (cd "$here" && dotnet publish src/Auditor.Cli/Auditor.Cli.csproj -c Release -o "$folder" -v quiet -p:RunAnalyzers=false "$@") >"$log" 2>&1 ||
        { rm -rf "$folder"; return 1; }
}

# One program of machine code: it starts sooner than a runtime does. It needs the compiler, which is a package, and a linker.
publish_native() { # FOLDER LOG
    local linker
    linker=$(command -v clang || command -v gcc) || { echo "error LINKER: no clang and no gcc on this machine" >"$2"; return 1; }
    publish "$1" "$2" --use-current-runtime -p:PublishAot=true -p:IlcInstructionSet=native -p:CppCompilerAndLinker="${linker##*/}" || return 1
    processor
    echo "$processor" >"$build/$1/processor"
}

publish_for_runtime() { # FOLDER LOG: for the installed runtime, compiled ahead of time as far as that goes
    publish "$1" "$2" --use-current-runtime --self-contained false -p:PublishReadyToRun=true
}

reason() { # LOG
    grep -m 1 -o 'error [A-Z0-9]*: .*' "$1" || echo "see $1"
}

build_once() { # sets $app
    if ! (cd "$here" && dotnet --version >/dev/null 2>&1); then
        echo "error: the .NET 10 SDK is needed; found: $(cd / && dotnet --list-sdks 2>/dev/null | tr '\n' ';' || true)" >&2
        exit 2
    fi
    echo "Building once, which takes a minute or two; later starts are immediate." >&2
    local name started="$build/started" log="$build/build.log"
    name="app-$(date +%s)-$$"
    echo "$name" >"$started"
    if publish_native "$name" "$log"; then
        :
    elif publish_for_runtime "$name" "$log.runtime"; then
        echo "Built for the .NET runtime, not as machine code, so starts take half a second longer: $(reason "$log")" >&2
    elif publish "$name" "$log.plain"; then
        echo "Built without compiling ahead of time, so starts take a second longer: $(reason "$log.runtime")" >&2
    else
        cat "$log.plain" >&2
        echo "error: the program could not be built; the messages above say why" >&2
        exit 3
    fi
    # A run that started before keeps its own folder; only folders older than the last build go.
    local last=""
    [ ! -f "$stamp" ] || last=$(cat "$stamp")
    mv "$started" "$stamp"
    app="$build/$name"
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

# So that what it tells people to type next works where they typed this.
export AUDITOR_CALLED_AS="$script"
[ ! -f "$app/Auditor.Cli.dll" ] || exec dotnet "$app/Auditor.Cli.dll" "$@"
exec "$app/Auditor.Cli" "$@"
