"""The three standard streams, whatever state they are in: closed, full, a pipe without a reader, of any encoding."""

from __future__ import annotations

import contextlib
import io
import os
import sys
from typing import TextIO

from selector.errors import EXIT_UNUSABLE, Fault, Unusable

EXIT_PIPE_CLOSED = 141
_STREAMS = 3


def prepare() -> None:
    """Fill closed descriptors, so that no file gets their numbers, and let every character be written somehow.

    What an encoding does not have is written as an escape.
    """
    for number in range(_STREAMS):
        with contextlib.suppress(OSError):
            if not _is_open(number):
                os.open(os.devnull, os.O_RDONLY)
    for stream in (sys.stdout, sys.stderr):
        if isinstance(stream, io.TextIOWrapper):
            stream.reconfigure(errors="backslashreplace")


def put(text: str) -> None:
    """Write an answer to the standard output, down to the system.

    Raises
    ------
    Unusable
        It cannot be written.
    BrokenPipeError
        Nobody reads it.
    """
    if sys.stdout is None:
        raise _no_stdout("it is closed")
    try:
        sys.stdout.write(text if text.isascii() else _encodable(text))
        sys.stdout.flush()
    except BrokenPipeError:
        raise
    except (OSError, ValueError) as error:
        raise _no_stdout(getattr(error, "strerror", None) or str(error)) from error


def say(text: str, end: str = "\n") -> None:
    """Write to the standard error; where that cannot be, nothing more can be said."""
    if sys.stderr is not None:
        with contextlib.suppress(OSError, ValueError):
            sys.stderr.write(text + end)
            sys.stderr.flush()


def is_terminal(stream: TextIO | None) -> bool:
    """Return whether a stream is a terminal."""
    try:
        return stream is not None and stream.isatty()
    except ValueError:
        return False


def can_ask() -> bool:
    """Return whether a person sits there to be asked: input and the stream for questions are terminals."""
    return is_terminal(sys.stdin) and is_terminal(sys.stderr)


def settle(status: int) -> int:
    """Write what is left in the standard output and return the exit status, a worse one where that fails."""
    try:
        if sys.stdout is not None:
            sys.stdout.flush()
    except BrokenPipeError:
        _to_nowhere()
        return status or EXIT_PIPE_CLOSED
    except (OSError, ValueError) as error:
        _to_nowhere()
        if not status:
            say(str(_no_stdout(getattr(error, "strerror", None) or str(error))))
        return status or EXIT_UNUSABLE
    return status


def _to_nowhere() -> None:
    """Turn the standard output away, so that the interpreter does not fail at it once more."""
    with contextlib.suppress(OSError, ValueError):
        nowhere = os.open(os.devnull, os.O_WRONLY)
        os.dup2(nowhere, sys.stdout.fileno())
        os.close(nowhere)


def _is_open(number: int) -> bool:
    """Return whether a descriptor is open."""
    try:
        os.fstat(number)
    except OSError:
        return False
    return True


def _encodable(text: str) -> str:
    """Return text that the standard output's encoding can hold."""
    from selector.report.clean import encodable  # noqa: PLC0415 - signals are seen to before rooms are imported

    return encodable(text, sys.stdout.encoding)


def _no_stdout(reason: str) -> Unusable:
    return Unusable(Fault("standard output", f"cannot be written: {reason}"))
