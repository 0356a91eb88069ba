#!/usr/bin/env bash
# How long a whole audit of 500 rows takes, as a multiple of a .NET program that only says hello: what run-audit.sh built, and beside it the same program built for
# the .NET runtime, which is what run-audit.sh falls back to. The hello is built for the runtime and compiled ahead of time.
# tests/benchmarks/start-up.sh [RUNS]   (default 9 of each, in turn; medians). Needs nothing but the SDK and python3; run it on a quiet machine.
set -euo pipefail

top=$(cd -- "$(dirname -- "${BASH_SOURCE[0]}")/../.." && pwd)
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
export DOTNET_CLI_TELEMETRY_OPTOUT=1 DOTNET_NOLOGO=1

mkdir "$work/hello"
cat >"$work/hello/hello.csproj" <<'PROJECT'
<Project Sdk="Microsoft.NET.Sdk">
  <PropertyGroup>
    <OutputType>Exe</OutputType>
    <TargetFramework>net10.0</TargetFramework>
    <InvariantGlobalization>true</InvariantGlobalization>
  </PropertyGroup>
</Project>
PROJECT
echo 'System.Console.WriteLine("hello");' >"$work/hello/hello.cs"
for_runtime() { # PROJECT FOLDER
    dotnet publish "$1" -c Release -o "$2" -v quiet --use-current-runtime --self-contained false -p:PublishReadyToRun=true -p:RunAnalyzers=false >"$work/log" ||
        { cat "$work/log"; exit 1; }
}
for_runtime "$work/hello/hello.csproj" "$work/out"
for_runtime "$top/src/Auditor.Cli/Auditor.Cli.csproj" "$work/for-runtime"
"$top/run-audit.sh" --version >/dev/null
built="$top/.build/$(cat "$top/.build/stamp")"

python3 - "$work" "$built" "$top/run-audit.sh" "${1:-9}" <<'PYTHON'
import os, random, resource, statistics, subprocess, sys, time

work, built, script, runs = sys.argv[1], sys.argv[2], sys.argv[3], int(sys.argv[4])
random.seed(1)
with open(f"{work}/leases.csv", "w") as f:
    f.write("lease_no,loss_rate,advance_rate,price,engine_hours,age,region\n")
    for i in range(500):
        advance, price, hours, age = random.uniform(.5, .95), random.randint(30, 130), random.randint(500, 5000), random.randint(6, 60)
        loss = .1 + .2 * advance - .0005 * price + random.gauss(0, .04)
        f.write(f"L{i},{loss:.4f},{advance:.3f},{price},{hours},{age},{random.choice(['north', 'south', 'west'])}\n")
with open(f"{work}/leases.yaml", "w") as f:
    f.write("""audit: 1
model: {id: lease-loss}
data: {source: leases.csv, row_label: lease_no}
response: loss_rate
final_model: {terms: [advance_rate, {log: price}]}
left_out:
  - {group: engine hours, terms: [engine_hours, {square: engine_hours}]}
  - {group: age, terms: [age]}
  - {group: region, terms: [region]}
""")

native = not os.path.exists(f"{built}/Auditor.Cli.dll")
program = [f"{built}/Auditor.Cli"] if native else ["dotnet", f"{built}/Auditor.Cli.dll"]
runtime = ["dotnet", f"{work}/for-runtime/Auditor.Cli.dll"]
page = [f"{work}/leases.yaml", "--quiet", "--fail-on", "never"]
record = page + ["--formats", "json"]
commands = {
    "hello": ["dotnet", f"{work}/out/hello.dll"],
    "--version": program + ["--version"],
    "audit, record alone": program + record,
    "audit, page and record": program + page,
    "record through run-audit.sh": [script] + record,
    "for the runtime: --version": runtime + ["--version"],
    "for the runtime: record": runtime + record,
    "for the runtime: page too": runtime + page,
}
print("run-audit.sh built", "machine code" if native else "for the runtime")

def once(command):
    before, start = resource.getrusage(resource.RUSAGE_CHILDREN), time.perf_counter()
    subprocess.run(command, check=True, stdout=subprocess.DEVNULL)
    wall, after = time.perf_counter() - start, resource.getrusage(resource.RUSAGE_CHILDREN)
    return wall, after.ru_utime + after.ru_stime - before.ru_utime - before.ru_stime

for command in commands.values():
    once(command)
times = {name: [] for name in commands}
for _ in range(runs):
    for name, command in commands.items():
        times[name].append(once(command))
base = [statistics.median(t[k] for t in times["hello"]) for k in (0, 1)]
print(f"{'':28}{'wall ms':>9}{'x hello':>9}{'cpu ms':>9}{'x hello':>9}")
for name, t in times.items():
    wall, cpu = (statistics.median(one[k] for one in t) for k in (0, 1))
    print(f"{name:28}{wall * 1e3:9.0f}{wall / base[0]:9.2f}{cpu * 1e3:9.0f}{cpu / base[1]:9.2f}")
PYTHON
