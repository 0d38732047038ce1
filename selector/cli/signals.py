"""Signals that end the program: as exceptions, so that nothing is left half done."""

from __future__ import annotations

import signal
from types import FrameType

_SIGNALLED = 128
EXIT_INTERRUPTED = _SIGNALLED + signal.SIGINT
_ENDING = tuple(getattr(signal, name) for name in ("SIGINT", "SIGTERM", "SIGHUP") if hasattr(signal, name))


class Ended(BaseException):
    """A signal that ends the program, with the exit status that tells which."""

    def __init__(self, number: int) -> None:
        """Keep the status: 128 and the signal's number."""
        self.status = _SIGNALLED + number
        super().__init__(self.status)


def watch() -> None:
    """Let SIGINT, SIGTERM and SIGHUP be raised; one that was ignored from outside stays ignored.

    SIGINT is no KeyboardInterrupt here: Python would end by the signal, whatever becomes of one, where it comes up in
    code that is made from text, as that of a dataclass is.
    """
    for number in _ENDING:
        if signal.getsignal(number) is not signal.SIG_IGN:
            signal.signal(number, _raise)


def ignore() -> None:
    """Ignore what comes while the interpreter goes down: the answer is given."""
    for number in _ENDING:
        signal.signal(number, signal.SIG_IGN)


def _raise(number: int, _frame: FrameType | None) -> None:
    """Raise the end that a signal means."""
    raise Ended(number)
