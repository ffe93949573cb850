#!/usr/bin/env python3
"""Measures the running service: time to first read, resident memory, share of one core.

    tests/service-load.py PROGRAM [SECONDS]

PROGRAM is the published executable (docs/ahead-of-time.md). Two pseudo-terminals are fed 50 sentences a second each, static
pressure on one, impact pressure on the other, as two sensor boards would; the flight is recorded. It is measured with each way to
the serial ports, with the panel on a terminal and without one; the time to first read is the least and the median of several
starts. Only the standard library and /proc are used.
"""
import os
import statistics
import sys
import tempfile
import time

from service_rig import RATE_HZ, READERS, Line, alive, boards, pause_until, start, stop

STARTS = 9
TICKS = os.sysconf("SC_CLK_TCK")


def cpu_seconds(process):
    with open(f"/proc/{process.pid}/stat", encoding="ascii") as stat:
        fields = stat.read().rsplit(")", 1)[1].split()
    return (int(fields[11]) + int(fields[12])) / TICKS


def resident_mb(process):
    with open(f"/proc/{process.pid}/status", encoding="ascii") as status:
        return next(int(line.split()[1]) for line in status if line.startswith("VmRSS")) / 1024


def first_read_ms(process, line, started):
    """Until the bytes that lay on the line before the start are gone."""
    while line.waiting() > 0:
        alive(process)
        time.sleep(0.0002)
    return (time.monotonic() - started) * 1000


def feed(lines, until, next_time, count):
    while time.monotonic() < until:
        for line, text in zip(lines, boards(count)):
            os.write(line.master, text)
        count += 1
        next_time += 1 / RATE_HZ
        pause_until(next_time)
    return next_time, count


def first_reads_ms(program, reader, with_panel):
    times = []
    for _ in range(STARTS):
        with tempfile.TemporaryDirectory() as home:
            lines = [Line(), Line()]
            os.write(lines[0].master, b"\r\n" * 8)
            while lines[0].waiting() == 0:
                time.sleep(0.001)
            started = time.monotonic()
            process = start(program, home, lines, reader, with_panel)
            try:
                times.append(first_read_ms(process, lines[0], started))
            finally:
                stop(process)
    return times


def measure_load(program, seconds, reader, with_panel):
    with tempfile.TemporaryDirectory() as home:
        lines = [Line(), Line()]
        process = start(program, home, lines, reader, with_panel)
        try:
            now = time.monotonic()
            next_time, count = feed(lines, now + 5, now, 0)
            before, measured_from = cpu_seconds(process), time.monotonic()
            feed(lines, measured_from + seconds, next_time, count)
            return resident_mb(process), (cpu_seconds(process) - before) / (time.monotonic() - measured_from)
        finally:
            stop(process)


def main(program, seconds):
    for reader in READERS:
        for with_panel in (False, True):
            firsts = first_reads_ms(program, reader, with_panel)
            resident, share = measure_load(program, seconds, reader, with_panel)
            name = f"{reader}, {'with panel' if with_panel else 'no panel'}"
            print(f"{name:20}  first read {min(firsts):4.0f} ms at best, {statistics.median(firsts):4.0f} ms in the middle; "
                  f"resident {resident:4.1f} MB; {100 * share:4.1f} % of one core", flush=True)


if __name__ == "__main__":
    if len(sys.argv) not in (2, 3):
        sys.exit(__doc__)
    main(sys.argv[1], float(sys.argv[2]) if len(sys.argv) == 3 else 20)
