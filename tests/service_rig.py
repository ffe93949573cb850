"""What the scripts that measure the running service share: lines, boards, starting and stopping. Standard library only."""
import fcntl
import math
import os
import pty
import signal
import struct
import subprocess
import sys
import termios
import threading
import time
import tty

RATE_HZ = 50
READERS = ("poll", "portable")


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


def start(program, home, lines, reader, with_panel=False, display=None):
    """Starts the service on these lines; the flight is recorded under home."""
    settings = os.path.join(home, "settings.json")
    with open(settings, "w", encoding="utf-8") as file:
        ports = ", ".join(f'{{ "name": "board{n}", "device": "{line.device}" }}' for n, line in enumerate(lines))
        serial_text = f', "displays": {{ "serialText": {{ "device": "{display.device}", "baud": 115200 }} }}' if display else ""
        file.write(f'{{ "glider": "marram-15.json", "serial": {{ "reader": "{reader}" }}, "ports": [{ports}]{serial_text} }}')
    environment = {"HOME": home, "PATH": os.environ["PATH"], "TERM": "xterm"}
    output = subprocess.DEVNULL
    if with_panel:
        screen, output = pty.openpty()
        fcntl.ioctl(output, termios.TIOCSWINSZ, struct.pack("HHHH", 24, 80, 0, 0))
        threading.Thread(target=drain, args=(screen,), daemon=True).start()
    command = [program] if not program.endswith(".dll") else ["dotnet", program]
    return subprocess.Popen([*command, "run", "--settings", settings], env=environment,
                            stdin=subprocess.DEVNULL, stdout=output, stderr=subprocess.DEVNULL)


def alive(process):
    if process.poll() is not None:
        sys.exit(f"the service ended with {process.returncode}")


def stop(process):
    process.send_signal(signal.SIGTERM)
    process.wait(10)


def pause_until(moment):
    time.sleep(max(0, moment - time.monotonic()))
