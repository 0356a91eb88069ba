#!/usr/bin/env bash
# How long the demo's page and one of 50,000 rows and 30 groups take from being opened to being drawn in headless Chromium.
# tests/benchmarks/draw-time.sh   writes draw-time-results.md beside itself. Needs the SDK and a Chromium (on the PATH, or named by AUDITOR_CHROMIUM); run it on a quiet machine.
set -euo pipefail

cd -- "$(dirname -- "${BASH_SOURCE[0]}")/../.."
export DOTNET_CLI_TELEMETRY_OPTOUT=1 DOTNET_NOLOGO=1 AUDITOR_DRAW_TIMES=1
dotnet build tests/Auditor.Browser.Tests -v quiet
program=$(find tests/Auditor.Browser.Tests/bin/Debug -name Auditor.Browser.Tests.dll -not -path '*/ref/*' | head -n 1)
dotnet "$program" -class Auditor.Browser.Tests.DrawTimes
cat tests/benchmarks/draw-time-results.md
