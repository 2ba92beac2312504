"""Runs one command on a pseudo-terminal and types at it, as a person would.

Reads {"argv", "cwd", "env", "columns", "rows", "steps": [{"until", "keys"}]} from standard input: each step waits until its
text has appeared since the last keys, and then types. Writes {"output": [...], "exit", "restored"} with what came before each
step and after the last one. Standard library only. Node itself has no pseudo-terminal, and a package that adds one is compiled.
"""

import fcntl
import json
import os
import pty
import re
import select
import signal
import struct
import sys
import termios
import time

SECONDS = 20.0  # for one step, on a machine that is busy
QUIET = 0.03  # seconds without output: what was being drawn is drawn
CONTROLS = re.compile(r"\x1b\[[0-9;?]*[A-Za-z]")


def main():
    asked = json.load(sys.stdin)
    master, slave = pty.openpty()
    fcntl.ioctl(slave, termios.TIOCSWINSZ, struct.pack("HHHH", asked["rows"], asked["columns"], 0, 0))
    before = termios.tcgetattr(slave)
    child = os.fork()
    if child == 0:
        become(asked, slave)
    output, failed = [], None
    for step in asked["steps"]:
        text, seen = read_until(master, step["until"])
        output.append(text)
        if not seen:
            failed = step["until"]
            os.kill(child, signal.SIGKILL)
            break
        os.write(master, step["keys"].encode())
    rest, status = read_to_end(master, child)
    output.append(rest)
    exit_code = os.waitstatus_to_exitcode(status) if hasattr(os, "waitstatus_to_exitcode") else os.WEXITSTATUS(status)
    json.dump({"output": output, "exit": exit_code, "restored": termios.tcgetattr(slave) == before, "failed": failed}, sys.stdout)


def become(asked, slave):
    """The child: a session of its own on the terminal."""
    os.setsid()
    fcntl.ioctl(slave, termios.TIOCSCTTY, 0)
    for stream in (0, 1, 2):
        os.dup2(slave, stream)
    os.chdir(asked["cwd"])
    os.execve(asked["argv"][0], asked["argv"], asked["env"])


def read_until(master, wanted):
    read, deadline = b"", time.monotonic() + SECONDS
    while time.monotonic() < deadline:
        read += available(master, 0.05)
        if wanted in plain(read):
            return settled(master, read), True
    return read.decode(errors="replace"), False


def settled(master, read):
    while True:
        more = available(master, QUIET)
        if not more:
            return read.decode(errors="replace")
        read += more


def read_to_end(master, child):
    read, status, deadline = b"", None, time.monotonic() + SECONDS
    while status is None:
        read += available(master, 0.05)
        pid, ended = os.waitpid(child, os.WNOHANG)
        status = ended if pid else None
        if status is None and time.monotonic() > deadline:
            os.kill(child, signal.SIGKILL)
    return settled(master, read), status


def available(master, seconds):
    ready, _, _ = select.select([master], [], [], seconds)
    return os.read(master, 65536) if ready else b""


def plain(read):
    return CONTROLS.sub("", read.decode(errors="replace")).replace("\u00a0", " ")


main()
