#!/usr/bin/env bash
# Stands in for dotnet, speedcommand and speedcommand-desk while the documents' commands run in a test: programs start as
# they were built, so that nothing is built twice, and whatever keeps pace with life is hurried.
set -euo pipefail

refuse() {
    echo "$*" >&2
    exit 97
}

# start_built PROJECT PROGRAM ARGUMENT...
start_built() {
    local dll="$BUILT_REPOSITORY/src/$1/bin/$BUILT_CONFIGURATION/net10.0/$2.dll"
    shift 2
    local hurried=() skip=no argument pace=""
    case " $* " in
        *" --bench "*) pace=50 ;;
        *" --display terminal "*) pace=max ;;
    esac
    for argument in "$@"; do
        if [ -n "$pace" ] && { [ "$argument" = --pace ] || [ $skip = yes ]; }; then
            [ "$argument" = --pace ] && skip=yes || skip=no
            continue
        fi
        hurried+=("$argument")
    done
    [ -z "$pace" ] || hurried+=(--pace "$pace")
    exec "$REAL_DOTNET" "$dll" ${hurried[@]+"${hurried[@]}"}
}

dotnet_run() {
    local project=""
    while [ $# -gt 0 ]; do
        case "$1" in
            --) shift; break ;;
            -c | --configuration) shift 2 ;;
            --project) project=$(basename "$2"); shift 2 ;;
            --no-build) shift ;;
            *) break ;;
        esac
    done
    case "$project" in
        SpeedCommand) start_built SpeedCommand speedcommand "$@" ;;
        SpeedCommand.Desk) start_built SpeedCommand.Desk speedcommand-desk "$@" ;;
        *) refuse "dotnet run: no stand-in for project '$project'" ;;
    esac
}

case "$(basename "$0")" in
    speedcommand) start_built SpeedCommand speedcommand "$@" ;;
    speedcommand-desk) start_built SpeedCommand.Desk speedcommand-desk "$@" ;;
esac

verb=${1-}
case "$verb" in
    run) shift; dotnet_run "$@" ;;
    # The continuous integration script does these for real.
    restore | build | test | format | publish)
        grep -q "dotnet $verb" "$BUILT_REPOSITORY/.ci/run" "$BUILT_REPOSITORY"/tests/*.sh || refuse ".ci/run never does 'dotnet $verb'" ;;
    *) refuse "dotnet $verb: no stand-in" ;;
esac
