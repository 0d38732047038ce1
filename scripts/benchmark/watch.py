"""Starts a process, waits for it, and tells its time and memory: `python -I -S watch.py FILENO COMMAND ...`.

It is a small process of its own because Linux counts the memory of whoever starts a process as the process's own: it
stands in the figures until the new program begins. Nothing that is not built in is imported, so that this is little.
"""

import os
import sys
import time


def main() -> int:
    """Run the command; write wall time, s, exit status and peak memory, KiB, to the file of that number."""
    fileno, command = int(sys.argv[1]), sys.argv[2:]
    begin = time.perf_counter()
    process = os.posix_spawnp(command[0], command, os.environ, file_actions=[(os.POSIX_SPAWN_CLOSE, fileno)])
    _, status, usage = os.wait4(process, 0)
    seconds = time.perf_counter() - begin
    os.write(fileno, f"{seconds} {os.waitstatus_to_exitcode(status)} {usage.ru_maxrss}".encode())
    return 0


if __name__ == "__main__":
    sys.exit(main())
