#!/usr/bin/env python3
"""Measures how late the running service is: from the last byte of a sentence on its line to the pipeline, and to a display.

    tests/service-latency.py PROGRAM [SECONDS]

PROGRAM is the published executable (docs/ahead-of-time.md). Two pseudo-terminals are fed 50 sentences a second each, half a period
apart; a character display at 115200 baud hangs on a third. What is compared, for each way to the serial ports:

  read      from the write of a sentence to the stamp it got, which is in the flight log
  picture   from the moment a picture is of, a whole tenth of a second, to the last byte of its frame on the display
  display   from the write of the newest sentence that a frame rests on to the last byte of the frame

The service's clock and ours both run on CLOCK_MONOTONIC from different zeros. The difference is that of the fastest sentence, less
the time the fastest takes, which is measured by watching a line without pause. Only the standard library is used.
"""
import bisect
import glob
import os
import statistics
import sys
import tempfile
import threading
import time

from service_rig import RATE_HZ, READERS, Line, alive, boards, pause_until, start, stop

FRAME_BYTES = 89
WARM_UP_S = 5
PICTURE_S = 0.1
HELD_UP_S = 0.0002


def watch_display(display, frames):
    """Notes when each frame was complete."""
    received = 0
    try:
        while data := os.read(display.master, 4096):
            received += len(data)
            if received >= FRAME_BYTES:
                frames.append(time.monotonic())
                received %= FRAME_BYTES
    except OSError:
        pass


def fastest_s(line, process, text):
    """The least time a sentence lies on the line."""
    times = []
    for _ in range(300):
        alive(process)
        written = time.monotonic()
        os.write(line.master, text)
        while line.waiting() > 0:
            pass
        times.append(time.monotonic() - written)
        time.sleep(0.004)
    return min(times)


def feed(lines, seconds, process):
    """The moments each line's sentences were written; None for one at which this script was held up itself."""
    written = ([], [])
    begun = time.monotonic()
    for count in range(int(seconds * RATE_HZ)):
        alive(process)
        for number, text in enumerate(boards(count)):
            pause_until(begun + (count + number / 2) / RATE_HZ)
            before = time.monotonic()
            os.write(lines[number].master, text)
            written[number].append(before if time.monotonic() - before < HELD_UP_S else None)
    return written


def stamps(home, name):
    log, = glob.glob(os.path.join(home, ".local/state/speedcommand/flights/*.log"))
    with open(log, encoding="ascii") as records:
        return [float(fields[0]) for fields in map(str.split, records) if len(fields) > 2 and fields[1] == name]


def percentiles(name, seconds):
    ordered = sorted(1000 * value for value in seconds)
    at = lambda share: ordered[min(len(ordered) - 1, int(share * len(ordered)))]
    return f"{name} p50 {at(0.5):6.2f}, p99 {at(0.99):6.2f} ms"


def measure(program, seconds, reader):
    with tempfile.TemporaryDirectory() as home:
        lines, display, frames = [Line(), Line()], Line(), []
        process = start(program, home, lines, reader, display=display)
        threading.Thread(target=watch_display, args=(display, frames), daemon=True).start()
        try:
            time.sleep(WARM_UP_S)
            fastest = fastest_s(lines[0], process, next(boards(0)))
            begun = time.monotonic()
            written = feed(lines, seconds, process)
            ended = time.monotonic()
            time.sleep(0.2)
        finally:
            stop(process)
        stamped = [stamps(home, f"board{number}")[-len(written[number]):] for number in (0, 1)]
    pairs = sorted((stamp, moment) for number in (0, 1) for stamp, moment in zip(stamped[number], written[number]))
    late = [stamp - moment for stamp, moment in pairs if moment]
    zero = min(late) - fastest
    reads = [value - zero for value in late]
    pictures, displays = [], []
    for frame in (frame for frame in frames if begun + 1 < frame < ended):
        picture = (frame + zero) // PICTURE_S * PICTURE_S
        newest = bisect.bisect_left(pairs, (picture,)) - 1
        pictures.append(frame + zero - picture)
        if pairs[newest][1]:
            displays.append(frame - pairs[newest][1])
    print(f"{reader:9} {len(reads)} sentences, the fastest {1000 * fastest:.2f} ms; {len(pictures)} frames, "
          f"{statistics.mean(b - a for a, b in zip(frames[-len(pictures):], frames[1 - len(pictures):])):.3f} s apart")
    for line in (percentiles("  read   ", reads), percentiles("  picture", pictures), percentiles("  display", displays)):
        print(line, flush=True)


def main(program, seconds):
    for reader in READERS:
        measure(program, seconds, reader)


if __name__ == "__main__":
    if len(sys.argv) not in (2, 3):
        sys.exit(__doc__)
    main(sys.argv[1], float(sys.argv[2]) if len(sys.argv) == 3 else 60)
