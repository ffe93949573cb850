#!/usr/bin/env bash
# Twenty-four hours of flight (or as many as the first argument says) on a bad day, on accelerated time: bytes, framers, pipeline,
# picture lines. Prints what was flown, allocated and kept.
set -euo pipefail
cd "$(dirname "$0")/.."
export SPEEDCOMMAND_SOAK_HOURS="${1:-24}"
time dotnet test tests/SpeedCommand.Simulation.Tests -c Release --filter "FullyQualifiedName~SoakTests" --logger "console;verbosity=detailed"
