#!/usr/bin/env python3
"""Measures the running service: time to first read, resident memory, share of one core.

    tests/service-load.py PROGRAM [SECONDS]

PROGRAM is the published executable (docs/ahead-of-time.md). Two pseudo-terminals are fed 50 sentences a second each, static
pressure on one, impact pressure on the other, as two sensor boards would; the flight is recorded. It is measured twice: with
the panel on a terminal, and without one; the time to first read is the least and the median of several starts. Only the
standard library and /proc are used.
"""
import fcntl
import math
import os
import pty
import signal
import statistics
import struct
import subprocess
import sys
import tempfile
import termios
import threading
import time
import tty

RATE_HZ = 50
STARTS = 9
TICKS = os.sysconf("SC_CLK_TCK")


def sentence(body):
    checksum = 0
    for character in body.encode():
        checksum ^= character
    return f"${body}*{checksum:02X}\r\n".encode()


def boards(count):
    """The n-th line of each board: a slow wave of height and airspeed, so that every stage has work."""
    height = 20 * math.sin(count / 300)
    yield sentence(f"YXXDR,P,{95461 - 11 * height:.1f},P,STATIC")
    yield sentence(f"YXXDR,P,{600 + 50 * math.cos(count / 300):.1f},P,IMPACT")


class Line:
    """A raw pseudo-terminal; both ends stay open here, so that what waits unread can be asked for."""

    def __init__(self):
        self.master, self.slave = pty.openpty()
        tty.setraw(self.slave)
        self.device = os.ttyname(self.slave)

    def waiting(self):
        return struct.unpack("i", fcntl.ioctl(self.slave, termios.FIONREAD, b"\0" * 4))[0]


def drain(master):
    try:
        while os.read(master, 65536):
            pass
    except OSError:
        pass


def cpu_seconds(process):
    with open(f"/proc/{process.pid}/stat", encoding="ascii") as stat:
        fields = stat.read().rsplit(")", 1)[1].split()
    return (int(fields[11]) + int(fields[12])) / TICKS


def resident_mb(process):
    with open(f"/proc/{process.pid}/status", encoding="ascii") as status:
        return next(int(line.split()[1]) for line in status if line.startswith("VmRSS")) / 1024


def start(program, home, lines, with_panel):
    settings = os.path.join(home, "settings.json")
    with open(settings, "w", encoding="utf-8") as file:
        ports = ", ".join(f'{{ "name": "board{n}", "device": "{line.device}" }}' for n, line in enumerate(lines))
        file.write(f'{{ "glider": "marram-15.json", "ports": [{ports}] }}')
    environment = {"HOME": home, "PATH": os.environ["PATH"], "TERM": "xterm"}
    output = subprocess.DEVNULL
    if with_panel:
        screen, output = pty.openpty()
        fcntl.ioctl(output, termios.TIOCSWINSZ, struct.pack("HHHH", 24, 80, 0, 0))
        threading.Thread(target=drain, args=(screen,), daemon=True).start()
    command = [program] if not program.endswith(".dll") else ["dotnet", program]
    return subprocess.Popen([*command, "run", "--settings", settings], env=environment,
                            stdin=subprocess.DEVNULL, stdout=output, stderr=subprocess.DEVNULL)


def first_read_ms(process, line, started):
    """Until the bytes that lay on the line before the start are gone."""
    while line.waiting() > 0:
        if process.poll() is not None:
            sys.exit(f"the service ended with {process.returncode}")
        time.sleep(0.0002)
    return (time.monotonic() - started) * 1000


def feed(lines, until, next_time, count):
    while time.monotonic() < until:
        for line, text in zip(lines, boards(count)):
            os.write(line.master, text)
        count += 1
        next_time += 1 / RATE_HZ
        time.sleep(max(0, next_time - time.monotonic()))
    return next_time, count


def stop(process):
    process.send_signal(signal.SIGTERM)
    process.wait(10)


def first_reads_ms(program, with_panel):
    times = []
    for _ in range(STARTS):
        with tempfile.TemporaryDirectory() as home:
            lines = [Line(), Line()]
            os.write(lines[0].master, b"\r\n" * 8)
            while lines[0].waiting() == 0:
                time.sleep(0.001)
            started = time.monotonic()
            process = start(program, home, lines, with_panel)
            try:
                times.append(first_read_ms(process, lines[0], started))
            finally:
                stop(process)
    return times


def measure_load(program, seconds, with_panel):
    with tempfile.TemporaryDirectory() as home:
        lines = [Line(), Line()]
        process = start(program, home, lines, with_panel)
        try:
            now = time.monotonic()
            next_time, count = feed(lines, now + 5, now, 0)
            before, measured_from = cpu_seconds(process), time.monotonic()
            feed(lines, measured_from + seconds, next_time, count)
            return resident_mb(process), (cpu_seconds(process) - before) / (time.monotonic() - measured_from)
        finally:
            stop(process)


def main(program, seconds):
    for with_panel in (False, True):
        firsts = first_reads_ms(program, with_panel)
        resident, share = measure_load(program, seconds, with_panel)
        name = "with panel" if with_panel else "no panel"
        print(f"{name:10}  first read {min(firsts):4.0f} ms at best, {statistics.median(firsts):4.0f} ms in the middle; "
              f"resident {resident:4.1f} MB; {100 * share:4.1f} % of one core")


if __name__ == "__main__":
    if len(sys.argv) not in (2, 3):
        sys.exit(__doc__)
    main(sys.argv[1], float(sys.argv[2]) if len(sys.argv) == 3 else 20)
