#!/usr/bin/env bash
# Builds the cockpit program ahead of time and flies the bench with the result.
#
#   tests/ahead-of-time.sh [linux-x64|linux-arm64] [FOLDER]
#
# linux-arm64 is cross-built on an x64 machine and flown under user-mode emulation; it needs the Debian packages
# clang binutils-aarch64-linux-gnu gcc-aarch64-linux-gnu libc6-dev-arm64-cross qemu-user-static.
# FOLDER keeps what was built; without it nothing is kept.
set -euo pipefail
cd "$(dirname "$0")/.."

target=${1:-linux-x64}
scratch=$(mktemp -d)
trap 'rm -rf "$scratch"' EXIT
output=${2:-$scratch/speedcommand}

case "$target" in
    linux-x64) cross=() emulator=() pace=50 ;;
    linux-arm64)
        # The C compiler of the build machine cannot drive the linker for another processor; clang can.
        cross=(-p:CppCompilerAndLinker=clang -p:ObjCopyName=aarch64-linux-gnu-objcopy)
        emulator=(qemu-aarch64-static -L /usr/aarch64-linux-gnu)
        # Emulated, the program is some ten times slower than on a processor of its own.
        pace=10
        ;;
    *)
        echo "expected linux-x64 or linux-arm64, found '$target'" >&2
        exit 2
        ;;
esac

# It may take its time: others may be testing. A warning here is a crash in the cockpit; warnings are errors in every project, those of the native step included.
nice -n 19 dotnet publish src/SpeedCommand -c Release -r "$target" -p:PublishAot=true ${cross[@]+"${cross[@]}"} -o "$output" -v q 2>&1 | tee "$scratch/publish.log"
if grep -q -E 'warning [A-Z]+[0-9]+' "$scratch/publish.log"; then
    echo "the build ahead of time gave warnings" >&2
    exit 1
fi

for file in speedcommand libSystem.IO.Ports.Native.so gliders/marram-15.json demo.log; do
    [ -e "$output/$file" ] || { echo "$file does not lie beside the program" >&2; exit 1; }
done

# A home of its own: the pilot's settings and recordings stay out of this.
env HOME="$scratch/home" XDG_CONFIG_HOME= XDG_STATE_HOME= \
    ${emulator[@]+"${emulator[@]}"} "$output/speedcommand" run --bench --pace "$pace" </dev/null
echo "$target: $(stat -c %s "$output/speedcommand") bytes ahead of time, bench flight passed"
